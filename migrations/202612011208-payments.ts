// Every call for money is a row with its own stored key before the call is made.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table payment_attempts (
  id uuid default gen_random_uuid() constraint payment_attempts_pkey primary key,
  workshop_id uuid not null constraint payment_attempts_workshop_id_fkey
    references workshops (id) on delete restrict,
  order_id uuid not null,
  purpose text not null,
  sequence integer not null,
  method text not null,
  amount_minor bigint not null,
  currency text not null,
  idempotency_key text not null,
  params_hash text not null,
  params jsonb not null,
  provider_account_id text not null,
  provider_id text,
  provider_session_id text,
  charge_id text,
  pay_url text,
  session_expires_at timestamptz,
  state text not null default 'requested',
  failure_code text,
  fee_minor bigint,
  requested_at timestamptz not null,
  sent_at timestamptz,
  ended_at timestamptz,
  surplus_at timestamptz,
  constraint payment_attempts_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint payment_attempts_purpose_check check (length(purpose) <= 20),
  constraint payment_attempts_sequence_check check (sequence > 0),
  constraint payment_attempts_method_check check (method in ('checkout', 'saved_card')),
  constraint payment_attempts_amount_minor_check check (amount_minor > 0),
  constraint payment_attempts_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint payment_attempts_idempotency_key_check check (length(idempotency_key) <= 120),
  constraint payment_attempts_idempotency_key_key unique (idempotency_key),
  constraint payment_attempts_params_hash_check check (length(params_hash) <= 64),
  constraint payment_attempts_provider_account_id_check check (length(provider_account_id) <= 100),
  constraint payment_attempts_provider_id_check check (length(provider_id) <= 200),
  constraint payment_attempts_provider_session_id_check check (length(provider_session_id) <= 200),
  constraint payment_attempts_charge_id_check check (length(charge_id) <= 200),
  constraint payment_attempts_pay_url_check check (length(pay_url) <= 2000),
  constraint payment_attempts_state_check
    check (state in ('requested', 'sent', 'unknown', 'needs_customer', 'captured', 'failed', 'abandoned')),
  constraint payment_attempts_failure_code_check check (length(failure_code) <= 100),
  constraint payment_attempts_fee_minor_check check (fee_minor >= 0),
  constraint payment_attempts_workshop_id_id_key unique (workshop_id, id),
  constraint payment_attempts_order_id_purpose_sequence_key unique (order_id, purpose, sequence),
  constraint payment_attempts_provider_account_id_provider_id_key unique (provider_account_id, provider_id),
  constraint payment_attempts_provider_account_id_provider_session_id_key unique (provider_account_id, provider_session_id),
  constraint payment_attempts_purpose_form_check check (purpose ~ '^(deposit|balance|change-[1-9][0-9]*)$'),
  constraint payment_attempts_ended_check
    check ((state in ('captured', 'failed', 'abandoned')) = (ended_at is not null))
);
create unique index payment_attempts_one_live_key on payment_attempts (order_id, purpose)
  where state in ('requested', 'sent', 'unknown', 'needs_customer');
create unique index payment_attempts_one_captured_key on payment_attempts (order_id, purpose)
  where state = 'captured' and surplus_at is null;
create index payment_attempts_state_idx on payment_attempts (workshop_id, state);

create table refunds (
  id uuid default gen_random_uuid() constraint refunds_pkey primary key,
  workshop_id uuid not null constraint refunds_workshop_id_fkey references workshops (id) on delete restrict,
  attempt_id uuid not null,
  order_id uuid not null,
  sequence integer not null,
  amount_minor bigint not null,
  currency text not null,
  cause text not null,
  reason text,
  idempotency_key text not null,
  provider_id text,
  state text not null default 'requested',
  short_by_minor bigint,
  failure_code text,
  retry_of_id uuid,
  requested_by_person_id uuid,
  requested_at timestamptz not null,
  sent_at timestamptz,
  succeeded_at timestamptz,
  failed_at timestamptz,
  constraint refunds_attempt_id_fkey foreign key (workshop_id, attempt_id)
    references payment_attempts (workshop_id, id) on delete restrict,
  constraint refunds_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint refunds_sequence_check check (sequence > 0),
  constraint refunds_amount_minor_check check (amount_minor > 0),
  constraint refunds_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint refunds_cause_check
    check (cause in ('cancelled', 'withdrawn', 'run_called_off', 'late_capture', 'surplus', 'order_change',
      'lapsed', 'problem', 'notice', 'postage', 'price_fell', 'owner')),
  constraint refunds_reason_check check (length(reason) <= 1000),
  constraint refunds_idempotency_key_check check (length(idempotency_key) <= 120),
  constraint refunds_idempotency_key_key unique (idempotency_key),
  constraint refunds_provider_id_check check (length(provider_id) <= 200),
  constraint refunds_state_check
    check (state in ('requested', 'sent', 'unknown', 'pending', 'succeeded', 'failed')),
  constraint refunds_short_by_minor_check check (short_by_minor >= 0),
  constraint refunds_failure_code_check check (length(failure_code) <= 100),
  constraint refunds_retry_of_id_fkey foreign key (workshop_id, retry_of_id)
    references refunds (workshop_id, id) on delete restrict,
  constraint refunds_requested_by_person_id_fkey foreign key (requested_by_person_id)
    references people (id) on delete restrict,
  constraint refunds_workshop_id_id_key unique (workshop_id, id),
  constraint refunds_attempt_id_sequence_key unique (attempt_id, sequence),
  constraint refunds_failed_check check ((state = 'failed') = (failed_at is not null))
);
create index refunds_state_idx on refunds (workshop_id, state);
create index refunds_order_id_idx on refunds (order_id);
create constraint trigger refunds_within_captured after insert or update on refunds
  for each row execute function refuse_refund_above_captured();

