import 'server-only'
import type { Transaction } from 'sequelize'
import { lockParcel } from '@/lib/services/_steps/lock-parcel'
import { moveParcel } from '@/lib/services/_steps/move-parcel'
import { unpackParcel } from '@/lib/services/_steps/unpack-parcel'
import { type Order, OrderLine, Parcel, ParcelLine } from '@/models'

/**
 * Takes the parcels of an order apart that have not left: packed ones are unpacked first, their units are free again, and
 * an order still packed is paid.
 * The caller has locked run and order. Locks: the parcels. Writes: parcels, units, order, audit. Repeat: safe.
 */
export async function discardParcels(tx: Transaction, order: Order, now: Date): Promise<void> {
  const by = { now, byPersonId: null }
  for (const parcelId of await unsentOf(tx, order)) {
    const locked = await lockParcel(tx, { workshopId: order.workshopId, parcelId })
    if (!locked) throw new Error(`the parcel ${parcelId} has gone`)
    const { parcel, lines } = locked
    if (parcel.state === 'packed') await unpackParcel(tx, { order, parcel, lines }, by)
    const gone = await moveParcel(tx, parcel, 'discard', { ...by, change: { discardedAt: now } })
    if (!gone.ok) throw new Error(`the parcel ${parcelId} cannot be discarded from ${parcel.state}`)
  }
}

async function unsentOf(tx: Transaction, order: Order): Promise<string[]> {
  const lines = await ParcelLine.findAll({
    attributes: ['parcelId'],
    include: [
      { model: OrderLine, as: 'orderLine', attributes: [], where: { orderId: order.id }, required: true },
      { model: Parcel, as: 'parcel', attributes: [], where: { state: ['open', 'packed'] }, required: true },
    ],
    transaction: tx,
  })
  return [...new Set(lines.map(({ parcelId }) => parcelId))].sort()
}
