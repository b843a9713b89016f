// What buyers are told and must be able to act on, and what they tell us.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table notices (
  id uuid default gen_random_uuid() constraint notices_pkey primary key,
  workshop_id uuid not null constraint notices_workshop_id_fkey references workshops (id) on delete restrict,
  run_id uuid not null,
  run_offer_id uuid,
  kind text not null,
  what_changed text,
  number integer not null,
  reason text not null,
  promised_by_on date,
  revised_by_on date,
  sent_at timestamptz not null,
  by_person_id uuid,
  constraint notices_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint notices_run_offer_id_fkey foreign key (workshop_id, run_offer_id)
    references run_offers (workshop_id, id) on delete restrict,
  constraint notices_kind_check check (kind in ('delay', 'change', 'broken_promise')),
  constraint notices_what_changed_check
    check (what_changed in ('revision', 'part', 'decide_by', 'minimum', 'other')),
  constraint notices_number_check check (number > 0),
  constraint notices_reason_check check (length(reason) <= 2000),
  constraint notices_by_person_id_fkey foreign key (by_person_id) references people (id) on delete restrict,
  constraint notices_workshop_id_id_key unique (workshop_id, id)
);
alter table notices
  add constraint notices_run_offer_number_key unique nulls not distinct (run_id, run_offer_id, kind, number);

create table notice_answers (
  id uuid default gen_random_uuid() constraint notice_answers_pkey primary key,
  workshop_id uuid not null constraint notice_answers_workshop_id_fkey
    references workshops (id) on delete restrict,
  notice_id uuid not null,
  order_id uuid not null,
  silence_means text not null,
  answer_by_on date not null,
  answer_by_at timestamptz not null,
  refund_by_on date,
  token_hash text,
  answer text,
  answered_at timestamptz,
  settled_at timestamptz,
  constraint notice_answers_notice_id_fkey foreign key (workshop_id, notice_id)
    references notices (workshop_id, id) on delete restrict,
  constraint notice_answers_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint notice_answers_silence_means_check check (silence_means in ('wait', 'cancel')),
  constraint notice_answers_token_hash_key unique (token_hash),
  constraint notice_answers_answer_check check (answer in ('wait', 'cancel')),
  constraint notice_answers_workshop_id_id_key unique (workshop_id, id),
  constraint notice_answers_notice_id_order_id_key unique (notice_id, order_id),
  constraint notice_answers_answered_check check ((answer is null) = (answered_at is null))
);
create index notice_answers_order_id_idx on notice_answers (order_id);

create table problems (
  id uuid default gen_random_uuid() constraint problems_pkey primary key,
  workshop_id uuid not null constraint problems_workshop_id_fkey references workshops (id) on delete restrict,
  number integer not null,
  order_id uuid not null,
  order_line_id uuid,
  parcel_id uuid,
  kind text not null,
  story text not null,
  state text not null default 'open',
  remedy text,
  answer text,
  lesson_id uuid,
  opened_at timestamptz not null,
  answer_by_on date not null,
  answered_at timestamptz,
  closed_at timestamptz,
  constraint problems_number_check check (number > 0),
  constraint problems_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint problems_order_line_id_fkey foreign key (workshop_id, order_line_id)
    references order_lines (workshop_id, id) on delete restrict,
  constraint problems_parcel_id_fkey foreign key (workshop_id, parcel_id)
    references parcels (workshop_id, id) on delete restrict,
  constraint problems_kind_check
    check (kind in ('missing_part', 'fault', 'wrong', 'damaged', 'lost', 'other')),
  constraint problems_story_check check (length(story) <= 5000),
  constraint problems_state_check check (state in ('open', 'answered', 'closed')),
  constraint problems_remedy_check
    check (remedy in ('part', 'replacement', 'repair', 'part_refund', 'full_refund', 'message')),
  constraint problems_answer_check check (length(answer) <= 5000),
  constraint problems_lesson_id_fkey foreign key (workshop_id, lesson_id)
    references lessons (workshop_id, id) on delete restrict,
  constraint problems_workshop_id_id_key unique (workshop_id, id),
  constraint problems_number_key unique (workshop_id, number),
  constraint problems_closed_check check ((state = 'closed') = (closed_at is not null)),
  constraint problems_answered_check check (state = 'open' or answered_at is not null)
);
create index problems_state_idx on problems (workshop_id, state);
create index problems_order_id_idx on problems (order_id);
alter table parcels add constraint parcels_problem_id_fkey foreign key (workshop_id, problem_id)
  references problems (workshop_id, id) on delete restrict;

create table updates (
  id uuid default gen_random_uuid() constraint updates_pkey primary key,
  workshop_id uuid not null constraint updates_workshop_id_fkey references workshops (id) on delete restrict,
  run_id uuid not null,
  title text not null,
  body text not null,
  audience text not null default 'orders',
  is_public boolean not null default true,
  created_at timestamptz not null,
  by_person_id uuid not null,
  sent_at timestamptz,
  constraint updates_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint updates_title_check check (length(title) <= 120),
  constraint updates_body_check check (length(body) <= 20000),
  constraint updates_audience_check check (audience in ('orders', 'waiting', 'signups', 'all')),
  constraint updates_by_person_id_fkey foreign key (by_person_id) references people (id) on delete restrict,
  constraint updates_workshop_id_id_key unique (workshop_id, id)
);
create index updates_run_id_sent_at_idx on updates (workshop_id, run_id, sent_at);

create table questions (
  id uuid default gen_random_uuid() constraint questions_pkey primary key,
  workshop_id uuid not null constraint questions_workshop_id_fkey
    references workshops (id) on delete restrict,
  module_id uuid not null,
  person_id uuid,
  question text not null,
  answer text not null default '',
  asked_at timestamptz not null,
  answered_at timestamptz,
  published_at timestamptz,
  constraint questions_module_id_fkey foreign key (workshop_id, module_id)
    references modules (workshop_id, id) on delete restrict,
  constraint questions_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint questions_question_check check (length(question) <= 1000),
  constraint questions_answer_check check (length(answer) <= 5000),
  constraint questions_workshop_id_id_key unique (workshop_id, id),
  constraint questions_published_check check (published_at is null or answered_at is not null)
);
create index questions_module_id_idx on questions (workshop_id, module_id);
`

const DOWN = `
alter table parcels drop constraint parcels_problem_id_fkey;
drop table questions, updates, problems, notice_answers, notices;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
