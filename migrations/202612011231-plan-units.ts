// A what-if may be about another quantity than the run's own.
// Locks: plans, for the time of adding a column that is empty. Back: drops it; the quantities of what-ifs are lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
alter table plans add column units integer constraint plans_units_check check (units > 0);
`

const DOWN = `
alter table plans drop column units;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
