import 'server-only'
import type { OrderInput } from '@/lib/contracts/orders'
import type { OrderQuoteView } from '@/lib/contracts/order-quote'
import type { FieldRefusal } from '@/lib/contracts/problem'
import type { Actor } from '@/lib/core/policy/can'
import { can } from '@/lib/core/policy/can'
import { freeUnits } from '@/lib/core/orders/free'
import { ok, refuse, type Result } from '@/lib/core/result'
import { quoteOrder } from '@/lib/queries/orders/quote-order'
import { Module, Order, Run, RunOffer, TermsVersion, Workshop } from '@/models'

/**
 * What an order would cost if it were placed now, for the page where it is read once more. Nothing is written.
 * Refuses: not_found · run_not_open · weights_missing · field mistakes. Bounded: twelve statements.
 */
export async function getOrderQuote(asked: {
  actor: Actor
  input: OrderInput
  now: Date
}): Promise<Result<OrderQuoteView, 'not_found' | 'run_not_open' | 'weights_missing'> | FieldRefusal> {
  const { actor, input, now } = asked
  if (!can(actor, 'order:place', {})) return refuse('not_found')
  const run = await Run.findByPk(input.run)
  if (!run || run.state === 'draft') return refuse('not_found')
  if (run.state !== 'taking_deposits') return refuse('run_not_open')
  const workshop = await Workshop.findByPk(run.workshopId, { rejectOnEmpty: true })
  const module = await Module.findByPk(run.moduleId, { rejectOnEmpty: true })
  const quote = await quoteOrder({ workshop, run, input, now })
  if (!quote.ok) return quote
  const terms = await TermsVersion.findByPk(run.termsVersionId ?? '', { rejectOnEmpty: true })
  const { totals, postage, lines } = quote.value
  const offers = await RunOffer.findAll({ where: { runId: run.id } })
  const wanted = lines.map(({ offer, quantity }) => ({ runOfferId: offer.runOfferId, quantity }))
  const waiting = await Order.count({ where: { runId: run.id, state: 'waiting' } })
  return ok({
    run: run.id,
    workshop: { slug: workshop.slug, name: workshop.name, country: workshop.country },
    module: { slug: module.slug, name: module.name },
    currency: run.currency,
    lines: lines.map(({ offer, quantity, choices }, index) => ({
      offer: offer.kind,
      quantity,
      totalMinor: totals.lines[index]!.totalMinor,
      choices: choices.map(({ question, label }) => ({ question, answer: label })),
      postedBy: offer.postedByOn,
      note: offer.destination?.note ?? '',
    })),
    country: quote.value.country,
    postageMinor: totals.postageMinor,
    service: postage.serviceName,
    taxMinor: totals.taxMinor,
    totalMinor: totals.totalMinor,
    depositMinor: totals.depositMinor,
    balanceMinor: totals.balanceMinor,
    balanceWhen: run.balanceWhen,
    minimum: run.minimum,
    decideBy: run.decideByOn,
    willWait: waiting > 0 || quote.value.units > freeUnits(run, offers, wanted),
    holdMinutes: Math.max(31, workshop.holdMinutes),
    terms: { number: terms.number, body: terms.body },
  })
}
