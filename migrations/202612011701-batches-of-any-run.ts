// A batch is what one packer takes from the queue, and the queue holds parcels of every run under way.
// Locks: pack_batches, briefly. Back: only while no batch goes across runs.

type Run = (sql: string) => Promise<unknown>

const UP = `
alter table pack_batches alter column run_id drop not null;
create index parcels_batch_id_idx on parcels (batch_id) where batch_id is not null;
`

const DOWN = `
drop index parcels_batch_id_idx;
alter table pack_batches alter column run_id set not null;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
