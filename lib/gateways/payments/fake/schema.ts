/** The fake's books. `due_at` is business time in seconds: when something happens to the object by itself. */
export const SCHEMA = `
create schema if not exists sandbox;
create sequence if not exists sandbox.numbers;
create table if not exists sandbox.objects (
  id text primary key,
  seq bigint generated always as identity unique,
  account text not null,
  kind text not null,
  created bigint not null,
  body jsonb not null,
  hidden jsonb not null default '{}',
  due_at bigint
);
create index if not exists objects_account_kind_idx on sandbox.objects (account, kind, seq desc);
create index if not exists objects_customer_idx on sandbox.objects ((body->>'customer'), kind) where body ? 'customer';
create index if not exists objects_payment_idx on sandbox.objects ((body->>'payment_intent'), kind) where body ? 'payment_intent';
create index if not exists objects_due_idx on sandbox.objects (due_at) where due_at is not null;
create table if not exists sandbox.keys (
  account text not null,
  key text not null,
  request text not null,
  status integer not null,
  body text not null,
  created bigint not null,
  primary key (account, key)
);
create table if not exists sandbox.events (
  seq bigint generated always as identity primary key,
  id text not null,
  account text not null,
  type text not null,
  body text not null,
  due_at timestamptz not null,
  tries integer not null default 0,
  state text not null default 'waiting' check (state in ('waiting', 'delivered', 'lost', 'given_up')),
  answered integer
);
create index if not exists events_waiting_idx on sandbox.events (due_at, seq) where state = 'waiting';
`

/** Empties the books; for tests. */
export const EMPTY_BOOKS = `
truncate sandbox.objects, sandbox.keys, sandbox.events restart identity;
alter sequence sandbox.numbers restart;
`
