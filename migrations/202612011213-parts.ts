// What a revision is made of, what it costs and what is in stock; stock is the sum of its moves.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table parts (
  id uuid default gen_random_uuid() constraint parts_pkey primary key,
  workshop_id uuid not null constraint parts_workshop_id_fkey references workshops (id) on delete restrict,
  code text not null,
  description text not null default '',
  maker text not null default '',
  maker_code text not null default '',
  value text not null default '',
  lifecycle text not null default 'active',
  needs_sample boolean not null default false,
  sample_checked_on date,
  sample_fits boolean,
  sample_note text,
  sample_by_person_id uuid,
  storage_place text not null default '',
  polarity_note text not null default '',
  created_at timestamptz not null,
  constraint parts_code_check check (length(code) <= 80),
  constraint parts_description_check check (length(description) <= 300),
  constraint parts_maker_check check (length(maker) <= 120),
  constraint parts_maker_code_check check (length(maker_code) <= 120),
  constraint parts_value_check check (length(value) <= 80),
  constraint parts_lifecycle_check check (lifecycle in ('active', 'not_for_new_designs', 'last_buy', 'gone')),
  constraint parts_sample_note_check check (length(sample_note) <= 1000),
  constraint parts_sample_by_person_id_fkey foreign key (sample_by_person_id)
    references people (id) on delete restrict,
  constraint parts_storage_place_check check (length(storage_place) <= 40),
  constraint parts_polarity_note_check check (length(polarity_note) <= 300),
  constraint parts_workshop_id_id_key unique (workshop_id, id),
  constraint parts_code_key unique (workshop_id, code),
  constraint parts_sample_check check ((sample_checked_on is null) = (sample_fits is null))
);

create table part_alternates (
  id uuid default gen_random_uuid() constraint part_alternates_pkey primary key,
  workshop_id uuid not null constraint part_alternates_workshop_id_fkey
    references workshops (id) on delete restrict,
  part_id uuid not null,
  alternate_id uuid not null,
  note text not null default '',
  constraint part_alternates_part_id_fkey foreign key (workshop_id, part_id)
    references parts (workshop_id, id) on delete restrict,
  constraint part_alternates_alternate_id_fkey foreign key (workshop_id, alternate_id)
    references parts (workshop_id, id) on delete restrict,
  constraint part_alternates_note_check check (length(note) <= 500),
  constraint part_alternates_workshop_id_id_key unique (workshop_id, id),
  constraint part_alternates_part_id_alternate_id_key unique (part_id, alternate_id),
  constraint part_alternates_not_itself_check check (part_id <> alternate_id)
);

