// Files are stored once by their content; texts hold what is written in more than one language.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table files (
  id uuid default gen_random_uuid() constraint files_pkey primary key,
  workshop_id uuid,
  person_id uuid,
  kind text not null,
  owner_scope text not null,
  subject_type text not null,
  subject_id uuid not null,
  role text not null default '',
  position integer not null default 0,
  sha256 text not null,
  media_type text not null,
  byte_count bigint not null,
  file_name text not null,
  alt text not null default '',
  width_px integer,
  height_px integer,
  focal_x integer not null default 50,
  focal_y integer not null default 50,
  duration_ms integer,
  variants jsonb not null default '[]',
  created_at timestamptz not null,
  created_by_person_id uuid,
  erased_at timestamptz,
  constraint files_workshop_id_fkey foreign key (workshop_id) references workshops (id) on delete restrict,
  constraint files_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint files_kind_check check (kind in ('picture', 'sound', 'document', 'paper', 'export')),
  constraint files_owner_scope_check check (owner_scope in ('public', 'workshop', 'person')),
  constraint files_subject_type_check check (length(subject_type) <= 40),
  constraint files_role_check check (length(role) <= 40),
  constraint files_position_check check (position >= 0),
  constraint files_sha256_check check (length(sha256) <= 64),
  constraint files_media_type_check check (length(media_type) <= 100),
  constraint files_file_name_check check (length(file_name) <= 200),
  constraint files_alt_check check (length(alt) <= 500),
  constraint files_width_px_check check (width_px > 0),
  constraint files_height_px_check check (height_px > 0),
  constraint files_focal_x_check check (focal_x between 0 and 100),
  constraint files_focal_y_check check (focal_y between 0 and 100),
  constraint files_duration_ms_check check (duration_ms > 0),
  constraint files_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict
);
create index files_subject_type_subject_id_kind_position_idx on files (subject_type, subject_id, kind, position);
create index files_sha256_idx on files (sha256);
alter table revisions add constraint revisions_first_good_file_id_fkey foreign key (first_good_file_id)
  references files (id) on delete restrict;

create table texts (
  id uuid default gen_random_uuid() constraint texts_pkey primary key,
  workshop_id uuid not null constraint texts_workshop_id_fkey references workshops (id) on delete restrict,
  subject_type text not null,
  subject_id uuid not null,
  field text not null,
  locale text not null,
  body text not null,
  constraint texts_subject_type_check check (length(subject_type) <= 40),
  constraint texts_field_check check (length(field) <= 40),
  constraint texts_locale_check check (length(locale) <= 35),
  constraint texts_body_check check (length(body) <= 20000),
  constraint texts_workshop_id_id_key unique (workshop_id, id),
  constraint texts_subject_type_subject_id_field_locale_key unique (subject_type, subject_id, field, locale)
);
`

const DOWN = `
alter table revisions drop constraint revisions_first_good_file_id_fkey;
drop table texts, files;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
