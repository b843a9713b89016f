// The books: double entry, balanced by the database, never changed; invoices without gaps.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table ledger_transfers (
  id uuid default gen_random_uuid() constraint ledger_transfers_pkey primary key,
  workshop_id uuid not null constraint ledger_transfers_workshop_id_fkey
    references workshops (id) on delete restrict,
  source text not null,
  source_id text not null,
  kind text not null,
  order_id uuid,
  run_id uuid,
  at timestamptz not null,
  constraint ledger_transfers_source_check check (length(source) <= 40),
  constraint ledger_transfers_source_id_check check (length(source_id) <= 200),
  constraint ledger_transfers_kind_check check (length(kind) <= 40),
  constraint ledger_transfers_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint ledger_transfers_run_id_fkey foreign key (workshop_id, run_id)
    references runs (workshop_id, id) on delete restrict,
  constraint ledger_transfers_workshop_id_id_key unique (workshop_id, id),
  constraint ledger_transfers_source_source_id_kind_key unique (workshop_id, source, source_id, kind)
);
create index ledger_transfers_at_idx on ledger_transfers (workshop_id, at);
create index ledger_transfers_order_id_idx on ledger_transfers (order_id);
create index ledger_transfers_run_id_idx on ledger_transfers (run_id);
create constraint trigger ledger_transfers_balanced after insert on ledger_transfers
  deferrable initially deferred
  for each row execute function refuse_unbalanced_transfer();
create trigger ledger_transfers_never_changed before update or delete on ledger_transfers
  for each row execute function refuse_change();

create table ledger_entries (
  id uuid default gen_random_uuid() constraint ledger_entries_pkey primary key,
  workshop_id uuid not null constraint ledger_entries_workshop_id_fkey
    references workshops (id) on delete restrict,
  transfer_id uuid not null,
  account text not null,
  currency text not null,
  amount_minor bigint not null,
  position integer not null,
  constraint ledger_entries_transfer_id_fkey foreign key (workshop_id, transfer_id)
    references ledger_transfers (workshop_id, id) on delete restrict,
  constraint ledger_entries_account_check check (length(account) <= 60),
  constraint ledger_entries_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint ledger_entries_position_check check (position >= 0),
  constraint ledger_entries_workshop_id_id_key unique (workshop_id, id),
  constraint ledger_entries_transfer_id_position_key unique (transfer_id, position),
  constraint ledger_entries_amount_not_zero_check check (amount_minor <> 0)
);
create index ledger_entries_account_idx on ledger_entries (workshop_id, account);
create constraint trigger ledger_entries_balanced after insert on ledger_entries deferrable initially deferred
  for each row execute function refuse_unbalanced_transfer();
create trigger ledger_entries_never_changed before update or delete on ledger_entries
  for each row execute function refuse_change();

create table invoices (
  id uuid default gen_random_uuid() constraint invoices_pkey primary key,
  workshop_id uuid not null constraint invoices_workshop_id_fkey references workshops (id) on delete restrict,
  kind text not null,
  series text not null,
  number integer not null,
  order_id uuid not null,
  attempt_id uuid,
  refund_id uuid,
  corrects_invoice_id uuid,
  address_id uuid,
  currency text not null,
  net_minor bigint not null,
  tax_minor bigint not null,
  gross_minor bigint not null,
  tax_country text not null,
  lines jsonb not null,
  issued_on date not null,
  issued_at timestamptz not null,
  constraint invoices_kind_check check (kind in ('prepayment', 'final', 'credit_note')),
  constraint invoices_series_check check (series in ('invoice', 'credit_note')),
  constraint invoices_number_check check (number > 0),
  constraint invoices_order_id_fkey foreign key (workshop_id, order_id)
    references orders (workshop_id, id) on delete restrict,
  constraint invoices_attempt_id_fkey foreign key (workshop_id, attempt_id)
    references payment_attempts (workshop_id, id) on delete restrict,
  constraint invoices_refund_id_fkey foreign key (workshop_id, refund_id)
    references refunds (workshop_id, id) on delete restrict,
  constraint invoices_corrects_invoice_id_fkey foreign key (workshop_id, corrects_invoice_id)
    references invoices (workshop_id, id) on delete restrict,
  constraint invoices_address_id_fkey foreign key (workshop_id, address_id)
    references addresses (workshop_id, id) on delete restrict,
  constraint invoices_currency_check check (currency ~ '^[A-Z]{3}$'),
  constraint invoices_net_minor_check check (net_minor >= 0),
  constraint invoices_tax_minor_check check (tax_minor >= 0),
  constraint invoices_gross_minor_check check (gross_minor >= 0),
  constraint invoices_tax_country_check check (tax_country ~ '^[A-Z]{2}$'),
  constraint invoices_workshop_id_id_key unique (workshop_id, id),
  constraint invoices_series_number_key unique (workshop_id, series, number),
  constraint invoices_gross_check check (gross_minor = net_minor + tax_minor),
  constraint invoices_series_of_kind_check check ((kind = 'credit_note') = (series = 'credit_note')),
  constraint invoices_corrects_check check ((kind = 'credit_note') = (corrects_invoice_id is not null))
);
create index invoices_issued_on_idx on invoices (workshop_id, issued_on);
create index invoices_order_id_idx on invoices (order_id);
create trigger invoices_never_changed before update or delete on invoices
  for each row execute function refuse_change();
`

const DOWN = `
drop table invoices, ledger_entries, ledger_transfers;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
