import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { OfferKind } from '@/lib/contracts/fields'
import type { Order, OrderLine } from '@/models'

type Counted = { kind: OfferKind; recorded: number; passed: number; promised: number }

/**
 * Whether enough units of the run have passed for these lines, beside what other parcels were opened for. A form of which
 * no unit was ever recorded is not asked: boards and kits mostly have no serial numbers.
 * Locks: nothing; the order's run is locked wherever parcels of it are opened. Writes: nothing.
 */
export async function unitsReady(
  tx: Transaction,
  order: Order,
  wanted: readonly { line: OrderLine; quantity: number }[],
): Promise<boolean> {
  const rows = await sequelize.query<Counted>(
    `select u.offer_kind as kind, count(*)::int as recorded,
            (count(*) filter (where u.state = 'passed'))::int as passed,
            coalesce((select sum(pl.quantity) from parcel_lines pl
                      join parcels p on p.id = pl.parcel_id
                      join order_lines ol on ol.id = pl.order_line_id
                      join orders o on o.id = ol.order_id
                      where o.run_id = $runId and ol.offer_kind = u.offer_kind and pl.unit_id is null
                        and p.state <> 'discarded'), 0)::int as promised
     from units u where u.workshop_id = $workshopId and u.run_id = $runId group by u.offer_kind`,
    {
      bind: { workshopId: order.workshopId, runId: order.runId },
      type: QueryTypes.SELECT,
      transaction: tx,
    },
  )
  const wants = new Map<OfferKind, number>()
  for (const { line, quantity } of wanted)
    wants.set(line.offerKind, (wants.get(line.offerKind) ?? 0) + quantity)
  return rows.every(
    ({ kind, passed, promised }) => passed - promised >= (wants.get(kind) ?? 0) || !wants.has(kind),
  )
}
