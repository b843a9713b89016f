import 'server-only'
import type { Transaction } from 'sequelize'
import type { OrderChangeInput } from '@/lib/contracts/orders'
import type { FieldRefusal } from '@/lib/contracts/problem'
import { refuse, type Result } from '@/lib/core/result'
import { quoteOrder, type OrderQuote } from '@/lib/queries/orders/quote-order'
import { Address, type Order, type Run, Workshop } from '@/models'

/**
 * Prices an order with other lines, to the address it has. Eight statements, however many lines.
 * Refuses: not_found (no address) · field mistakes · weights_missing.
 */
export async function quoteChange(asked: {
  order: Order
  run: Run
  input: OrderChangeInput
  now: Date
  transaction?: Transaction
}): Promise<Result<OrderQuote, 'not_found' | 'weights_missing'> | FieldRefusal> {
  const { order, run, input, now, transaction } = asked
  const how = transaction && { transaction }
  const workshop = await Workshop.findByPk(order.workshopId, { rejectOnEmpty: true, ...how })
  const address = order.addressId === null ? null : await Address.findByPk(order.addressId, how)
  if (!address || address.erasedAt !== null) return refuse('not_found')
  const { latin, lines, ...facts } = address.facts()
  return quoteOrder({
    workshop,
    run,
    input: {
      lines: input.lines,
      address: {
        ...facts,
        lines: [...lines],
        ...(latin && { latin: { ...latin, lines: [...latin.lines] } }),
      },
    },
    now,
    ...how,
  })
}
