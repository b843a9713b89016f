// A workshop is the tenant: every row it owns carries its id, and who may act for it is a membership.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table workshops (
  id uuid default gen_random_uuid() constraint workshops_pkey primary key,
  slug text not null,
  name text not null,
  state text not null default 'pending',
  currency text not null,
  time_zone text not null,
  country text not null,
  locale text not null default 'en',
  tax_mode text not null default 'not_registered',
  prices_include_tax boolean not null default true,
  tax_note text,
  tax_number text,
  legal_name text,
  postal_address jsonb,
  reply_to text,
  phone text,
  about text not null default '',
  provider_account_id text,
  charges_enabled_at timestamptz,
  payouts_manual_at timestamptz,
  holding_limit_days integer not null default 90,
  hold_minutes integer not null default 30,
  head_start_hours integer not null default 48,
  limit_per_person integer not null default 4,
  lapse_after_days integer not null default 14,
  lapse_keeps_deposit boolean not null default false,
  payout_delay_days integer not null default 7,
  address_kept_days integer not null default 180,
  closed_days jsonb not null default '[]',
  created_at timestamptz not null,
  created_by_person_id uuid not null,
  opened_at timestamptz,
  suspended_at timestamptz,
  constraint workshops_slug_check check (slug ~ '^[a-z0-9]([a-z0-9-]{0,38}[a-z0-9])?$'),
  constraint workshops_slug_key unique (slug),
  constraint workshops_name_check check (length(name) <= 120),
  constraint workshops_state_check check (state in ('pending', 'open', 'suspended')),
  constraint workshops_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint workshops_time_zone_check check (length(time_zone) <= 64),
  constraint workshops_country_check check (country ~ '^[A-Z]{2}$'),
  constraint workshops_locale_check check (length(locale) <= 35),
  constraint workshops_tax_mode_check
    check (tax_mode in ('not_registered', 'home_rate', 'destination_rate', 'export_without_tax')),
  constraint workshops_tax_note_check check (length(tax_note) <= 500),
  constraint workshops_tax_number_check check (length(tax_number) <= 40),
  constraint workshops_legal_name_check check (length(legal_name) <= 200),
  constraint workshops_reply_to_check check (length(reply_to) <= 254),
  constraint workshops_phone_check check (length(phone) <= 40),
  constraint workshops_about_check check (length(about) <= 5000),
  constraint workshops_provider_account_id_check check (length(provider_account_id) <= 100),
  constraint workshops_provider_account_id_key unique (provider_account_id),
  constraint workshops_holding_limit_days_check check (holding_limit_days > 0),
  constraint workshops_hold_minutes_check check (hold_minutes between 30 and 1440),
  constraint workshops_head_start_hours_check check (head_start_hours >= 0),
  constraint workshops_limit_per_person_check check (limit_per_person > 0),
  constraint workshops_lapse_after_days_check check (lapse_after_days > 0),
  constraint workshops_payout_delay_days_check check (payout_delay_days >= 0),
  constraint workshops_address_kept_days_check check (address_kept_days >= 30),
  constraint workshops_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint workshops_suspended_check check ((state = 'suspended') = (suspended_at is not null)),
  constraint workshops_opened_check check (state = 'pending' or opened_at is not null),
  constraint workshops_charges_check check (charges_enabled_at is null or provider_account_id is not null)
);

create table memberships (
  id uuid default gen_random_uuid() constraint memberships_pkey primary key,
  workshop_id uuid not null constraint memberships_workshop_id_fkey
    references workshops (id) on delete restrict,
  person_id uuid not null,
  role text not null,
  created_at timestamptz not null,
  created_by_person_id uuid,
  ended_at timestamptz,
  constraint memberships_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint memberships_role_check check (role in ('owner', 'bench', 'packer')),
  constraint memberships_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint memberships_workshop_id_id_key unique (workshop_id, id),
  constraint memberships_person_id_key unique (workshop_id, person_id)
);
create index memberships_person_id_idx on memberships (person_id);

create table staff_invitations (
  id uuid default gen_random_uuid() constraint staff_invitations_pkey primary key,
  workshop_id uuid not null constraint staff_invitations_workshop_id_fkey
    references workshops (id) on delete restrict,
  email_normal text not null,
  role text not null,
  token_hash text not null,
  created_at timestamptz not null,
  created_by_person_id uuid not null,
  expires_at timestamptz not null,
  accepted_at timestamptz,
  accepted_by_person_id uuid,
  withdrawn_at timestamptz,
  constraint staff_invitations_email_normal_check check (length(email_normal) <= 254),
  constraint staff_invitations_role_check check (role in ('owner', 'bench', 'packer')),
  constraint staff_invitations_token_hash_key unique (token_hash),
  constraint staff_invitations_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint staff_invitations_accepted_by_person_id_fkey foreign key (accepted_by_person_id)
    references people (id) on delete restrict,
  constraint staff_invitations_workshop_id_id_key unique (workshop_id, id),
  constraint staff_invitations_accepted_check check ((accepted_at is null) = (accepted_by_person_id is null))
);
create unique index staff_invitations_one_open_key on staff_invitations (workshop_id, email_normal)
  where accepted_at is null and withdrawn_at is null;

create table counters (
  id uuid default gen_random_uuid() constraint counters_pkey primary key,
  workshop_id uuid not null constraint counters_workshop_id_fkey references workshops (id) on delete restrict,
  series text not null,
  last integer not null default 0,
  constraint counters_series_check
    check (series in ('order', 'invoice', 'credit_note', 'parcel', 'problem', 'unit', 'lot')),
  constraint counters_last_check check (last >= 0),
  constraint counters_workshop_id_id_key unique (workshop_id, id),
  constraint counters_series_key unique (workshop_id, series)
);
`

const DOWN = `
drop table counters, staff_invitations, memberships, workshops;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
