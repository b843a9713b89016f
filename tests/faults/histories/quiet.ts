import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { jobsLeft } from '../support/queue'

/**
 * True once nothing is under way. A disputed order is left out where the bank has the word, and a refund that the buyer's
 * bank sent back waits for the owner.
 */
const QUIET = `
with held as (
  select o.id, o.state, o.disputed_at, o.deposit_minor, o.balance_minor,
    (select coalesce(sum(a.amount_minor), 0) from payment_attempts a where a.order_id = o.id and a.state = 'captured')
    - (select coalesce(sum(r.amount_minor), 0) from refunds r where r.order_id = o.id and r.state <> 'failed') as minor,
    exists (select 1 from refunds r where r.order_id = o.id and r.state = 'failed' and r.sent_at is not null
      and not exists (select 1 from refunds n where n.retry_of_id = r.id)) as is_sent_back
  from orders o where o.run_id = $runId)
select 'order ' || id || ' is ' || state || ' and we hold ' || minor as wrong from held
where disputed_at is null and not is_sent_back and minor <> case when state in ('reserved', 'balance_due') then deposit_minor
  when state = 'paid' then deposit_minor + balance_minor else 0 end
union all
select 'payment ' || a.id || ' is ' || a.state from payment_attempts a
where a.workshop_id = $workshopId and a.state in ('requested', 'unknown')
union all
select 'refund ' || r.id || ' is ' || r.state from refunds r join orders o on o.id = r.order_id
where r.workshop_id = $workshopId and r.state in ('requested', 'sent', 'unknown') and o.disputed_at is null
union all
select 'order ' || id || ' of a run called off is ' || state from orders where run_id = $runId
and state not in ('cancelled', 'expired', 'lapsed') and (select state from runs where id = $runId) = 'called_off'
union all
select 'order ' || id || ' holds a place whose time is over' from orders
where run_id = $runId and state = 'awaiting_deposit' and hold_until <= $now
union all
select 'order ' || id || ' should have been charged' from orders o where run_id = $runId and state = 'balance_due'
and balance_charge_at <= $now and balance_failed_at is null and disputed_at is null
and not exists (select 1 from payment_attempts a where a.order_id = o.id and a.purpose = 'balance')
union all
select 'order ' || id || ' should have lapsed' from orders where run_id = $runId and state = 'balance_due'
and disputed_at is null and balance_failed_at < cast($now as timestamptz) - interval '16 days'
union all
select 'order ' || w.id || ' was overtaken' from orders w join orders o on o.run_id = w.run_id
where w.run_id = $runId and w.state = 'waiting' and o.place_offered_at is not null and o.queue_no > w.queue_no
union all
select 'order ' || w.id || ' waits though it fits' from orders w join runs r on r.id = w.run_id
where w.run_id = $runId and w.state = 'waiting' and r.state in ('taking_deposits', 'locked')
and w.unit_count <= r.maximum - r.committed_units
and w.queue_no = (select min(queue_no) from orders f where f.run_id = w.run_id and f.state = 'waiting')
union all
select 'due and not done: ' || kind || ' ' || coalesce(last_error, '') from due_items where done_at is null and due_at <= $now
union all
select 'mail ' || id || ' is being sent by nobody' from mail_outbox where state = 'sending'`

/** What should not be left once everything has arrived and a minute has passed, in words. */
export async function leftWhenQuiet(about: {
  workshopId: string
  runId: string
  now: Date
}): Promise<string[]> {
  const bind = { ...about, now: about.now.toISOString() }
  const rows = await sequelize.query<{ wrong: string }>(QUIET, { bind, type: QueryTypes.SELECT })
  return [...rows.map(({ wrong }) => wrong), ...(await jobsLeft())]
}
