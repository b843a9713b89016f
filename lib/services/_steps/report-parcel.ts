import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import type { Reported } from '@/lib/contracts/tracking'
import type { Result } from '@/lib/core/result'
import type { ParcelEvent } from '@/lib/core/states/parcel'
import { sequelize } from '@/lib/db/sequelize'
import type { LockedParcel } from '@/lib/services/_steps/lock-parcel'
import { moveParcel } from '@/lib/services/_steps/move-parcel'
import { moveUnit } from '@/lib/services/_steps/move-unit'
import type { Parcel } from '@/models'

const EVENTS: Readonly<Record<Reported, ParcelEvent>> = {
  delivered: 'deliver',
  lost: 'lose',
  returned: 'return',
  found: 'find',
}

/**
 * Notes what became of a parcel on its way. With the last piece of an order the day of its arrival is known, from which the
 * time to withdraw runs; units that came back are returned.
 * The caller has locked run, order and parcel. Refuses: not_allowed. Writes: parcel, order, units, audit.
 */
export async function reportParcelState(
  tx: Transaction,
  { order, parcel, lines }: LockedParcel,
  state: Reported,
  by: { now: Date; byPersonId: string },
): Promise<Result<Parcel, 'not_allowed'>> {
  const { now } = by
  const change = {
    delivered: { deliveredAt: now },
    found: { deliveredAt: now },
    lost: { lostAt: now },
    returned: { returnedAt: now },
  }[state]
  const moved = await moveParcel(tx, parcel, EVENTS[state], { ...by, change })
  if (!moved.ok) return moved
  if (state === 'returned')
    for (const { unit } of lines) if (unit?.state === 'posted') await moveUnit(tx, unit, 'return', by)
  if (parcel.deliveredAt !== null && (await piecesOnTheirWay(tx, order.id)) === 0)
    await order.update({ deliveredAt: now }, { transaction: tx })
  return moved
}

/** Pieces of an order that are not known to have arrived; replacements aside. */
async function piecesOnTheirWay(tx: Transaction, orderId: string): Promise<number> {
  const [row] = await sequelize.query<{ left: number }>(
    `select (sum(ol.quantity) - coalesce(sum(d.quantity), 0))::int as left from order_lines ol
     left join lateral (select sum(pl.quantity) as quantity from parcel_lines pl join parcels p on p.id = pl.parcel_id
                        where pl.order_line_id = ol.id and p.delivered_at is not null) d on true
     where ol.order_id = $orderId`,
    { bind: { orderId }, type: QueryTypes.SELECT, transaction: tx },
  )
  return Math.max(0, row?.left ?? 0)
}
