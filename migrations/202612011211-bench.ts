// Test plans by version, and readings with an id made at the bench: sent twice is once.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table test_plans (
  id uuid default gen_random_uuid() constraint test_plans_pkey primary key,
  workshop_id uuid not null constraint test_plans_workshop_id_fkey
    references workshops (id) on delete restrict,
  revision_id uuid not null,
  version integer not null,
  steps jsonb not null,
  created_at timestamptz not null,
  created_by_person_id uuid not null,
  constraint test_plans_revision_id_fkey foreign key (workshop_id, revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint test_plans_version_check check (version > 0),
  constraint test_plans_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint test_plans_workshop_id_id_key unique (workshop_id, id),
  constraint test_plans_revision_id_version_key unique (revision_id, version)
);

create table readings (
  id uuid default gen_random_uuid() constraint readings_pkey primary key,
  workshop_id uuid not null constraint readings_workshop_id_fkey references workshops (id) on delete restrict,
  client_id uuid not null,
  unit_id uuid not null,
  test_plan_id uuid not null,
  step_key text not null,
  value numeric(18,6),
  over_range boolean not null default false,
  word text,
  verdict text not null,
  taken_at timestamptz not null,
  taken_by_person_id uuid not null,
  received_at timestamptz not null,
  constraint readings_client_id_key unique (client_id),
  constraint readings_unit_id_fkey foreign key (workshop_id, unit_id)
    references units (workshop_id, id) on delete restrict,
  constraint readings_test_plan_id_fkey foreign key (workshop_id, test_plan_id)
    references test_plans (workshop_id, id) on delete restrict,
  constraint readings_step_key_check check (length(step_key) <= 60),
  constraint readings_word_check check (length(word) <= 500),
  constraint readings_verdict_check check (verdict in ('pass', 'fail')),
  constraint readings_taken_by_person_id_fkey foreign key (taken_by_person_id)
    references people (id) on delete restrict,
  constraint readings_workshop_id_id_key unique (workshop_id, id)
);
create index readings_unit_id_test_plan_id_idx on readings (workshop_id, unit_id, test_plan_id);
create trigger readings_never_changed before update or delete on readings
  for each row execute function refuse_change();
`

const DOWN = `
drop table readings, test_plans;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
