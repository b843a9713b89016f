// A numbered paper keeps who sold, as it was on the day of issue; and a workshop says whether tax falls due with the
// payment or with the posting.
// Locks: two small tables for a moment (constant defaults, nothing is rewritten). Back: drops the columns.

type Run = (sql: string) => Promise<unknown>

const UP = `
alter table invoices add column seller jsonb not null default '{}';
alter table workshops add column deposits_taxed boolean not null default false;
`

const DOWN = `
alter table invoices drop column seller;
alter table workshops drop column deposits_taxed;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
