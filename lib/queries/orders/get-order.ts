import 'server-only'
import type { OrderPageView, RefundView } from '@/lib/contracts/order-page'
import { can, type Actor } from '@/lib/core/policy/can'
import { formatAddress } from '@/lib/core/post/address'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { findOrders, type FoundOrder } from '@/lib/queries/orders/find-orders'
import { toOrderView } from '@/lib/queries/orders/to-order-view'
import { withdrawalOf } from '@/lib/queries/orders/withdrawal-of'
import { type Invoice, ProviderCustomer, type Refund, TermsVersion } from '@/models'

/**
 * An order for its own page; null when the actor may not see it (to them it does not exist). Bounded: a statement per
 * table.
 */
export async function getOrder(asked: {
  actor: Actor
  orderId: string
  now: Date
}): Promise<OrderPageView | null> {
  const [found] = await findOrders({ id: asked.orderId }, 1)
  if (!found) return null
  const { order, run, workshop } = found
  const { workshopId, personId } = order
  if (!can(asked.actor, 'order:read', { workshopId, personId })) return null
  const card = await ProviderCustomer.findOne({ where: { workshopId, personId } })
  const terms = order.termsVersionId === null ? null : await TermsVersion.findByPk(order.termsVersionId)
  const view = toOrderView(found, card, asked.now)
  // The workshop reads an order; what can be done with it here is its buyer's.
  const isOwn = asked.actor.kind === 'person' && asked.actor.personId === personId
  return {
    ...view,
    can: isOwn ? view.can : [],
    timeZone: workshop.timeZone,
    homeCountry: workshop.country,
    country: order.country,
    runState: run.state,
    runReason: run.callOffReason ?? run.lockReason,
    minimum: run.minimum,
    decideBy: run.decideByOn,
    balanceWhen: run.balanceWhen,
    lapseOn: lapseOnOf(found),
    personId,
    withdrawal: withdrawalOf(order, workshop),
    returnTo: workshop.postalAddress
      ? formatAddress(workshop.postalAddress, { script: 'latin', from: '' })
      : [],
    manualReason: can(asked.actor, 'order:list', { workshopId }) ? order.manualReason : null,
    changeToPayMinor: view.can.includes('change') ? (order.changes?.[0]?.differenceMinor ?? 0) : 0,
    isDisputed: order.disputedAt !== null,
    cancelCause: order.cancelCause,
    cancelReason: order.cancelReason,
    choices: (order.lines ?? []).flatMap((line) =>
      line.choices.map(({ question, label }) => ({ line: line.id, question, answer: label })),
    ),
    payment: paymentOf(found),
    refunds: (order.refunds ?? []).filter((each) => !isRepeated(each, order.refunds ?? [])).map(toRefundView),
    invoices: (order.invoices ?? []).map(toInvoiceView),
    terms: terms && { number: terms.number, body: terms.body },
  }
}

function lapseOnOf({ order, workshop }: FoundOrder): string | null {
  if (order.state !== 'balance_due' || order.balanceFailedAt === null) return null
  return addDays(dayIn(order.balanceFailedAt, workshop.timeZone), workshop.lapseAfterDays)
}

function paymentOf({ order }: FoundOrder): OrderPageView['payment'] {
  const [change] = order.changes ?? []
  const purpose = order.state === 'balance_due' ? 'balance' : change ? `change-${change.number}` : 'deposit'
  const last = (order.attempts ?? []).filter((attempt) => attempt.purpose === purpose).at(-1)
  switch (last?.state) {
    case 'sent':
      return last.method === 'checkout' ? 'open' : 'unknown'
    case 'needs_customer':
      return 'bank_asks'
    case 'requested':
    case 'unknown':
      return 'unknown'
    default:
      return 'none'
  }
}

/** A failed refund that was asked for anew is told by its successor. */
const isRepeated = (refund: Refund, all: readonly Refund[]) =>
  all.some(({ retryOfId }) => retryOfId === refund.id)

const REFUND_STATE: Readonly<Record<string, RefundView['state']>> = {
  pending: 'on_its_way',
  succeeded: 'arrived',
  failed: 'failed',
}

function toRefundView(refund: Refund): RefundView {
  return {
    id: refund.id,
    amountMinor: refund.amountMinor,
    currency: refund.currency,
    cause: refund.cause,
    reason: refund.reason,
    state: REFUND_STATE[refund.state] ?? 'waiting',
    requestedAt: refund.requestedAt.toISOString(),
    settledAt: (refund.failedAt ?? refund.succeededAt)?.toISOString() ?? null,
  }
}

const toInvoiceView = ({ id, kind, number, issuedOn, grossMinor, taxMinor, currency }: Invoice) => ({
  id,
  kind,
  number,
  issuedOn,
  grossMinor,
  taxMinor,
  currency,
})
