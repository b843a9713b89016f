// An order is one contract: every sum fixed when it is placed, addresses only ever added.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table addresses (
  id uuid default gen_random_uuid() constraint addresses_pkey primary key,
  workshop_id uuid not null constraint addresses_workshop_id_fkey
    references workshops (id) on delete restrict,
  person_id uuid not null,
  country text not null,
  name text not null,
  organization text,
  lines text[] not null,
  city text,
  region text,
  postcode text,
  phone text,
  tax_number text,
  vat_number text,
  latin jsonb,
  fingerprint text not null,
  created_at timestamptz not null,
  erased_at timestamptz,
  constraint addresses_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint addresses_country_check check (country ~ '^[A-Z]{2}$'),
  constraint addresses_name_check check (length(name) <= 200),
  constraint addresses_organization_check check (length(organization) <= 200),
  constraint addresses_city_check check (length(city) <= 120),
  constraint addresses_region_check check (length(region) <= 120),
  constraint addresses_postcode_check check (length(postcode) <= 20),
  constraint addresses_phone_check check (length(phone) <= 40),
  constraint addresses_tax_number_check check (length(tax_number) <= 60),
  constraint addresses_vat_number_check check (length(vat_number) <= 40),
  constraint addresses_fingerprint_check check (length(fingerprint) <= 64),
  constraint addresses_workshop_id_id_key unique (workshop_id, id),
  constraint addresses_erased_blank_check
    check (erased_at is null or (name = '' and lines = '{}' and num_nonnulls(organization, city, region, postcode, phone, tax_number, vat_number, latin) = 0)),
  constraint addresses_lines_some_check check (erased_at is not null or cardinality(lines) between 1 and 6)
);
create index addresses_person_id_idx on addresses (person_id);
create trigger addresses_only_added before update or delete on addresses
  for each row execute function refuse_change_unless_erasing();

create table orders (
  id uuid default gen_random_uuid() constraint orders_pkey primary key,
  workshop_id uuid not null constraint orders_workshop_id_fkey references workshops (id) on delete restrict,
  number integer not null,
  run_id uuid not null,
  person_id uuid not null,
  kind text not null default 'paid',
  state text not null,
  unit_count integer not null,
  queue_no bigint,
  hold_until timestamptz,
  hold_attempts integer not null default 0,
  place_offered_at timestamptz,
  placed_at timestamptz not null,
  terms_version_id uuid,
  address_id uuid,
  address_fingerprint text,
  country text not null,
  currency text not null,
  tax_mode text not null,
  prices_include_tax boolean not null,
  goods_minor bigint not null,
  postage_minor bigint not null,
  postage_quote jsonb,
  postage_tax_basis_points integer not null default 0,
  postage_tax_minor bigint not null default 0,
  tax_minor bigint not null,
  total_minor bigint not null,
  deposit_minor bigint not null,
  balance_minor bigint not null,
  manual_reason text,
  entered_by_person_id uuid,
  balance_asked_at timestamptz,
  balance_charge_at timestamptz,
  balance_failed_at timestamptz,
  paid_at timestamptz,
  packed_at timestamptz,
  disputed_at timestamptz,
  cancelled_at timestamptz,
  cancel_cause text,
  cancel_reason text,
  expired_at timestamptz,
  lapsed_at timestamptz,
  posted_at timestamptz,
  delivered_at timestamptz,
  withdrawn_at timestamptz,
  returned_at timestamptz,
  constraint orders_number_check check (number > 0),
  constraint orders_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint orders_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint orders_kind_check check (kind in ('paid', 'manual')),
  constraint orders_state_check
    check (state in ('awaiting_deposit', 'waiting', 'reserved', 'balance_due', 'paid', 'packed', 'posted',
      'cancelled', 'expired', 'lapsed', 'withdrawn', 'returned')),
  constraint orders_unit_count_check check (unit_count > 0),
  constraint orders_hold_attempts_check check (hold_attempts >= 0),
  constraint orders_terms_version_id_fkey foreign key (workshop_id, terms_version_id)
    references terms_versions (workshop_id, id) on delete restrict,
  constraint orders_address_id_fkey foreign key (workshop_id, address_id)
    references addresses (workshop_id, id) on delete restrict,
  constraint orders_address_fingerprint_check check (length(address_fingerprint) <= 64),
  constraint orders_country_check check (country ~ '^[A-Z]{2}$'),
  constraint orders_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint orders_tax_mode_check
    check (tax_mode in ('not_registered', 'home_rate', 'destination_rate', 'export_without_tax')),
  constraint orders_goods_minor_check check (goods_minor >= 0),
  constraint orders_postage_minor_check check (postage_minor >= 0),
  constraint orders_postage_tax_basis_points_check check (postage_tax_basis_points between 0 and 10000),
  constraint orders_postage_tax_minor_check check (postage_tax_minor >= 0),
  constraint orders_tax_minor_check check (tax_minor >= 0),
  constraint orders_total_minor_check check (total_minor >= 0),
  constraint orders_deposit_minor_check check (deposit_minor >= 0),
  constraint orders_balance_minor_check check (balance_minor >= 0),
  constraint orders_manual_reason_check check (length(manual_reason) <= 500),
  constraint orders_entered_by_person_id_fkey foreign key (entered_by_person_id)
    references people (id) on delete restrict,
  constraint orders_cancel_cause_check
    check (cancel_cause in ('customer', 'owner', 'withdrawal', 'notice', 'silence', 'broken_promise',
      'run_called_off', 'run_closed', 'left_queue')),
  constraint orders_cancel_reason_check check (length(cancel_reason) <= 1000),
  constraint orders_workshop_id_id_key unique (workshop_id, id),
  constraint orders_number_key unique (workshop_id, number),
  constraint orders_run_id_queue_no_key unique (run_id, queue_no),
  constraint orders_sums_check
    check (total_minor = deposit_minor + balance_minor and total_minor = goods_minor + postage_minor),
  constraint orders_tax_within_check check (tax_minor <= total_minor and postage_tax_minor <= tax_minor),
  constraint orders_waiting_has_number_check check (state <> 'waiting' or queue_no is not null),
  constraint orders_held_check check ((state = 'awaiting_deposit') = (hold_until is not null)),
  constraint orders_manual_check
    check ((kind = 'manual') = (manual_reason is not null) and (kind = 'manual') = (entered_by_person_id is not null)),
  constraint orders_paid_complete_check
    check (kind = 'manual' or (terms_version_id is not null and address_id is not null
      and address_fingerprint is not null and deposit_minor > 0)),
  constraint orders_cancelled_check
    check ((state = 'cancelled') = (cancelled_at is not null)
      and (cancelled_at is null) = (cancel_cause is null)),
  constraint orders_expired_check check ((state = 'expired') = (expired_at is not null)),
  constraint orders_lapsed_check check ((state = 'lapsed') = (lapsed_at is not null)),
  constraint orders_posted_check
    check (state not in ('posted', 'withdrawn', 'returned') or posted_at is not null),
  constraint orders_paid_at_check
    check (state not in ('paid', 'packed', 'posted', 'withdrawn', 'returned') or paid_at is not null)
);
create unique index orders_one_live_key on orders (run_id, person_id, address_fingerprint)
  where kind = 'paid' and state in ('waiting', 'awaiting_deposit', 'reserved', 'balance_due', 'paid',
    'packed');
