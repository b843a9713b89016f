// People apart from everything else, so that "erase me" blanks one place; users, sessions and links hang on them.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table people (
  id uuid default gen_random_uuid() constraint people_pkey primary key,
  email_normal text,
  email_shown text,
  name text,
  locale text not null default 'en',
  created_at timestamptz not null,
  mail_bounced_at timestamptz,
  erased_at timestamptz,
  constraint people_email_normal_check check (length(email_normal) <= 254),
  constraint people_email_normal_key unique (email_normal),
  constraint people_email_shown_check check (length(email_shown) <= 254),
  constraint people_name_check check (length(name) <= 200),
  constraint people_locale_check check (length(locale) <= 35),
  constraint people_email_or_erased_check check (email_normal is not null or erased_at is not null),
  constraint people_email_normal_lower_check
    check (email_normal = lower(email_normal) and email_normal !~ '[[:space:]]'),
  constraint people_erased_blank_check
    check (erased_at is null or (email_normal is null and email_shown is null and name is null))
);

create table users (
  id uuid default gen_random_uuid() constraint users_pkey primary key,
  person_id uuid not null,
  created_at timestamptz not null,
  email_verified_at timestamptz,
  totp_secret_encrypted text,
  totp_confirmed_at timestamptz,
  totp_last_step bigint,
  constraint users_person_id_fkey foreign key (person_id) references people (id) on delete restrict,
  constraint users_person_id_key unique (person_id),
  constraint users_totp_confirmed_check check (totp_confirmed_at is null or totp_secret_encrypted is not null)
);

create table recovery_codes (
  id uuid default gen_random_uuid() constraint recovery_codes_pkey primary key,
  user_id uuid not null,
  code_hash text not null,
  created_at timestamptz not null,
  used_at timestamptz,
  constraint recovery_codes_user_id_fkey foreign key (user_id) references users (id) on delete cascade,
  constraint recovery_codes_code_hash_key unique (code_hash)
);
create index recovery_codes_user_id_idx on recovery_codes (user_id);

create table sessions (
  id uuid default gen_random_uuid() constraint sessions_pkey primary key,
  user_id uuid not null,
  token_hash text not null,
  created_at timestamptz not null,
  expires_at timestamptz not null,
  last_seen_at timestamptz,
  second_factor_at timestamptz,
  device text,
  constraint sessions_user_id_fkey foreign key (user_id) references users (id) on delete cascade,
  constraint sessions_token_hash_key unique (token_hash),
  constraint sessions_device_check check (length(device) <= 200)
);
create index sessions_user_id_idx on sessions (user_id);
create index sessions_expires_at_idx on sessions (expires_at);

create table sign_in_tokens (
  id uuid default gen_random_uuid() constraint sign_in_tokens_pkey primary key,
  email_normal text not null,
  token_hash text not null,
  asked_by_hash text,
  code_hash text,
  code_tries integer not null default 0,
  return_to text,
  created_at timestamptz not null,
  expires_at timestamptz not null,
  constraint sign_in_tokens_email_normal_check check (length(email_normal) <= 254),
  constraint sign_in_tokens_token_hash_key unique (token_hash),
  constraint sign_in_tokens_code_tries_check check (code_tries >= 0),
  constraint sign_in_tokens_return_to_check check (length(return_to) <= 500)
);
create index sign_in_tokens_email_normal_idx on sign_in_tokens (email_normal);
create index sign_in_tokens_expires_at_idx on sign_in_tokens (expires_at);
`

const DOWN = `
drop table sign_in_tokens, sessions, recovery_codes, users, people;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
