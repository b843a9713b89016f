import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import type { LockedParcel } from '@/lib/services/_steps/lock-parcel'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { moveParcel } from '@/lib/services/_steps/move-parcel'
import { moveUnit } from '@/lib/services/_steps/move-unit'
import { type Parcel, ParcelLine } from '@/models'

/**
 * Takes a packed parcel back to open: its units are free again, its lines one row each, and an order that was packed is
 * paid. The caller has locked run, order and parcel.
 * Refuses: not_allowed (it is not packed). Writes: parcel, lines, units, order, audit. Repeat: refused.
 */
export async function unpackParcel(
  tx: Transaction,
  { order, parcel, lines }: Pick<LockedParcel, 'order' | 'parcel' | 'lines'>,
  by: { now: Date; byPersonId: string | null },
): Promise<Result<Parcel, 'not_allowed'>> {
  const change = { packedAt: null, packedByPersonId: null, weightConfirmedAt: null }
  const moved = await moveParcel(tx, parcel, 'reopen', { ...by, change })
  if (!moved.ok) return moved
  for (const { unit } of lines) {
    if (!unit) continue
    const released = await moveUnit(tx, unit, 'release', { ...by, orderLineId: null })
    if (!released.ok) throw new Error(`unit ${unit.id} cannot be released from ${unit.state}`)
  }
  await ParcelLine.destroy({ where: { parcelId: parcel.id }, transaction: tx })
  const quantities = new Map<string, number>()
  for (const { orderLineId, quantity } of lines)
    quantities.set(orderLineId, (quantities.get(orderLineId) ?? 0) + quantity)
  await ParcelLine.bulkCreate(
    [...quantities].map(([orderLineId, quantity]) => ({
      workshopId: parcel.workshopId,
      parcelId: parcel.id,
      orderLineId,
      quantity,
    })),
    { transaction: tx },
  )
  if (order.state === 'packed') {
    const unpacked = await moveOrder(tx, order, 'unpack', by)
    if (!unpacked.ok) throw new Error(`order ${order.id} cannot be unpacked`)
  }
  return ok(parcel)
}
