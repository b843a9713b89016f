import 'server-only'
import type { Transaction } from 'sequelize'
import type { AddressInput } from '@/lib/contracts/address'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import { orderMistakes } from '@/lib/contracts/order-mistakes'
import { minor } from '@/lib/core/brand'
import { orderTotals } from '@/lib/core/orders/totals'
import { ok, refuse, type Result } from '@/lib/core/result'
import { quoteOrder } from '@/lib/queries/orders/quote-order'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { type Order, OrderLine, PaymentAttempt, type Run, Workshop } from '@/models'

type Refusal = 'payment_in_flight' | 'country_is_settled' | 'weights_missing'

/**
 * Prices an order's postage and tax for another country. What was agreed stays: prices, surcharges, deposits and promises
 * are the order's own, only the balance moves.
 * Refuses: country_is_settled (the balance is paid) · payment_in_flight (it is being paid) · weights_missing · field
 * mistakes. The caller has locked run and order. Writes: the order's sums, its lines' tax. Repeat: safe.
 */
export async function requoteOrder(
  tx: Transaction,
  given: { run: Run; order: Order; address: AddressInput; now: Date },
): Promise<Result<true, Refusal> | FieldRefusal> {
  const { run, order, address, now } = given
  if (order.state === 'paid') return refuse('country_is_settled')
  const paying = { orderId: order.id, purpose: 'balance', state: [...LIVE] }
  if ((await PaymentAttempt.count({ where: paying, transaction: tx })) > 0) return refuse('payment_in_flight')
  const workshop = await Workshop.findByPk(order.workshopId, { transaction: tx, rejectOnEmpty: true })
  const lines = await OrderLine.findAll({
    where: { orderId: order.id },
    order: [['position', 'ASC']],
    transaction: tx,
  })
  const input = {
    address,
    lines: lines.map((line) => ({
      offer: line.offerKind,
      quantity: line.quantity,
      choices: Object.fromEntries(line.choices.map(({ choiceId, answerId }) => [choiceId, answerId])),
    })),
  }
  const quote = await quoteOrder({ workshop, run, input, now, transaction: tx })
  if (!quote.ok) return 'errors' in quote ? atCountry(quote) : quote

  const { postage, postageBasisPoints } = quote.value
  const totals = orderTotals({
    lines: lines.map((line, index) => ({
      ...line.facts(),
      basisPoints: quote.value.lines[index]?.basisPoints ?? 0,
    })),
    postageMinor: postage.priceMinor,
    postageBasisPoints,
    pricesIncludeTax: order.pricesIncludeTax,
  })
  for (const [index, line] of lines.entries())
    await line.update(
      {
        taxBasisPoints: quote.value.lines[index]?.basisPoints ?? 0,
        taxMinor: totals.lines[index]!.taxMinor,
        totalMinor: totals.lines[index]!.totalMinor,
      },
      { transaction: tx },
    )
  await order.update(
    {
      goodsMinor: minor(totals.totalMinor - totals.postageMinor),
      postageMinor: totals.postageMinor,
      postageQuote: postage,
      postageTaxBasisPoints: postageBasisPoints,
      postageTaxMinor: totals.postageTaxMinor,
      taxMinor: totals.taxMinor,
      totalMinor: totals.totalMinor,
      balanceMinor: minor(totals.totalMinor - order.depositMinor),
    },
    { transaction: tx },
  )
  return ok(true)
}

/** The lines were agreed before; whatever speaks against them now lies in the new country. */
function atCountry({ errors }: FieldRefusal): FieldRefusal {
  const own = Object.entries(errors).filter(([field]) => field.startsWith('address.'))
  return refuseFields(
    own.length > 0 ? Object.fromEntries(own) : { 'address.country': orderMistakes.closed(null) },
  )
}
