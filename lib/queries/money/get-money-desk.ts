import 'server-only'
import { QueryTypes } from 'sequelize'
import type { MoneyDesk, StuckItem } from '@/lib/contracts/money-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { Reconciliation } from '@/models'

/** How long something may be under way before it counts as stuck, by what it is. */
const STUCK = `
  select * from (
    select 'attempt' as kind, a.id, a.state, a.order_id as "order", o.number as "orderNumber",
           a.amount_minor as "amountMinor", a.currency, a.requested_at as since, null::text as detail
    from payment_attempts a join orders o on o.id = a.order_id
    where a.workshop_id = $workshopId and a.state in ('requested', 'unknown')
      and a.requested_at < $now::timestamptz - interval '10 minutes'
    union all
    select 'refund', r.id, r.state, r.order_id, o.number, r.amount_minor, r.currency, r.requested_at,
           coalesce(r.failure_code, case when r.short_by_minor is not null then 'short' end)
    from refunds r join orders o on o.id = r.order_id
    where r.workshop_id = $workshopId and (
      (r.state in ('requested', 'unknown', 'sent') and r.requested_at < $now::timestamptz - interval '10 minutes')
      or (r.state = 'pending' and r.requested_at < $now::timestamptz - interval '2 days')
      or (r.state = 'failed' and not exists (select 1 from refunds again where again.retry_of_id = r.id)
          and o.disputed_at is null))
    union all
    select 'dispute', d.id, d.state, d.order_id, o.number, d.amount_minor, d.currency, d.opened_at, d.reason
    from disputes d join orders o on o.id = d.order_id
    where d.workshop_id = $workshopId and d.state = 'open'
    union all
    select 'event', e.id, 'waiting', null::uuid, null::int, null::bigint, null::text, e.provider_created_at, e.type
    from provider_events e join workshops w on w.provider_account_id = e.account
    where w.id = $workshopId and e.applied_at is null
      and e.provider_created_at < $now::timestamptz - interval '10 minutes'
  ) stuck order by since limit 200`

/**
 * The owner's money: what the last comparison with the provider found, and everything that is stuck. Null for who may not
 * see it. Three statements.
 */
export async function getMoneyDesk(asked: {
  actor: Actor
  workshopId: string
  now: Date
}): Promise<MoneyDesk | null> {
  const { actor, workshopId, now } = asked
  if (!can(actor, 'money:read', { workshopId })) return null
  const last = await Reconciliation.findOne({ where: { workshopId }, order: [['day', 'DESC']] })
  const stuck = await sequelize.query<Omit<StuckItem, 'since'> & { since: Date }>(STUCK, {
    bind: { workshopId, now: now.toISOString() },
    type: QueryTypes.SELECT,
  })
  const ids = (last?.differences ?? []).map(({ id }) => id)
  const orders = await sequelize.query<{ object: string; order: string; number: number }>(
    `select x.object, o.id as order, o.number from (
       select provider_id as object, order_id from payment_attempts where workshop_id = $workshopId
       union all select provider_id, order_id from refunds where workshop_id = $workshopId) x
     join orders o on o.id = x.order_id where x.object = any($ids)`,
    { bind: { workshopId, ids }, type: QueryTypes.SELECT },
  )
  return {
    compared: last && {
      at: last.comparedAt.toISOString(),
      items: last.itemCount,
      differences: last.differences.map((each) => {
        const order = orders.find(({ object }) => object === each.id)
        return { ...each, order: order?.order ?? null, orderNumber: order?.number ?? null }
      }),
    },
    stuck: stuck.map((item) => ({ ...item, since: item.since.toISOString() })),
  }
}
