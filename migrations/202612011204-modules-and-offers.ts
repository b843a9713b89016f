// What is made and in which forms it is sold; offers are templates, a run copies their prices.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table modules (
  id uuid default gen_random_uuid() constraint modules_pkey primary key,
  workshop_id uuid not null constraint modules_workshop_id_fkey references workshops (id) on delete restrict,
  slug text not null,
  name text not null,
  one_line text not null default '',
  story text not null default '',
  state text not null default 'draft',
  width_hp integer not null,
  depth_mm integer not null,
  plus12_ma integer not null default 0,
  minus12_ma integer not null default 0,
  plus5_ma integer not null default 0,
  controls jsonb not null default '[]',
  specification jsonb not null default '[]',
  cautions text not null default '',
  video_url text,
  hide_interest_below_ten boolean not null default false,
  created_at timestamptz not null,
  published_at timestamptz,
  archived_at timestamptz,
  constraint modules_slug_check check (slug ~ '^[a-z0-9]([a-z0-9-]{0,38}[a-z0-9])?$'),
  constraint modules_name_check check (length(name) <= 120),
  constraint modules_one_line_check check (length(one_line) <= 200),
  constraint modules_story_check check (length(story) <= 20000),
  constraint modules_state_check check (state in ('draft', 'published', 'archived')),
  constraint modules_width_hp_check check (width_hp between 1 and 200),
  constraint modules_depth_mm_check check (depth_mm between 1 and 300),
  constraint modules_plus12_ma_check check (plus12_ma >= 0),
  constraint modules_minus12_ma_check check (minus12_ma >= 0),
  constraint modules_plus5_ma_check check (plus5_ma >= 0),
  constraint modules_cautions_check check (length(cautions) <= 5000),
  constraint modules_video_url_check check (length(video_url) <= 500),
  constraint modules_workshop_id_id_key unique (workshop_id, id),
  constraint modules_slug_key unique (workshop_id, slug),
  constraint modules_archived_check check ((state = 'archived') = (archived_at is not null)),
  constraint modules_published_check check (state = 'draft' or published_at is not null)
);

create table revisions (
  id uuid default gen_random_uuid() constraint revisions_pkey primary key,
  workshop_id uuid not null constraint revisions_workshop_id_fkey
    references workshops (id) on delete restrict,
  module_id uuid not null,
  letter text not null,
  state text not null default 'draft',
  note text not null default '',
  board_width_mm integer,
  board_height_mm integer,
  created_at timestamptz not null,
  first_good_at timestamptz,
  first_good_by_person_id uuid,
  first_good_how text,
  first_good_file_id uuid,
  constraint revisions_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint revisions_letter_check check (length(letter) <= 2),
  constraint revisions_state_check check (state in ('draft', 'testing', 'proven', 'superseded')),
  constraint revisions_note_check check (length(note) <= 5000),
  constraint revisions_board_width_mm_check check (board_width_mm > 0),
  constraint revisions_board_height_mm_check check (board_height_mm > 0),
  constraint revisions_first_good_by_person_id_fkey foreign key (first_good_by_person_id)
    references people (id) on delete restrict,
  constraint revisions_first_good_how_check check (length(first_good_how) <= 2000),
  constraint revisions_workshop_id_id_key unique (workshop_id, id),
  constraint revisions_module_id_letter_key unique (module_id, letter),
  constraint revisions_letter_form_check check (letter ~ '^[A-Z]{1,2}$'),
  constraint revisions_first_good_check
    check (first_good_at is null or (first_good_by_person_id is not null and first_good_how is not null))
);

