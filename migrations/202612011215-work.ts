// Work that outlives a request: bulk jobs counted from their items, keys of requests, things due, the clock, the audit trail.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table bulk_jobs (
  id uuid default gen_random_uuid() constraint bulk_jobs_pkey primary key,
  workshop_id uuid not null constraint bulk_jobs_workshop_id_fkey
    references workshops (id) on delete restrict,
  kind text not null,
  run_id uuid,
  params jsonb not null default '{}',
  created_at timestamptz not null,
  by_person_id uuid,
  done_at timestamptz,
  constraint bulk_jobs_kind_check check (length(kind) <= 40),
  constraint bulk_jobs_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint bulk_jobs_by_person_id_fkey foreign key (by_person_id) references people (id) on delete restrict,
  constraint bulk_jobs_workshop_id_id_key unique (workshop_id, id)
);
create index bulk_jobs_run_id_idx on bulk_jobs (workshop_id, run_id);

create table bulk_items (
  id uuid default gen_random_uuid() constraint bulk_items_pkey primary key,
  workshop_id uuid not null constraint bulk_items_workshop_id_fkey
    references workshops (id) on delete restrict,
  bulk_job_id uuid not null,
  subject_id uuid not null,
  position integer not null,
  state text not null default 'waiting',
  reason text,
  done_at timestamptz,
  constraint bulk_items_bulk_job_id_fkey foreign key (workshop_id, bulk_job_id)
    references bulk_jobs (workshop_id, id) on delete restrict,
  constraint bulk_items_position_check check (position >= 0),
  constraint bulk_items_state_check check (state in ('waiting', 'done', 'failed')),
  constraint bulk_items_reason_check check (length(reason) <= 100),
  constraint bulk_items_workshop_id_id_key unique (workshop_id, id),
  constraint bulk_items_bulk_job_id_subject_id_key unique (bulk_job_id, subject_id),
  constraint bulk_items_done_check check ((state = 'waiting') = (done_at is null))
);
create index bulk_items_waiting_idx on bulk_items (bulk_job_id, position)
  where state = 'waiting';

create table request_keys (
  id uuid default gen_random_uuid() constraint request_keys_pkey primary key,
  scope text not null,
  key text not null,
  body_hash text not null,
  status integer,
  answer text,
  started_at timestamptz not null,
  constraint request_keys_scope_check check (length(scope) <= 500),
  constraint request_keys_key_check check (length(key) <= 255),
  constraint request_keys_body_hash_check check (length(body_hash) <= 64),
  constraint request_keys_status_check check (status between 100 and 599),
  constraint request_keys_scope_key_key unique (scope, key),
  constraint request_keys_answered_check check ((status is null) = (answer is null))
);
create index request_keys_started_at_idx on request_keys (started_at);

create table due_items (
  id uuid default gen_random_uuid() constraint due_items_pkey primary key,
  kind text not null,
  subject_id uuid not null,
  workshop_id uuid,
  due_at timestamptz not null,
  done_at timestamptz,
  attempts integer not null default 0,
  last_error text,
  constraint due_items_kind_check check (length(kind) <= 40),
  constraint due_items_workshop_id_fkey foreign key (workshop_id)
    references workshops (id) on delete restrict,
  constraint due_items_attempts_check check (attempts >= 0),
  constraint due_items_last_error_check check (length(last_error) <= 500),
  constraint due_items_kind_subject_id_key unique (kind, subject_id)
);
create index due_items_open_idx on due_items (due_at)
  where done_at is null;

create table audit_entries (
  id uuid default gen_random_uuid() constraint audit_entries_pkey primary key,
  workshop_id uuid,
  subject_type text not null,
  subject_id uuid not null,
  from_state text,
  event text not null,
  to_state text not null,
  by_person_id uuid,
  at timestamptz not null,
  note text,
  seq bigint generated always as identity,
  constraint audit_entries_workshop_id_fkey foreign key (workshop_id)
    references workshops (id) on delete restrict,
  constraint audit_entries_subject_type_check check (length(subject_type) <= 40),
  constraint audit_entries_from_state_check check (length(from_state) <= 40),
  constraint audit_entries_event_check check (length(event) <= 60),
  constraint audit_entries_to_state_check check (length(to_state) <= 40),
  constraint audit_entries_by_person_id_fkey foreign key (by_person_id)
    references people (id) on delete restrict,
  constraint audit_entries_note_check check (length(note) <= 2000)
);
create index audit_entries_subject_type_subject_id_seq_idx on audit_entries (subject_type, subject_id, seq);
create index audit_entries_at_idx on audit_entries (workshop_id, at);
create trigger audit_entries_never_changed before update or delete on audit_entries
  for each row execute function refuse_change();

create table clock_offset (
  id integer not null default 1 constraint clock_offset_pkey primary key,
  offset_ms bigint not null default 0,
  advanced_at timestamptz,
  constraint clock_offset_one_row_check check (id = 1),
  constraint clock_offset_offset_not_negative_check check (offset_ms >= 0)
);
create trigger clock_offset_forward before update on clock_offset
  for each row execute function refuse_clock_back();
insert into clock_offset (id) values (1);

create table rate_limits (key varchar(255) constraint rate_limits_pkey primary key, points integer not null default 0, expire bigint);
`

const DOWN = `
drop table rate_limits, clock_offset, audit_entries, due_items, request_keys, bulk_items, bulk_jobs;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