create index orders_run_id_state_idx on orders (workshop_id, run_id, state);
create index orders_person_id_placed_at_idx on orders (person_id, placed_at);
create index orders_address_id_idx on orders (address_id);

create table order_lines (
  id uuid default gen_random_uuid() constraint order_lines_pkey primary key,
  workshop_id uuid not null constraint order_lines_workshop_id_fkey
    references workshops (id) on delete restrict,
  order_id uuid not null,
  run_offer_id uuid not null,
  offer_kind text not null,
  position integer not null default 0,
  quantity integer not null,
  unit_price_minor bigint not null,
  unit_surcharge_minor bigint not null default 0,
  unit_deposit_minor bigint not null,
  total_minor bigint not null,
  tax_class text not null,
  tax_basis_points integer not null,
  tax_minor bigint not null,
  choices jsonb not null default '[]',
  posted_by_on date not null,
  revised_posted_by_on date,
  constraint order_lines_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint order_lines_run_offer_id_fkey foreign key (workshop_id, run_offer_id)
    references run_offers (workshop_id, id) on delete restrict,
  constraint order_lines_offer_kind_check check (offer_kind in ('boards', 'kit', 'built')),
  constraint order_lines_position_check check (position >= 0),
  constraint order_lines_quantity_check check (quantity > 0),
  constraint order_lines_unit_price_minor_check check (unit_price_minor >= 0),
  constraint order_lines_unit_surcharge_minor_check check (unit_surcharge_minor >= 0),
  constraint order_lines_unit_deposit_minor_check check (unit_deposit_minor >= 0),
  constraint order_lines_total_minor_check check (total_minor >= 0),
  constraint order_lines_tax_class_check check (tax_class in ('standard', 'reduced', 'zero')),
  constraint order_lines_tax_basis_points_check check (tax_basis_points between 0 and 10000),
  constraint order_lines_tax_minor_check check (tax_minor >= 0),
  constraint order_lines_workshop_id_id_key unique (workshop_id, id),
  constraint order_lines_total_check
    check (total_minor - quantity * (unit_price_minor + unit_surcharge_minor) in (0, tax_minor)),
  constraint order_lines_order_id_position_key unique (order_id, position)
);
create index order_lines_run_offer_id_idx on order_lines (workshop_id, run_offer_id);

create table order_changes (
  id uuid default gen_random_uuid() constraint order_changes_pkey primary key,
  workshop_id uuid not null constraint order_changes_workshop_id_fkey
    references workshops (id) on delete restrict,
  order_id uuid not null,
  number integer not null,
  before jsonb not null,
  after jsonb not null,
  difference_minor bigint not null,
  at timestamptz not null,
  by_person_id uuid not null,
  applied_at timestamptz,
  dropped_at timestamptz,
  constraint order_changes_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint order_changes_number_check check (number > 0),
  constraint order_changes_by_person_id_fkey foreign key (by_person_id)
    references people (id) on delete restrict,
  constraint order_changes_workshop_id_id_key unique (workshop_id, id),
  constraint order_changes_order_id_number_key unique (order_id, number),
  constraint order_changes_one_end_check check (applied_at is null or dropped_at is null)
);
`

const DOWN = `
drop table order_changes, order_lines, orders, addresses;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
