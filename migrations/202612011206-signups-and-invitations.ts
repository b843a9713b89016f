// Interest: one confirmed sign-up per module and person, and one invitation per run and sign-up.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table signups (
  id uuid default gen_random_uuid() constraint signups_pkey primary key,
  workshop_id uuid not null constraint signups_workshop_id_fkey references workshops (id) on delete restrict,
  module_id uuid not null,
  offer_id uuid not null,
  person_id uuid not null,
  quantity integer not null,
  country text not null,
  certainty text not null,
  top_price_minor bigint,
  asked_prices_minor jsonb not null default '[]',
  shown_price_minor bigint,
  currency text not null,
  wants_updates boolean not null default false,
  state text not null default 'unconfirmed',
  confirm_token_hash text,
  take_back_token_hash text,
  submitted_at timestamptz not null,
  confirm_expires_at timestamptz not null,
  confirmed_at timestamptz,
  taken_back_at timestamptz,
  superseded_at timestamptz,
  constraint signups_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint signups_offer_id_fkey foreign key (workshop_id, offer_id)
    references offers (workshop_id, id) on delete restrict,
  constraint signups_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint signups_quantity_check check (quantity between 1 and 10),
  constraint signups_country_check check (country ~ '^[A-Z]{2}$'),
  constraint signups_certainty_check check (certainty in ('certain', 'likely', 'curious')),
  constraint signups_top_price_minor_check check (top_price_minor > 0),
  constraint signups_shown_price_minor_check check (shown_price_minor > 0),
  constraint signups_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint signups_state_check check (state in ('unconfirmed', 'confirmed', 'superseded', 'taken_back')),
  constraint signups_confirm_token_hash_key unique (confirm_token_hash),
  constraint signups_take_back_token_hash_key unique (take_back_token_hash),
  constraint signups_workshop_id_id_key unique (workshop_id, id),
  constraint signups_confirmed_check check (state = 'unconfirmed' or confirmed_at is not null),
  constraint signups_taken_back_check check ((state = 'taken_back') = (taken_back_at is not null)),
  constraint signups_superseded_check check ((state = 'superseded') = (superseded_at is not null))
);
create unique index signups_one_confirmed_key on signups (module_id, person_id)
  where state = 'confirmed';
create index signups_module_id_state_idx on signups (workshop_id, module_id, state);
create index signups_person_id_idx on signups (person_id);

create table invitations (
  id uuid default gen_random_uuid() constraint invitations_pkey primary key,
  workshop_id uuid not null constraint invitations_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid not null,
  signup_id uuid not null,
  person_id uuid not null,
  state text not null default 'sent',
  sent_at timestamptz not null,
  answered_at timestamptz,
  constraint invitations_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint invitations_signup_id_fkey foreign key (workshop_id, signup_id)
    references signups (workshop_id, id) on delete restrict,
  constraint invitations_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint invitations_state_check check (state in ('sent', 'ordered', 'declined', 'expired')),
  constraint invitations_workshop_id_id_key unique (workshop_id, id),
  constraint invitations_run_id_signup_id_key unique (run_id, signup_id),
  constraint invitations_answered_check check ((state = 'sent') = (answered_at is null))
);
create index invitations_run_id_person_id_idx on invitations (workshop_id, run_id, person_id);
create index invitations_person_id_idx on invitations (person_id);
`

const DOWN = `
drop table invitations, signups;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
