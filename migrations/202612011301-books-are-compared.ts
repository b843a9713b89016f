// Workshops that can already take payments have their books compared from now on; new ones when their account is ready.
// Locks: a few rows. Back: takes what is still due off again.

type Run = (sql: string) => Promise<unknown>

const UP = `
insert into due_items (kind, subject_id, workshop_id, due_at)
  select 'compare_books', id, id, now() from workshops where provider_account_id is not null
  on conflict (kind, subject_id) do nothing;
`

const DOWN = `
delete from due_items where kind = 'compare_books';
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