create table revision_lines (
  id uuid default gen_random_uuid() constraint revision_lines_pkey primary key,
  workshop_id uuid not null constraint revision_lines_workshop_id_fkey
    references workshops (id) on delete restrict,
  revision_id uuid not null,
  part_id uuid not null,
  position integer not null,
  designators text not null default '',
  per_unit integer not null,
  placed_by jsonb not null,
  choice_answer_id uuid,
  attrition_basis_points integer not null default 0,
  attrition_at_least integer not null default 0,
  supply_pins integer not null default 0,
  note text not null default '',
  constraint revision_lines_revision_id_fkey foreign key (workshop_id, revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint revision_lines_part_id_fkey foreign key (workshop_id, part_id)
    references parts (workshop_id, id) on delete restrict,
  constraint revision_lines_position_check check (position >= 0),
  constraint revision_lines_designators_check check (length(designators) <= 4000),
  constraint revision_lines_per_unit_check check (per_unit > 0),
  constraint revision_lines_choice_answer_id_fkey foreign key (workshop_id, choice_answer_id)
    references choice_answers (workshop_id, id) on delete restrict,
  constraint revision_lines_attrition_basis_points_check check (attrition_basis_points between 0 and 10000),
  constraint revision_lines_attrition_at_least_check check (attrition_at_least >= 0),
  constraint revision_lines_supply_pins_check check (supply_pins >= 0),
  constraint revision_lines_note_check check (length(note) <= 500),
  constraint revision_lines_workshop_id_id_key unique (workshop_id, id),
  constraint revision_lines_revision_id_position_key unique (revision_id, position)
);
create index revision_lines_part_id_idx on revision_lines (workshop_id, part_id);

create table quotes (
  id uuid default gen_random_uuid() constraint quotes_pkey primary key,
  workshop_id uuid not null constraint quotes_workshop_id_fkey references workshops (id) on delete restrict,
  part_id uuid not null,
  supplier text not null,
  supplier_code text not null default '',
  currency text not null,
  moq integer not null default 1,
  multiple integer not null default 1,
  setup_minor bigint not null default 0,
  lead_days integer,
  quoted_on date not null,
  stock_seen integer,
  stock_seen_on date,
  constraint quotes_part_id_fkey foreign key (workshop_id, part_id)
    references parts (workshop_id, id) on delete restrict,
  constraint quotes_supplier_check check (length(supplier) <= 120),
  constraint quotes_supplier_code_check check (length(supplier_code) <= 120),
  constraint quotes_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint quotes_moq_check check (moq > 0),
  constraint quotes_multiple_check check (multiple > 0),
  constraint quotes_setup_minor_check check (setup_minor >= 0),
  constraint quotes_lead_days_check check (lead_days >= 0),
  constraint quotes_stock_seen_check check (stock_seen >= 0),
  constraint quotes_workshop_id_id_key unique (workshop_id, id),
  constraint quotes_stock_seen_when_check check ((stock_seen is null) = (stock_seen_on is null))
);
create index quotes_part_id_idx on quotes (workshop_id, part_id);

create table quote_breaks (
  id uuid default gen_random_uuid() constraint quote_breaks_pkey primary key,
  workshop_id uuid not null constraint quote_breaks_workshop_id_fkey
    references workshops (id) on delete restrict,
  quote_id uuid not null,
  from_quantity integer not null,
  unit_price numeric(18,6) not null,
  constraint quote_breaks_quote_id_fkey foreign key (workshop_id, quote_id)
    references quotes (workshop_id, id) on delete cascade,
  constraint quote_breaks_from_quantity_check check (from_quantity > 0),
  constraint quote_breaks_workshop_id_id_key unique (workshop_id, id),
  constraint quote_breaks_quote_id_from_quantity_key unique (quote_id, from_quantity),
  constraint quote_breaks_unit_price_not_negative_check check (unit_price >= 0)
);

create table purchase_lines (
  id uuid default gen_random_uuid() constraint purchase_lines_pkey primary key,
  workshop_id uuid not null constraint purchase_lines_workshop_id_fkey
    references workshops (id) on delete restrict,
  run_id uuid,
  part_id uuid,
  name text not null,
  supplier text not null,
  quantity integer not null,
  received_count integer not null default 0,
  unit_price numeric(18,6) not null,
  currency text not null,
  cost_minor bigint not null,
  rate numeric(18,9),
  rate_on date,
  is_at_risk boolean not null default false,
  state text not null default 'planned',
  planned_at timestamptz not null,
  ordered_at timestamptz,
  due_on date,
  ended_at timestamptz,
  constraint purchase_lines_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint purchase_lines_part_id_fkey foreign key (workshop_id, part_id)
    references parts (workshop_id, id) on delete restrict,
  constraint purchase_lines_name_check check (length(name) <= 200),
  constraint purchase_lines_supplier_check check (length(supplier) <= 120),
  constraint purchase_lines_quantity_check check (quantity > 0),
  constraint purchase_lines_received_count_check check (received_count >= 0),
  constraint purchase_lines_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint purchase_lines_cost_minor_check check (cost_minor >= 0),
  constraint purchase_lines_state_check
    check (state in ('planned', 'ordered', 'part_received', 'received', 'cancelled')),
  constraint purchase_lines_workshop_id_id_key unique (workshop_id, id),
  constraint purchase_lines_unit_price_not_negative_check check (unit_price >= 0),
  constraint purchase_lines_received_check check (received_count <= quantity),
  constraint purchase_lines_rate_check check ((rate is null) = (rate_on is null) and rate > 0)
);
create index purchase_lines_run_id_state_idx on purchase_lines (workshop_id, run_id, state);

create table lots (
  id uuid default gen_random_uuid() constraint lots_pkey primary key,
  workshop_id uuid not null constraint lots_workshop_id_fkey references workshops (id) on delete restrict,
  purchase_line_id uuid,
  part_id uuid,
  number integer not null,
  quantity integer not null,
  state text not null default 'received',
  sampling jsonb,
  accepted_count integer,
  reason text,
  received_at timestamptz not null,
  judged_at timestamptz,
  constraint lots_purchase_line_id_fkey foreign key (workshop_id, purchase_line_id)
    references purchase_lines (workshop_id, id) on delete restrict,
  constraint lots_part_id_fkey foreign key (workshop_id, part_id)
    references parts (workshop_id, id) on delete restrict,
  constraint lots_number_check check (number > 0),
  constraint lots_quantity_check check (quantity > 0),
  constraint lots_state_check check (state in ('received', 'accepted', 'rejected', 'sorted', 'sent_back')),
  constraint lots_accepted_count_check check (accepted_count >= 0),
  constraint lots_reason_check check (length(reason) <= 1000),
  constraint lots_workshop_id_id_key unique (workshop_id, id),
  constraint lots_number_key unique (workshop_id, number),
  constraint lots_accepted_within_check check (accepted_count <= quantity)
);
create index lots_state_idx on lots (workshop_id, state);

create table stock_moves (
  id uuid default gen_random_uuid() constraint stock_moves_pkey primary key,
  workshop_id uuid not null constraint stock_moves_workshop_id_fkey
    references workshops (id) on delete restrict,
  part_id uuid not null,
  lot_id uuid,
  run_id uuid,
  change integer not null,
  cause text not null,
  note text not null default '',
  by_person_id uuid not null,
  at timestamptz not null,
  constraint stock_moves_part_id_fkey foreign key (workshop_id, part_id)
    references parts (workshop_id, id) on delete restrict,
  constraint stock_moves_lot_id_fkey foreign key (workshop_id, lot_id)
    references lots (workshop_id, id) on delete restrict,
  constraint stock_moves_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint stock_moves_cause_check
    check (cause in ('counted', 'received', 'used', 'spare', 'scrapped', 'sold')),
  constraint stock_moves_note_check check (length(note) <= 300),
  constraint stock_moves_by_person_id_fkey foreign key (by_person_id)
    references people (id) on delete restrict,
  constraint stock_moves_workshop_id_id_key unique (workshop_id, id),
  constraint stock_moves_change_not_zero_check check (change <> 0)
);
create index stock_moves_part_id_idx on stock_moves (workshop_id, part_id);
create trigger stock_moves_never_changed before update or delete on stock_moves
  for each row execute function refuse_change();
`

const DOWN = `
drop table stock_moves, lots, purchase_lines, quote_breaks, quotes, revision_lines, part_alternates, parts;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
