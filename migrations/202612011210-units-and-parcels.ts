// What is built and what is posted: combined, split and replacement parcels of the lines of orders.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table units (
  id uuid default gen_random_uuid() constraint units_pkey primary key,
  workshop_id uuid not null constraint units_workshop_id_fkey references workshops (id) on delete restrict,
  revision_id uuid not null,
  run_id uuid,
  offer_kind text not null default 'built',
  serial text not null,
  state text not null default 'started',
  order_line_id uuid,
  started_at timestamptz not null,
  passed_at timestamptz,
  scrapped_at timestamptz,
  note text not null default '',
  constraint units_revision_id_fkey foreign key (workshop_id, revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint units_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint units_offer_kind_check check (offer_kind in ('boards', 'kit', 'built')),
  constraint units_serial_check check (length(serial) <= 40),
  constraint units_state_check
    check (state in ('started', 'rework', 'passed', 'allocated', 'posted', 'returned', 'scrapped')),
  constraint units_order_line_id_fkey foreign key (workshop_id, order_line_id)
    references order_lines (workshop_id, id) on delete restrict,
  constraint units_note_check check (length(note) <= 1000),
  constraint units_workshop_id_id_key unique (workshop_id, id),
  constraint units_serial_key unique (workshop_id, serial),
  constraint units_allocated_check
    check ((state in ('allocated', 'posted')) = (order_line_id is not null) or state in ('returned',
      'rework', 'scrapped')),
  constraint units_scrapped_check check ((state = 'scrapped') = (scrapped_at is not null))
);
create index units_run_id_state_idx on units (workshop_id, run_id, state);
create index units_order_line_id_idx on units (order_line_id);

create table pack_batches (
  id uuid default gen_random_uuid() constraint pack_batches_pkey primary key,
  workshop_id uuid not null constraint pack_batches_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid not null,
  name text not null,
  packer_person_id uuid not null,
  created_at timestamptz not null,
  closed_at timestamptz,
  constraint pack_batches_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint pack_batches_name_check check (length(name) <= 80),
  constraint pack_batches_packer_person_id_fkey foreign key (packer_person_id)
    references people (id) on delete restrict,
  constraint pack_batches_workshop_id_id_key unique (workshop_id, id)
);
create index pack_batches_run_id_idx on pack_batches (workshop_id, run_id);

create table parcels (
  id uuid default gen_random_uuid() constraint parcels_pkey primary key,
  workshop_id uuid not null constraint parcels_workshop_id_fkey references workshops (id) on delete restrict,
  number integer not null,
  run_id uuid,
  person_id uuid not null,
  address_id uuid not null,
  batch_id uuid,
  problem_id uuid,
  state text not null default 'open',
  service_id uuid,
  service_name text,
  tracking text,
  tracking_kind text,
  grams integer,
  length_mm integer,
  width_mm integer,
  height_mm integer,
  expected_grams integer,
  weight_confirmed_at timestamptz,
  customs_form text,
  declared_minor bigint,
  currency text not null,
  on_hold_reason text,
  opened_at timestamptz not null,
  printed_at timestamptz,
  label_void_at timestamptz,
  packed_at timestamptz,
  packed_by_person_id uuid,
  handed_over_at timestamptz,
  handed_over_by_person_id uuid,
  claim_by_on date,
  delivered_at timestamptz,
  lost_at timestamptz,
  returned_at timestamptz,
  discarded_at timestamptz,
  constraint parcels_number_check check (number > 0),
  constraint parcels_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint parcels_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint parcels_address_id_fkey foreign key (workshop_id, address_id)
    references addresses (workshop_id, id) on delete restrict,
  constraint parcels_batch_id_fkey foreign key (workshop_id, batch_id)
    references pack_batches (workshop_id, id) on delete restrict,
  constraint parcels_state_check
    check (state in ('open', 'packed', 'handed_over', 'delivered', 'lost', 'returned', 'discarded')),
  constraint parcels_service_id_fkey foreign key (workshop_id, service_id)
    references postage_services (workshop_id, id) on delete restrict,
  constraint parcels_service_name_check check (length(service_name) <= 80),
  constraint parcels_tracking_check check (length(tracking) <= 60),
  constraint parcels_tracking_kind_check check (tracking_kind in ('s10', 'other')),
  constraint parcels_grams_check check (grams > 0),
  constraint parcels_length_mm_check check (length_mm > 0),
  constraint parcels_width_mm_check check (width_mm > 0),
  constraint parcels_height_mm_check check (height_mm > 0),
  constraint parcels_expected_grams_check check (expected_grams > 0),
  constraint parcels_customs_form_check check (customs_form in ('none', 'CN22', 'CN23')),
  constraint parcels_declared_minor_check check (declared_minor >= 0),
  constraint parcels_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint parcels_on_hold_reason_check check (length(on_hold_reason) <= 300),
  constraint parcels_packed_by_person_id_fkey foreign key (packed_by_person_id)
    references people (id) on delete restrict,
  constraint parcels_handed_over_by_person_id_fkey foreign key (handed_over_by_person_id)
    references people (id) on delete restrict,
  constraint parcels_workshop_id_id_key unique (workshop_id, id),
  constraint parcels_number_key unique (workshop_id, number),
  constraint parcels_tracking_form_check
    check (tracking ~ '^[A-Z0-9-]+$' and (tracking is null) = (tracking_kind is null)),
  constraint parcels_packed_check
    check (state in ('open', 'discarded') or (packed_at is not null and packed_by_person_id is not null
      and grams is not null)),
  constraint parcels_handed_over_check
    check (state in ('open', 'packed', 'discarded') or (handed_over_at is not null
      and handed_over_by_person_id is not null and service_name is not null)),
  constraint parcels_discarded_check check ((state = 'discarded') = (discarded_at is not null)),
  constraint parcels_replacement_value_check
    check (problem_id is null or declared_minor is null or declared_minor > 0)
);
create unique index parcels_one_tracking_key on parcels (workshop_id, tracking)
  where tracking is not null;
create index parcels_state_opened_at_idx on parcels (workshop_id, state, opened_at);
create index parcels_person_id_idx on parcels (person_id);
create index parcels_address_id_idx on parcels (address_id);

create table parcel_lines (
  id uuid default gen_random_uuid() constraint parcel_lines_pkey primary key,
  workshop_id uuid not null constraint parcel_lines_workshop_id_fkey
    references workshops (id) on delete restrict,
  parcel_id uuid not null,
  order_line_id uuid not null,
  quantity integer not null,
  unit_id uuid,
  ticked_at timestamptz,
  constraint parcel_lines_parcel_id_fkey foreign key (workshop_id, parcel_id)
    references parcels (workshop_id, id) on delete restrict,
  constraint parcel_lines_order_line_id_fkey foreign key (workshop_id, order_line_id)
    references order_lines (workshop_id, id) on delete restrict,
  constraint parcel_lines_quantity_check check (quantity > 0),
  constraint parcel_lines_unit_id_fkey foreign key (workshop_id, unit_id)
    references units (workshop_id, id) on delete restrict,
  constraint parcel_lines_workshop_id_id_key unique (workshop_id, id),
  constraint parcel_lines_unit_single_check check (unit_id is null or quantity = 1)
);
alter table parcel_lines
  add constraint parcel_lines_parcel_line_unit_key unique nulls not distinct (parcel_id, order_line_id, unit_id);
create index parcel_lines_order_line_id_idx on parcel_lines (order_line_id);
create index parcel_lines_unit_id_idx on parcel_lines (unit_id);
`

const DOWN = `
drop table parcel_lines, parcels, pack_batches, units;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
