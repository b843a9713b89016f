// A file of parts or quotes lies here as it was sent until somebody has looked at it and confirmed.
// Locks: none (new table). Back: drops it; imports not confirmed yet are lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table part_imports (
  id uuid default gen_random_uuid() constraint part_imports_pkey primary key,
  workshop_id uuid not null constraint part_imports_workshop_id_fkey references workshops (id) on delete restrict,
  revision_id uuid not null,
  kind text not null,
  file_name text not null default '',
  content bytea not null,
  encoding text,
  delimiter text,
  columns jsonb,
  placed_by jsonb not null default '{}',
  created_at timestamptz not null,
  created_by_person_id uuid not null,
  constraint part_imports_revision_id_fkey foreign key (workshop_id, revision_id)
    references revisions (workshop_id, id) on delete restrict,
  constraint part_imports_kind_check check (kind in ('lines', 'quotes')),
  constraint part_imports_file_name_check check (length(file_name) <= 200),
  constraint part_imports_content_check check (octet_length(content) <= 4000000),
  constraint part_imports_encoding_check
    check (encoding in ('utf-8', 'windows-1252', 'utf-16le', 'utf-16be')),
  constraint part_imports_delimiter_check check (delimiter in ('comma', 'semicolon', 'tab', 'pipe')),
  constraint part_imports_created_by_person_id_fkey foreign key (created_by_person_id)
    references people (id) on delete restrict,
  constraint part_imports_workshop_id_id_key unique (workshop_id, id)
);
create index part_imports_created_at_idx on part_imports (workshop_id, created_at);
`

const DOWN = `
drop table part_imports;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