create table provider_customers (
  id uuid default gen_random_uuid() constraint provider_customers_pkey primary key,
  workshop_id uuid not null constraint provider_customers_workshop_id_fkey
    references workshops (id) on delete restrict,
  person_id uuid not null,
  provider_account_id text not null,
  provider_id text not null,
  method_id text,
  method_brand text,
  method_last4 text,
  method_saved_at timestamptz,
  created_at timestamptz not null,
  constraint provider_customers_person_id_fkey foreign key (person_id)
    references people (id) on delete restrict,
  constraint provider_customers_provider_account_id_check check (length(provider_account_id) <= 100),
  constraint provider_customers_provider_id_check check (length(provider_id) <= 200),
  constraint provider_customers_method_id_check check (length(method_id) <= 200),
  constraint provider_customers_method_brand_check check (length(method_brand) <= 40),
  constraint provider_customers_method_last4_check check (length(method_last4) <= 4),
  constraint provider_customers_workshop_id_id_key unique (workshop_id, id),
  constraint provider_customers_person_id_key unique (workshop_id, person_id),
  constraint provider_customers_provider_account_id_provider_id_key unique (provider_account_id, provider_id)
);

create table provider_events (
  id uuid default gen_random_uuid() constraint provider_events_pkey primary key,
  account text not null,
  event_id text not null,
  type text not null,
  object_id text not null,
  payload jsonb,
  received_at timestamptz not null,
  provider_created_at timestamptz not null,
  applied_at timestamptz,
  outcome text,
  payload_cut_at timestamptz,
  constraint provider_events_account_check check (length(account) <= 100),
  constraint provider_events_event_id_check check (length(event_id) <= 200),
  constraint provider_events_type_check check (length(type) <= 100),
  constraint provider_events_object_id_check check (length(object_id) <= 200),
  constraint provider_events_outcome_check check (length(outcome) <= 200),
  constraint provider_events_account_event_id_key unique (account, event_id),
  constraint provider_events_payload_or_cut_check check (payload is not null or payload_cut_at is not null)
);
create index provider_events_waiting_idx on provider_events (received_at)
  where applied_at is null;
create index provider_events_account_object_id_idx on provider_events (account, object_id);

create table provider_effects (
  id uuid default gen_random_uuid() constraint provider_effects_pkey primary key,
  account text not null,
  object_id text not null,
  transition text not null,
  provider_event_id uuid,
  at timestamptz not null,
  constraint provider_effects_account_check check (length(account) <= 100),
  constraint provider_effects_object_id_check check (length(object_id) <= 200),
  constraint provider_effects_transition_check check (length(transition) <= 60),
  constraint provider_effects_provider_event_id_fkey foreign key (provider_event_id)
    references provider_events (id) on delete restrict,
  constraint provider_effects_account_object_id_transition_key unique (account, object_id, transition)
);

create table disputes (
  id uuid default gen_random_uuid() constraint disputes_pkey primary key,
  workshop_id uuid not null constraint disputes_workshop_id_fkey references workshops (id) on delete restrict,
  order_id uuid not null,
  attempt_id uuid not null,
  provider_id text not null,
  amount_minor bigint not null,
  currency text not null,
  reason text not null,
  state text not null default 'open',
  evidence_due_at timestamptz,
  opened_at timestamptz not null,
  closed_at timestamptz,
  constraint disputes_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint disputes_attempt_id_fkey foreign key (workshop_id, attempt_id)
    references payment_attempts (workshop_id, id) on delete restrict,
  constraint disputes_provider_id_check check (length(provider_id) <= 200),
  constraint disputes_provider_id_key unique (provider_id),
  constraint disputes_amount_minor_check check (amount_minor > 0),
  constraint disputes_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint disputes_reason_check check (length(reason) <= 100),
  constraint disputes_state_check check (state in ('open', 'won', 'lost')),
  constraint disputes_workshop_id_id_key unique (workshop_id, id),
  constraint disputes_closed_check check ((state = 'open') = (closed_at is null))
);
create index disputes_order_id_idx on disputes (workshop_id, order_id);

create table reconciliations (
  id uuid default gen_random_uuid() constraint reconciliations_pkey primary key,
  workshop_id uuid not null constraint reconciliations_workshop_id_fkey
    references workshops (id) on delete restrict,
  day date not null,
  compared_at timestamptz not null,
  item_count integer not null,
  differences jsonb not null default '[]',
  constraint reconciliations_item_count_check check (item_count >= 0),
  constraint reconciliations_workshop_id_id_key unique (workshop_id, id),
  constraint reconciliations_day_key unique (workshop_id, day)
);
`

const DOWN = `
drop table reconciliations, disputes, provider_effects, provider_events, provider_customers, refunds, payment_attempts;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
