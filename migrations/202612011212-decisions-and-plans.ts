// What was known when it was decided is frozen; plans are what-ifs; outcomes teach the next forecast.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table waivers (
  id uuid default gen_random_uuid() constraint waivers_pkey primary key,
  workshop_id uuid not null constraint waivers_workshop_id_fkey references workshops (id) on delete restrict,
  run_id uuid not null,
  key text not null,
  reason text not null,
  by_person_id uuid not null,
  at timestamptz not null,
  constraint waivers_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint waivers_key_check
    check (key in ('first_good_unit', 'lessons', 'quotes', 'samples', 'parts_list', 'post_data', 'promise',
      'page', 'repay')),
  constraint waivers_reason_check check (length(reason) <= 2000),
  constraint waivers_by_person_id_fkey foreign key (by_person_id) references people (id) on delete restrict,
  constraint waivers_workshop_id_id_key unique (workshop_id, id),
  constraint waivers_run_id_key_key unique (run_id, key)
);

create table decisions (
  id uuid default gen_random_uuid() constraint decisions_pkey primary key,
  workshop_id uuid not null constraint decisions_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid not null,
  kind text not null,
  reason text,
  inputs jsonb not null,
  figures jsonb not null,
  core_version text not null,
  by_person_id uuid,
  at timestamptz not null,
  constraint decisions_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint decisions_kind_check
    check (kind in ('open_deposits', 'lock', 'call_off', 'lower_minimum', 'move_decide_by',
      'change_maximum', 'delay_offer', 'close')),
  constraint decisions_reason_check check (length(reason) <= 2000),
  constraint decisions_core_version_check check (length(core_version) <= 40),
  constraint decisions_by_person_id_fkey foreign key (by_person_id) references people (id) on delete restrict,
  constraint decisions_workshop_id_id_key unique (workshop_id, id)
);
create index decisions_run_id_at_idx on decisions (workshop_id, run_id, at);
create trigger decisions_never_changed before update or delete on decisions
  for each row execute function refuse_change();

create table plans (
  id uuid default gen_random_uuid() constraint plans_pkey primary key,
  workshop_id uuid not null constraint plans_workshop_id_fkey references workshops (id) on delete restrict,
  module_id uuid not null,
  run_id uuid,
  name text not null default 'Base',
  is_base boolean not null default true,
  plan jsonb not null,
  steps jsonb not null default '[]',
  created_at timestamptz not null,
  changed_at timestamptz not null,
  changed_by_person_id uuid not null,
  constraint plans_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint plans_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint plans_name_check check (length(name) <= 80),
  constraint plans_changed_by_person_id_fkey foreign key (changed_by_person_id)
    references people (id) on delete restrict,
  constraint plans_workshop_id_id_key unique (workshop_id, id),
  constraint plans_run_id_name_key unique (run_id, name)
);
create unique index plans_one_base_of_run_key on plans (run_id)
  where is_base;
create unique index plans_one_base_of_module_key on plans (module_id)
  where is_base and run_id is null;
create index plans_module_id_idx on plans (workshop_id, module_id);

create table outcomes (
  id uuid default gen_random_uuid() constraint outcomes_pkey primary key,
  workshop_id uuid not null constraint outcomes_workshop_id_fkey references workshops (id) on delete restrict,
  run_id uuid not null,
  class_name text not null,
  converted integer not null,
  not_converted integer not null,
  stored_at timestamptz not null,
  constraint outcomes_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint outcomes_class_name_check
    check (class_name in ('certain', 'likely', 'curious', 'old_signup', 'deposit_paying')),
  constraint outcomes_converted_check check (converted >= 0),
  constraint outcomes_not_converted_check check (not_converted >= 0),
  constraint outcomes_workshop_id_id_key unique (workshop_id, id),
  constraint outcomes_run_id_class_name_key unique (run_id, class_name)
);
`

const DOWN = `
drop table outcomes, plans, decisions, waivers;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
