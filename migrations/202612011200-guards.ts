// The guards other files hang on their tables: rows never changed, transfers that balance, refunds within what was
// captured, a clock that only goes forward. Locks: none. Back: drops the functions.

type Run = (sql: string) => Promise<unknown>

const UP = `
create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation';
end $$;

-- An address may only be blanked, once, keeping its id, owner and country.
create function refuse_change_unless_erasing() returns trigger language plpgsql as $$
begin
  if tg_op = 'UPDATE' and old.erased_at is null and new.erased_at is not null
     and (new.id, new.workshop_id, new.person_id, new.country, new.created_at)
         = (old.id, old.workshop_id, old.person_id, old.country, old.created_at) then
    return new;
  end if;
  raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation';
end $$;

-- Runs at commit, once per transfer and entry written.
create function refuse_unbalanced_transfer() returns trigger language plpgsql as $$
declare
  transfer uuid := case tg_table_name when 'ledger_transfers' then new.id else (to_jsonb(new) ->> 'transfer_id')::uuid end;
  entries integer;
begin
  if exists (select from ledger_entries where transfer_id = transfer group by currency having sum(amount_minor) <> 0) then
    raise exception 'ledger transfer % does not sum to zero', transfer
      using errcode = 'check_violation', constraint = 'ledger_entries_balanced';
  end if;
  select count(*) into entries from ledger_entries where transfer_id = transfer;
  if entries < 2 then
    raise exception 'ledger transfer % has % entries', transfer, entries
      using errcode = 'check_violation', constraint = 'ledger_transfers_balanced';
  end if;
  return null;
end $$;

-- Takes the lock of the attempt, so that two refunds at once are counted one after the other.
create function refuse_refund_above_captured() returns trigger language plpgsql as $$
declare
  attempt record;
  repaid bigint;
begin
  select * into attempt from payment_attempts where id = new.attempt_id for update;
  if attempt.state <> 'captured' or attempt.currency <> new.currency then
    raise exception 'refund % is not of a captured payment in its currency', new.id
      using errcode = 'check_violation', constraint = 'refunds_of_captured';
  end if;
  select sum(amount_minor) into repaid from refunds where attempt_id = new.attempt_id and state <> 'failed';
  if repaid > attempt.amount_minor then
    raise exception 'refunds of attempt % exceed what was captured', attempt.id
      using errcode = 'check_violation', constraint = 'refunds_within_captured';
  end if;
  return null;
end $$;

create function refuse_clock_back() returns trigger language plpgsql as $$
begin
  if new.offset_ms < old.offset_ms then
    raise exception 'business time only goes forward' using errcode = 'check_violation',
      constraint = 'clock_offset_forward';
  end if;
  return new;
end $$;
`

const DOWN = `
drop function refuse_clock_back, refuse_refund_above_captured, refuse_unbalanced_transfer,
  refuse_change_unless_erasing, refuse_change;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
