// What was forecast on the way is kept, so that it can be held against what came; what a run really cost is typed at its close.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table forecasts (
  id uuid default gen_random_uuid() constraint forecasts_pkey primary key,
  workshop_id uuid not null constraint forecasts_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid not null,
  quarter integer not null,
  at timestamptz not null,
  deposited integer not null,
  minimum integer not null,
  figures jsonb not null,
  core_version text not null,
  constraint forecasts_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint forecasts_quarter_check check (quarter between 1 and 3),
  constraint forecasts_deposited_check check (deposited >= 0),
  constraint forecasts_minimum_check check (minimum > 0),
  constraint forecasts_core_version_check check (length(core_version) <= 40),
  constraint forecasts_workshop_id_id_key unique (workshop_id, id),
  constraint forecasts_run_id_quarter_key unique (run_id, quarter)
);
create trigger forecasts_never_changed before update or delete on forecasts
  for each row execute function refuse_change();

create table run_actuals (
  id uuid default gen_random_uuid() constraint run_actuals_pkey primary key,
  workshop_id uuid not null constraint run_actuals_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid not null,
  cost_minor bigint not null,
  started integer not null,
  good integer not null,
  written_at timestamptz not null,
  by_person_id uuid not null,
  constraint run_actuals_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint run_actuals_cost_minor_check check (cost_minor >= 0),
  constraint run_actuals_started_check check (started >= 0),
  constraint run_actuals_good_check check (good between 0 and started),
  constraint run_actuals_by_person_id_fkey foreign key (by_person_id) references people (id) on delete restrict,
  constraint run_actuals_workshop_id_id_key unique (workshop_id, id),
  constraint run_actuals_run_id_key unique (run_id)
);
`

const DOWN = `
drop table run_actuals, forecasts;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
