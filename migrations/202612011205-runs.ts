// A run and the prices it sells at. SQL forbids overselling: committed units stay between 0 and the maximum.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table runs (
  id uuid default gen_random_uuid() constraint runs_pkey primary key,
  workshop_id uuid not null constraint runs_workshop_id_fkey references workshops (id) on delete restrict,
  module_id uuid not null,
  revision_id uuid not null,
  number integer not null,
  state text not null default 'draft',
  minimum integer not null,
  maximum integer not null,
  minimum_first integer not null,
  committed_units integer not null default 0,
  next_queue_no bigint not null default 1,
  limit_per_person integer not null default 4,
  currency text not null,
  decide_by_on date not null,
  decide_by_at timestamptz not null,
  decide_by_first_on date not null,
  decide_by_moved_at timestamptz,
  head_start_hours integer not null default 48,
  opens_to_all_at timestamptz,
  balance_when text not null,
  holding_plan text,
  terms_version_id uuid,
  created_at timestamptz not null,
  created_by_person_id uuid not null,
  opened_at timestamptz,
  locked_at timestamptz,
  lock_reason text,
  planned_starts integer,
  balances_asked_at timestamptz,
  called_off_at timestamptz,
  call_off_reason text,
  call_off_cause text,
  closed_at timestamptz,
  last_update_at timestamptz,
  constraint runs_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint runs_revision_id_fkey foreign key (workshop_id, revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint runs_number_check check (number > 0),
  constraint runs_state_check check (state in ('draft', 'taking_deposits', 'locked', 'closed', 'called_off')),
  constraint runs_minimum_check check (minimum > 0),
  constraint runs_maximum_check check (maximum > 0),
  constraint runs_minimum_first_check check (minimum_first > 0),
  constraint runs_committed_units_check check (committed_units >= 0),
  constraint runs_limit_per_person_check check (limit_per_person > 0),
  constraint runs_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint runs_head_start_hours_check check (head_start_hours >= 0),
  constraint runs_balance_when_check check (balance_when in ('at_lock', 'units_passed', 'before_packing')),
  constraint runs_holding_plan_check check (length(holding_plan) <= 2000),
  constraint runs_terms_version_id_fkey foreign key (workshop_id, terms_version_id)
    references terms_versions (workshop_id, id) on delete restrict,
  constraint runs_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint runs_lock_reason_check check (length(lock_reason) <= 2000),
  constraint runs_planned_starts_check check (planned_starts > 0),
  constraint runs_call_off_reason_check check (length(call_off_reason) <= 2000),
  constraint runs_call_off_cause_check check (call_off_cause in ('owner', 'clock')),
  constraint runs_workshop_id_id_key unique (workshop_id, id),
  constraint runs_module_id_number_key unique (module_id, number),
  constraint runs_maximum_reaches_minimum_check check (minimum <= maximum),
  constraint runs_minimum_only_falls_check check (minimum <= minimum_first),
  constraint runs_committed_within_maximum_check check (committed_units between 0 and maximum),
  constraint runs_decide_by_moved_check
    check (decide_by_on = decide_by_first_on or (decide_by_moved_at is not null
      and decide_by_on - decide_by_first_on between -30 and 30)),
  constraint runs_opened_check
    check (state in ('draft', 'called_off') or (opened_at is not null and opens_to_all_at is not null
      and terms_version_id is not null)),
  constraint runs_locked_check check (state not in ('locked', 'closed') or locked_at is not null),
  constraint runs_called_off_check
    check ((state = 'called_off') = (called_off_at is not null)
      and (called_off_at is null) = (call_off_reason is null)
      and (called_off_at is null) = (call_off_cause is null)),
  constraint runs_closed_check check ((state = 'closed') = (closed_at is not null))
);
create index runs_state_idx on runs (workshop_id, state);

create table run_offers (
  id uuid default gen_random_uuid() constraint run_offers_pkey primary key,
  workshop_id uuid not null constraint run_offers_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid not null,
  offer_id uuid not null,
  kind text not null,
  price_minor bigint not null,
  deposit_minor bigint not null,
  tax_class text not null default 'standard',
  posted_by_on date not null,
  posted_by_first_on date not null,
  maximum integer,
  committed_units integer not null default 0,
  delayed_at timestamptz,
  constraint run_offers_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint run_offers_offer_id_fkey foreign key (workshop_id, offer_id)
    references offers (workshop_id, id) on delete restrict,
  constraint run_offers_kind_check check (kind in ('boards', 'kit', 'built')),
  constraint run_offers_price_minor_check check (price_minor > 0),
  constraint run_offers_deposit_minor_check check (deposit_minor > 0),
  constraint run_offers_tax_class_check check (tax_class in ('standard', 'reduced', 'zero')),
  constraint run_offers_maximum_check check (maximum > 0),
  constraint run_offers_committed_units_check check (committed_units >= 0),
  constraint run_offers_workshop_id_id_key unique (workshop_id, id),
  constraint run_offers_run_id_offer_id_key unique (run_id, offer_id),
  constraint run_offers_deposit_in_price_check check (deposit_minor <= price_minor),
  constraint run_offers_committed_within_maximum_check
    check (committed_units <= coalesce(maximum, committed_units))
);
`

const DOWN = `
drop table run_offers, runs;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
