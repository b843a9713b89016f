import 'server-only'
import type { Transaction } from 'sequelize'
import type { OfferKind } from '@/lib/contracts/fields'
import { type Order, OrderLine } from '@/models'

/** The posted-by day of each offer in an order: the revised one where a delay was told. */
export async function promisesOf(
  tx: Transaction,
  order: Order,
): Promise<{ offer: OfferKind; postedBy: string }[]> {
  const lines = await OrderLine.findAll({
    where: { orderId: order.id },
    order: [['position', 'ASC']],
    transaction: tx,
  })
  return lines.map((line) => ({
    offer: line.offerKind,
    postedBy: line.revisedPostedByOn ?? line.postedByOn,
  }))
}