create table lessons (
  id uuid default gen_random_uuid() constraint lessons_pkey primary key,
  workshop_id uuid not null constraint lessons_workshop_id_fkey references workshops (id) on delete restrict,
  module_id uuid not null,
  found_on_revision_id uuid not null,
  symptom text not null,
  how_found text not null default '',
  cause text not null default '',
  remedy text not null default '',
  created_at timestamptz not null,
  created_by_person_id uuid not null,
  mended_in_revision_id uuid,
  waived_at timestamptz,
  waived_by_person_id uuid,
  waived_reason text,
  constraint lessons_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint lessons_found_on_revision_id_fkey foreign key (workshop_id, found_on_revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint lessons_symptom_check check (length(symptom) <= 2000),
  constraint lessons_how_found_check check (length(how_found) <= 2000),
  constraint lessons_cause_check check (length(cause) <= 2000),
  constraint lessons_remedy_check check (length(remedy) <= 2000),
  constraint lessons_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint lessons_mended_in_revision_id_fkey foreign key (workshop_id, mended_in_revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint lessons_waived_by_person_id_fkey foreign key (waived_by_person_id)
    references people (id) on delete restrict,
  constraint lessons_waived_reason_check check (length(waived_reason) <= 2000),
  constraint lessons_workshop_id_id_key unique (workshop_id, id),
  constraint lessons_waived_check
    check ((waived_at is null) = (waived_reason is null) and (waived_at is null) = (waived_by_person_id is null))
);
create index lessons_module_id_idx on lessons (workshop_id, module_id);

create table offers (
  id uuid default gen_random_uuid() constraint offers_pkey primary key,
  workshop_id uuid not null constraint offers_workshop_id_fkey references workshops (id) on delete restrict,
  module_id uuid not null,
  kind text not null,
  price_minor bigint,
  deposit_minor bigint,
  price_list_minor jsonb not null default '[]',
  tax_class text not null default 'standard',
  contents text not null default '',
  net_weight_g integer,
  packed_weight_g integer,
  length_mm integer,
  width_mm integer,
  height_mm integer,
  customs_description text not null default '',
  customs_code text not null default '',
  customs_origin text,
  cautions text not null default '',
  age_from integer not null default 14,
  position integer not null default 0,
  withdrawn_at timestamptz,
  constraint offers_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint offers_kind_check check (kind in ('boards', 'kit', 'built')),
  constraint offers_price_minor_check check (price_minor > 0),
  constraint offers_deposit_minor_check check (deposit_minor > 0),
  constraint offers_tax_class_check check (tax_class in ('standard', 'reduced', 'zero')),
  constraint offers_contents_check check (length(contents) <= 5000),
  constraint offers_net_weight_g_check check (net_weight_g > 0),
  constraint offers_packed_weight_g_check check (packed_weight_g > 0),
  constraint offers_length_mm_check check (length_mm > 0),
  constraint offers_width_mm_check check (width_mm > 0),
  constraint offers_height_mm_check check (height_mm > 0),
  constraint offers_customs_description_check check (length(customs_description) <= 200),
  constraint offers_customs_code_check check (length(customs_code) <= 12),
  constraint offers_customs_origin_check check (customs_origin ~ '^[A-Z]{2}$'),
  constraint offers_cautions_check check (length(cautions) <= 5000),
  constraint offers_age_from_check check (age_from >= 0),
  constraint offers_position_check check (position >= 0),
  constraint offers_workshop_id_id_key unique (workshop_id, id),
  constraint offers_module_id_kind_key unique (module_id, kind),
  constraint offers_deposit_in_price_check
    check ((price_minor is null) = (deposit_minor is null) and deposit_minor <= price_minor),
  constraint offers_customs_code_digits_check check (customs_code ~ '^[0-9]*$')
);

create table choices (
  id uuid default gen_random_uuid() constraint choices_pkey primary key,
  workshop_id uuid not null constraint choices_workshop_id_fkey references workshops (id) on delete restrict,
  offer_id uuid not null,
  question text not null,
  position integer not null default 0,
  asked_after_lock boolean not null default false,
  answer_within_days integer not null default 14,
  retired_at timestamptz,
  constraint choices_offer_id_fkey foreign key (workshop_id, offer_id)
    references offers (workshop_id, id) on delete restrict,
  constraint choices_question_check check (length(question) <= 120),
  constraint choices_position_check check (position >= 0),
  constraint choices_answer_within_days_check check (answer_within_days > 0),
  constraint choices_workshop_id_id_key unique (workshop_id, id)
);
create index choices_offer_id_idx on choices (workshop_id, offer_id);

create table choice_answers (
  id uuid default gen_random_uuid() constraint choice_answers_pkey primary key,
  workshop_id uuid not null constraint choice_answers_workshop_id_fkey
    references workshops (id) on delete restrict,
  choice_id uuid not null,
  label text not null,
  surcharge_minor bigint not null default 0,
  position integer not null,
  is_default boolean not null default false,
  constraint choice_answers_choice_id_fkey foreign key (workshop_id, choice_id)
    references choices (workshop_id, id) on delete restrict,
  constraint choice_answers_label_check check (length(label) <= 80),
  constraint choice_answers_surcharge_minor_check check (surcharge_minor >= 0),
  constraint choice_answers_position_check check (position between 1 and 4),
  constraint choice_answers_workshop_id_id_key unique (workshop_id, id),
  constraint choice_answers_choice_id_position_key unique (choice_id, position)
);
create unique index choice_answers_one_default_key on choice_answers (choice_id)
  where is_default;

create table destinations (
  id uuid default gen_random_uuid() constraint destinations_pkey primary key,
  workshop_id uuid not null constraint destinations_workshop_id_fkey
    references workshops (id) on delete restrict,
  offer_id uuid not null,
  country text not null,
  state text not null default 'open',
  reason text,
  duties text not null default 'none',
  asks_phone boolean not null default false,
  asks_tax_number boolean not null default false,
  note text not null default '',
  note_on date,
  constraint destinations_offer_id_fkey foreign key (workshop_id, offer_id)
    references offers (workshop_id, id) on delete restrict,
  constraint destinations_country_check check (country ~ '^[A-Z]{2}$'),
  constraint destinations_state_check check (state in ('open', 'closed', 'paused')),
  constraint destinations_reason_check check (length(reason) <= 300),
  constraint destinations_duties_check check (duties in ('none', 'buyer_pays', 'prepaid', 'refused')),
  constraint destinations_note_check check (length(note) <= 1000),
  constraint destinations_workshop_id_id_key unique (workshop_id, id),
  constraint destinations_offer_id_country_key unique (offer_id, country),
  constraint destinations_closed_reason_check check (state = 'open' or reason is not null)
);
`

const DOWN = `
drop table destinations, choice_answers, choices, offers, lessons, revisions, modules;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
