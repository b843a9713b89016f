// Mail leaves through an outbox row written with its cause; suppressions outlive the people they protect.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table mail_outbox (
  id uuid default gen_random_uuid() constraint mail_outbox_pkey primary key,
  workshop_id uuid,
  kind text not null,
  person_id uuid not null,
  subject_id text not null,
  version integer not null default 1,
  message_id text not null,
  props jsonb not null,
  secrets jsonb,
  state text not null default 'queued',
  subject_line text,
  body_text text,
  body_html text,
  attempts integer not null default 0,
  last_error text,
  queued_at timestamptz not null,
  claimed_at timestamptz,
  sent_at timestamptz,
  ended_at timestamptz,
  constraint mail_outbox_workshop_id_fkey foreign key (workshop_id)
    references workshops (id) on delete restrict,
  constraint mail_outbox_kind_check check (length(kind) <= 40),
  constraint mail_outbox_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint mail_outbox_subject_id_check check (length(subject_id) <= 100),
  constraint mail_outbox_version_check check (version > 0),
  constraint mail_outbox_message_id_check check (length(message_id) <= 300),
  constraint mail_outbox_message_id_key unique (message_id),
  constraint mail_outbox_state_check
    check (state in ('queued', 'sending', 'sent', 'given_up', 'dropped', 'bounced')),
  constraint mail_outbox_subject_line_check check (length(subject_line) <= 300),
  constraint mail_outbox_attempts_check check (attempts >= 0),
  constraint mail_outbox_last_error_check check (length(last_error) <= 500),
  constraint mail_outbox_kind_subject_id_version_key unique (kind, subject_id, version),
  constraint mail_outbox_sent_check check (state not in ('sent', 'bounced') or sent_at is not null)
);
create index mail_outbox_open_idx on mail_outbox (state)
  where state in ('queued', 'sending');
create index mail_outbox_person_id_queued_at_idx on mail_outbox (person_id, queued_at);
create index mail_outbox_queued_at_idx on mail_outbox (workshop_id, queued_at);

create table suppressions (
  id uuid default gen_random_uuid() constraint suppressions_pkey primary key,
  email_hash text not null,
  workshop_id uuid,
  scope text not null,
  cause text not null,
  at timestamptz not null,
  constraint suppressions_email_hash_check check (length(email_hash) <= 64),
  constraint suppressions_workshop_id_fkey foreign key (workshop_id)
    references workshops (id) on delete restrict,
  constraint suppressions_scope_check check (scope in ('updates', 'invitations', 'all')),
  constraint suppressions_cause_check check (cause in ('unsubscribed', 'bounced', 'complained'))
);
alter table suppressions
  add constraint suppressions_email_workshop_scope_key unique nulls not distinct (email_hash, workshop_id, scope);

create table form_drafts (
  id text constraint form_drafts_pkey primary key,
  form text not null,
  values jsonb not null,
  reason text not null,
  errors jsonb not null,
  expires_at timestamptz not null,
  constraint form_drafts_id_check check (length(id) = 32),
  constraint form_drafts_form_check check (length(form) <= 60),
  constraint form_drafts_reason_check check (length(reason) <= 100)
);
create index form_drafts_expires_at_idx on form_drafts (expires_at);
`

const DOWN = `
drop table form_drafts, suppressions, mail_outbox;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
