import 'server-only'
import type { Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import type { OrderQuote } from '@/lib/queries/orders/quote-order'
import { sumsOf } from '@/lib/services/_steps/write-order'
import { type Order, OrderLine } from '@/models'
import type { OrderTerms } from '@/models/json'

/** Lines and sums of an order as they are. Locks, writes: nothing. */
export async function termsNow(tx: Transaction, order: Order): Promise<OrderTerms> {
  const lines = await OrderLine.findAll({
    where: { orderId: order.id },
    order: [['position', 'ASC']],
    transaction: tx,
  })
  const { addressId, postageMinor, taxMinor, totalMinor, depositMinor } = order
  return {
    lines: lines.map(({ runOfferId, quantity, totalMinor: total, choices }) => ({
      runOfferId,
      quantity,
      totalMinor: total,
      choices,
    })),
    ...{ addressId, postageMinor, taxMinor, totalMinor, depositMinor },
  }
}

/** Lines and sums of an order as a quote makes them, with everything that is then fixed for it. */
export function termsAfter(order: Order, quote: OrderQuote): OrderTerms {
  const { totals } = quote
  return {
    lines: quote.lines.map((line, i) => ({
      runOfferId: line.offer.runOfferId,
      quantity: line.quantity,
      totalMinor: totals.lines[i]!.totalMinor,
      choices: line.choices,
      agreed: {
        offerKind: line.offer.kind,
        unitPriceMinor: line.offer.priceMinor,
        unitSurchargeMinor: minor(line.surchargeMinor),
        unitDepositMinor: line.offer.depositMinor,
        taxClass: line.offer.taxClass,
        taxBasisPoints: line.basisPoints,
        taxMinor: totals.lines[i]!.taxMinor,
        postedByOn: line.offer.postedByOn,
      },
    })),
    sums: sumsOf(quote),
    addressId: order.addressId,
    postageMinor: totals.postageMinor,
    taxMinor: totals.taxMinor,
    totalMinor: totals.totalMinor,
    depositMinor: totals.depositMinor,
  }
}
