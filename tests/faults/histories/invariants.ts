import { QueryTypes } from 'sequelize'
import { ATTEMPT_MOVES } from '@/lib/core/states/attempt'
import { MAIL_MOVES } from '@/lib/core/states/mail'
import type { Move } from '@/lib/core/states/next'
import { ORDER_MOVES } from '@/lib/core/states/order'
import { REFUND_MOVES } from '@/lib/core/states/refund'
import { sequelize } from '@/lib/db/sequelize'

type Subject = { workshopId: string; runId: string }

/** True after every single step, whatever is still under way. */
const ALWAYS = `
select 'the transfer ' || t.kind || ' ' || t.id || ' does not balance' as wrong
from ledger_transfers t join ledger_entries e on e.transfer_id = t.id
where t.workshop_id = $workshopId group by t.id, e.currency having sum(e.amount_minor) <> 0
union all
select 'order ' || order_id || ' has ' || count(*) || ' × ' || purpose || ' captured' from payment_attempts
where workshop_id = $workshopId and state = 'captured' and surplus_at is null
group by order_id, purpose having count(*) > 1
union all
select 'attempt ' || a.id || ': more goes back than came' from payment_attempts a join refunds r on r.attempt_id = a.id
where a.workshop_id = $workshopId and r.state <> 'failed'
group by a.id having sum(r.amount_minor) > case when a.state = 'captured' then a.amount_minor else 0 end
union all
select 'the run counts ' || committed_units || ' units' from runs r where r.id = $runId and (committed_units > maximum
  or committed_units <> (select coalesce(sum(unit_count), 0) from orders o where o.run_id = r.id
    and o.state in ('awaiting_deposit', 'reserved', 'balance_due', 'paid', 'packed', 'posted')))
union all
select 'event ' || event_id || ' is there ' || count(*) || ' times' from provider_events
where account = (select provider_account_id from workshops where id = $workshopId)
group by event_id having count(*) > 1
union all
select 'the mail ' || m.kind || ' ' || m.props::text || ' says what is not so' from mail_outbox m
left join orders o on o.id::text = m.subject_id
left join payment_attempts a on a.id::text = m.subject_id
left join refunds f on f.id::text = m.subject_id
join runs r on r.id = $runId
where m.workshop_id = $workshopId and not case m.kind
  when 'deposit_received' then exists (select 1 from payment_attempts p where p.order_id = o.id
    and p.purpose = 'deposit' and p.state = 'captured' and p.surplus_at is null
    and p.amount_minor = (m.props->>'depositMinor')::bigint)
  when 'balance_paid' then a.purpose = 'balance' and a.state = 'captured' and a.surplus_at is null
    and a.amount_minor = (m.props->>'amountMinor')::bigint
  when 'balance_coming' then o.balance_asked_at is not null and o.balance_minor = (m.props->>'amountMinor')::bigint
  when 'card_needs_you' then coalesce(o.balance_failed_at,
    (select p.balance_failed_at from orders p where p.id = a.order_id)) is not null
  when 'order_cancelled' then o.state = 'cancelled' and (m.props->>'refundMinor')::bigint
    <= (select coalesce(sum(p.amount_minor), 0) from payment_attempts p where p.order_id = o.id and p.state = 'captured')
  when 'run_called_off' then r.state = 'called_off' and o.state = 'cancelled'
  when 'run_locked' then r.locked_at is not null
  when 'refund_sent' then f.succeeded_at is not null and f.amount_minor = (m.props->>'amountMinor')::bigint
  when 'order_lapsed' then o.state = 'lapsed'
  when 'place_released' then exists (select 1 from audit_entries h where h.subject_id = o.id and h.event = 'hold_ended')
  else true end`

const AUDIT = `
select a.subject_type as type, a.subject_id as id, a.from_state as "from", a.event, a.to_state as "to",
       lag(a.to_state) over (partition by a.subject_type, a.subject_id order by a.seq) as before
from audit_entries a where a.workshop_id = $workshopId and a.subject_type in ('order', 'attempt', 'refund', 'mail')`

const NOW_IS = `
select s.id, s.state, a.to_state as told from (
  select id, state from orders where workshop_id = $workshopId
  union all select id, state from payment_attempts where workshop_id = $workshopId
  union all select id, state from refunds where workshop_id = $workshopId) s
left join lateral (select to_state from audit_entries where subject_id = s.id order by seq desc limit 1) a on true
where a.to_state is distinct from s.state`

type Moved = {
  type: string
  id: string
  from: string | null
  event: string
  to: string
  before: string | null
}

const MOVES: Readonly<Record<string, readonly Move<string, string>[]>> = {
  order: ORDER_MOVES,
  attempt: ATTEMPT_MOVES,
  refund: REFUND_MOVES,
  mail: MAIL_MOVES,
}

const ask = <T extends object>(text: string, bind: Record<string, string>) =>
  sequelize.query<T>(text, { bind, type: QueryTypes.SELECT })

/** What is wrong now, in words; nothing may be, at any moment. */
export async function wrongNow({ workshopId, runId }: Subject): Promise<string[]> {
  const [always, moved, untold] = await Promise.all([
    ask<{ wrong: string }>(ALWAYS, { workshopId, runId }),
    ask<Moved>(AUDIT, { workshopId }),
    ask<{ id: string; state: string; told: string | null }>(NOW_IS, { workshopId }),
  ])
  const off = moved.filter(({ type, from, event, to, before }) => {
    const isMove = MOVES[type]?.some((each) => each.from === from && each.event === event && each.to === to)
    return from !== before || !isMove
  })
  return [
    ...always.map(({ wrong }) => wrong),
    ...off.map((each) => `moved off its table: ${JSON.stringify(each)}`),
    ...untold.map(({ id, state, told }) => `${id} is ${state}, and was last told to be ${told}`),
  ]
}
