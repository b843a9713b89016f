// Where finished things stand, so that a pick list leads along the shelf.
// Locks: offers, briefly. Back: drops the column; its data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
alter table offers add column storage_place text not null default ''
  constraint offers_storage_place_check check (length(storage_place) <= 40);
`

const DOWN = `
alter table offers drop column storage_place;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
