import 'server-only'
import { QueryTypes } from 'sequelize'
import type { RunOrderItem } from '@/lib/contracts/run-page'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const PAGE = 50

type Row = Omit<RunOrderItem, 'placedAt'> & { placedAt: Date }

/**
 * A run's orders, newest number first, narrowed to one state when asked; empty for who may not see them. One statement.
 * `next` is the number handed back as `before`; null at the end.
 */
export async function listRunOrders(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  state?: string | undefined
  before?: number | undefined
}): Promise<{ items: RunOrderItem[]; next: number | null }> {
  const { actor, workshopId, runId } = cmd
  if (!can(actor, 'order:list', { workshopId })) return { items: [], next: null }
  const rows = await sequelize.query<Row>(
    `select o.id, o.number, coalesce(a.name, p.name) as name, o.country, o.state, o.kind, o.unit_count as units,
            (select json_agg(json_build_object('offer', l.offer_kind, 'quantity', l.quantity) order by l.position)
             from order_lines l where l.order_id = o.id) as lines,
            o.total_minor as "totalMinor", o.deposit_minor as "depositMinor", o.balance_minor as "balanceMinor",
            o.placed_at as "placedAt", o.disputed_at is not null as "isDisputed"
     from orders o join people p on p.id = o.person_id left join addresses a on a.id = o.address_id
     where o.workshop_id = $workshopId and o.run_id = $runId
       and ($state::text is null or o.state = $state) and ($before::int is null or o.number < $before)
     order by o.number desc limit ${PAGE + 1}`,
    {
      bind: { workshopId, runId, state: cmd.state ?? null, before: cmd.before ?? null },
      type: QueryTypes.SELECT,
    },
  )
  const shown = rows.slice(0, PAGE)
  return {
    items: shown.map((row) => ({ ...row, placedAt: row.placedAt.toISOString() })),
    next: rows.length > PAGE ? (shown.at(-1)?.number ?? null) : null,
  }
}
