import 'server-only'
import type { Transaction } from 'sequelize'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { Offer, type Order, OrderLine, Parcel, ParcelLine, type Run, RunOffer, Unit } from '@/models'

export type LockedParcel = { run: Run; order: Order; parcel: Parcel; lines: ParcelLine[] }

/**
 * Locks a parcel with the order it belongs to, in the order run, order, parcel. Null when the workshop has no such parcel.
 * Throws for a parcel of several orders: none are made yet.
 * Locks: the run, the order, the parcel. Writes: nothing.
 */
export async function lockParcel(
  tx: Transaction,
  { workshopId, parcelId }: { workshopId: string; parcelId: string },
): Promise<LockedParcel | null> {
  const seen = await Parcel.findOne({
    where: { id: parcelId, workshopId },
    attributes: ['id'],
    transaction: tx,
  })
  if (!seen) return null
  const owners = await OrderLine.findAll({
    attributes: ['orderId'],
    include: [{ model: ParcelLine, as: 'parcelLines', attributes: [], where: { parcelId }, required: true }],
    transaction: tx,
  })
  const [orderId, ...others] = new Set(owners.map((line) => line.orderId))
  if (orderId === undefined || others.length > 0)
    throw new Error(`the parcel ${parcelId} belongs to ${others.length + (orderId ? 1 : 0)} orders`)
  const locked = await lockOrder(tx, orderId)
  if (!locked) throw new Error(`the parcel ${parcelId} has lost its order`)
  const parcel = await Parcel.findByPk(parcelId, {
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    rejectOnEmpty: true,
  })
  return { ...locked, parcel, lines: await linesOf(tx, parcelId) }
}

function linesOf(tx: Transaction, parcelId: string): Promise<ParcelLine[]> {
  const offer = { model: Offer, as: 'offer', required: true }
  const runOffer = { model: RunOffer, as: 'runOffer', required: true, include: [offer] }
  return ParcelLine.findAll({
    where: { parcelId },
    include: [
      { model: OrderLine, as: 'orderLine', required: true, include: [runOffer] },
      { model: Unit, as: 'unit' },
    ],
    order: [
      [{ model: OrderLine, as: 'orderLine' }, 'position', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction: tx,
  })
}
