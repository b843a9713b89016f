import 'server-only'
import type { Transaction } from 'sequelize'
import { Offer, OrderLine, Parcel, ParcelLine, RunOffer } from '@/models'

export type LineToPack = { line: OrderLine; offer: Offer; quantity: number }

/**
 * What of an order is in no parcel yet. A parcel taken apart does not count, a lost or returned one does; nor does a
 * replacement, which answers a problem and not the order.
 * Locks: nothing. Writes: nothing.
 */
export async function linesToPack(tx: Transaction, orderId: string): Promise<LineToPack[]> {
  const lines = await OrderLine.findAll({
    where: { orderId },
    include: [
      {
        model: RunOffer,
        as: 'runOffer',
        required: true,
        include: [{ model: Offer, as: 'offer', required: true }],
      },
      { model: ParcelLine, as: 'parcelLines', include: [{ model: Parcel, as: 'parcel' }] },
    ],
    order: [['position', 'ASC']],
    transaction: tx,
  })
  return lines
    .map((line) => ({ line, offer: line.runOffer!.offer!, quantity: line.quantity - inParcels(line) }))
    .filter(({ quantity }) => quantity > 0)
}

function inParcels(line: OrderLine): number {
  return (line.parcelLines ?? [])
    .filter(({ parcel }) => parcel?.state !== 'discarded' && parcel?.problemId === null)
    .reduce((sum, { quantity }) => sum + quantity, 0)
}
