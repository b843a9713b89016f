import 'server-only'
import type { OrderChangeInput } from '@/lib/contracts/orders'
import type { ChangeQuoteView } from '@/lib/contracts/order-quote'
import type { FieldRefusal } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { quoteChange } from '@/lib/queries/orders/quote-change'
import { Order, Run } from '@/models'

/**
 * What an order would become with other lines, for the page where it is read once more. Nothing is written. Bounded: ten
 * statements.
 * Refuses: not_found · not_allowed (not under deposit) · run_locked · weights_missing · field mistakes.
 */
export async function getChangeQuote(asked: {
  actor: Actor
  orderId: string
  input: OrderChangeInput
  now: Date
}): Promise<
  Result<ChangeQuoteView, 'not_found' | 'not_allowed' | 'run_locked' | 'weights_missing'> | FieldRefusal
> {
  const { actor, input, now } = asked
  const order = await Order.findByPk(asked.orderId)
  if (!order || !can(actor, 'order:change', { personId: order.personId })) return refuse('not_found')
  if (order.state !== 'reserved') return refuse('not_allowed')
  const run = await Run.findByPk(order.runId, { rejectOnEmpty: true })
  if (run.state !== 'taking_deposits') return refuse('run_locked')
  const quote = await quoteChange({ order, run, input, now })
  if (!quote.ok) return quote
  const { totals, lines } = quote.value
  const { totalMinor, depositMinor, balanceMinor, currency } = order
  return ok({
    order: order.id,
    number: order.number,
    currency,
    lines: lines.map(({ offer, quantity, choices }, i) => ({
      offer: offer.kind,
      quantity,
      totalMinor: totals.lines[i]!.totalMinor,
      choices: choices.map(({ question, label }) => ({ question, answer: label })),
      postedBy: offer.postedByOn,
    })),
    before: { totalMinor, depositMinor, balanceMinor },
    after: {
      goodsMinor: totals.totalMinor - totals.postageMinor,
      postageMinor: totals.postageMinor,
      taxMinor: totals.taxMinor,
      totalMinor: totals.totalMinor,
      depositMinor: totals.depositMinor,
      balanceMinor: totals.balanceMinor,
    },
  })
}
