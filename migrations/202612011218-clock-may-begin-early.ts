// The demo is made by acting through half a year, beginning in the past: a clock that never moved may be set back once,
// as long as nobody is known; from then on it only goes forward, as before.
// Locks: none (a table of one row). Back: a clock that still stands in the past is set to the present.

type Run = (sql: string) => Promise<unknown>

const UP = `
alter table clock_offset drop constraint clock_offset_offset_not_negative_check;
create or replace function refuse_clock_back() returns trigger language plpgsql as $$
begin
  if new.offset_ms < old.offset_ms and (old.offset_ms <> 0 or exists (select 1 from people)) then
    raise exception 'business time only goes forward' using errcode = 'check_violation',
      constraint = 'clock_offset_forward';
  end if;
  return new;
end $$;
`

const DOWN = `
update clock_offset set offset_ms = 0 where offset_ms < 0;
create or replace function refuse_clock_back() returns trigger language plpgsql as $$
begin
  if new.offset_ms < old.offset_ms then
    raise exception 'business time only goes forward' using errcode = 'check_violation',
      constraint = 'clock_offset_forward';
  end if;
  return new;
end $$;
alter table clock_offset add constraint clock_offset_offset_not_negative_check check (offset_ms >= 0);
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
