import 'server-only'
import type { Transaction } from 'sequelize'
import { next, PARCEL_MOVES, type ParcelEvent } from '@/lib/core/states/parcel'
import { recordMove } from '@/lib/services/_steps/record-move'
import { type Order, OrderLine, Parcel, ParcelLine } from '@/models'

/**
 * Takes the parcels of an order apart that have not left: packed ones are opened again first.
 * The caller has locked the order. Locks: the parcels. Writes: parcels, audit entries. Repeat: safe.
 */
export async function discardParcels(tx: Transaction, order: Order, now: Date): Promise<void> {
  const lines = await OrderLine.findAll({
    where: { orderId: order.id },
    attributes: ['id'],
    transaction: tx,
  })
  const packed = await ParcelLine.findAll({
    where: { orderLineId: lines.map(({ id }) => id) },
    attributes: ['parcelId'],
    transaction: tx,
  })
  const parcels = await Parcel.findAll({
    where: { id: [...new Set(packed.map(({ parcelId }) => parcelId))], state: ['open', 'packed'] },
    order: [['id', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  for (const parcel of parcels) {
    if (parcel.state === 'packed') await move(tx, parcel, 'reopen', now)
    await move(tx, parcel, 'discard', now)
  }
}

async function move(tx: Transaction, parcel: Parcel, event: ParcelEvent, now: Date): Promise<void> {
  const from = parcel.state
  const to = next(PARCEL_MOVES, from, event)
  if (!to.ok) throw new Error(`parcel ${parcel.id} cannot ${event} from ${from}`)
  const isGone = to.value === 'discarded'
  await parcel.update({ state: to.value, discardedAt: isGone ? now : null }, { transaction: tx })
  await recordMove(tx, {
    workshopId: parcel.workshopId,
    subjectType: 'parcel',
    subjectId: parcel.id,
    from,
    event,
    to: to.value,
    byPersonId: null,
    at: now,
  })
}
