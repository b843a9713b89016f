import 'server-only'
import type Stripe from 'stripe'
import { fromProvider } from '@/lib/core/money/provider'
import { ok, refuse, type Result } from '@/lib/core/result'
import { accountFacts } from '@/lib/gateways/payments/accounts'
import type { PaymentNews, ProviderChange, ProviderEvent } from '@/lib/gateways/payments/changes'
import {
  disputeFacts,
  fromSeconds,
  idOf,
  paymentFacts,
  purposeOf,
  refundFacts,
} from '@/lib/gateways/payments/facts'
import { asksForCustomer, cardFailure } from '@/lib/gateways/payments/failure'

function paymentNews(intent: Stripe.PaymentIntent): PaymentNews {
  const { payment, charge, customer, method, amount, currency, about } = paymentFacts(intent)
  return { payment, charge, customer, method, amount, currency, about }
}

function checkoutCompleted(session: Stripe.Checkout.Session): ProviderChange {
  const currency = (session.currency ?? '').toUpperCase()
  return {
    kind: 'checkout_completed',
    session: session.id,
    paid: session.payment_status === 'paid',
    payment: idOf(session.payment_intent),
    customer: idOf(session.customer),
    amount: fromProvider(session.amount_total ?? 0, currency),
    currency,
    about: purposeOf(session.metadata),
  }
}

function paymentRefused(intent: Stripe.PaymentIntent): ProviderChange {
  const error = intent.last_payment_error ?? {}
  if (asksForCustomer(error)) return { kind: 'payment_needs_customer', ...paymentNews(intent) }
  return { kind: 'payment_failed', failure: cardFailure(error), ...paymentNews(intent) }
}

function feeKnown(charge: Stripe.Charge): ProviderChange {
  const payment = idOf(charge.payment_intent)
  if (payment === null || charge.balance_transaction === null) return { kind: 'ignored' }
  return { kind: 'fee_known', payment, charge: charge.id }
}

function payoutChanged(payout: Stripe.Payout): ProviderChange {
  const currency = payout.currency.toUpperCase()
  const gone = payout.status === 'failed' || payout.status === 'canceled'
  const state = gone ? 'failed' : payout.status === 'paid' ? 'paid' : 'pending'
  return {
    kind: 'payout_changed',
    payout: payout.id,
    state,
    amount: fromProvider(payout.amount, currency),
    currency,
  }
}

function changeOf(event: Stripe.Event): ProviderChange {
  switch (event.type) {
    case 'checkout.session.completed':
    case 'checkout.session.async_payment_succeeded':
      return checkoutCompleted(event.data.object)
    case 'checkout.session.expired':
      return {
        kind: 'checkout_expired',
        session: event.data.object.id,
        about: purposeOf(event.data.object.metadata),
      }
    case 'payment_intent.succeeded':
      return { kind: 'payment_captured', ...paymentNews(event.data.object) }
    case 'payment_intent.requires_action':
      return { kind: 'payment_needs_customer', ...paymentNews(event.data.object) }
    case 'payment_intent.payment_failed':
      return paymentRefused(event.data.object)
    case 'payment_intent.canceled':
      return { kind: 'payment_cancelled', ...paymentNews(event.data.object) }
    case 'charge.updated':
      return feeKnown(event.data.object)
    case 'refund.created':
    case 'refund.updated':
    case 'refund.failed':
      return { kind: 'refund_changed', ...refundFacts(event.data.object) }
    case 'charge.dispute.created':
    case 'charge.dispute.updated':
    case 'charge.dispute.closed':
    case 'charge.dispute.funds_withdrawn':
    case 'charge.dispute.funds_reinstated':
      return { kind: 'dispute_changed', ...disputeFacts(event.data.object) }
    case 'account.updated':
      return { kind: 'account_changed', ...accountFacts(event.data.object) }
    case 'account.application.deauthorized':
      return { kind: 'account_lost' }
    case 'payout.created':
    case 'payout.updated':
    case 'payout.paid':
    case 'payout.failed':
    case 'payout.canceled':
      return payoutChanged(event.data.object)
    default:
      return { kind: 'ignored' }
  }
}

function looksLikeEvent(value: unknown): value is Stripe.Event {
  const event = value as Partial<Stripe.Event> | null
  return (
    typeof event === 'object' &&
    event !== null &&
    typeof event.id === 'string' &&
    typeof event.type === 'string' &&
    typeof event.created === 'number' &&
    typeof event.data?.object === 'object'
  )
}

/**
 * Reads the stored text of a verified event again.
 * Refuses: 'malformed' when it is no event, or not of the shape its type promises.
 */
export function readEvent(raw: string): Result<ProviderEvent, 'malformed'> {
  try {
    const event: unknown = JSON.parse(raw)
    if (!looksLikeEvent(event)) return refuse('malformed')
    const object = event.data.object as { id?: unknown }
    return ok({
      eventId: event.id,
      account: event.account ?? '',
      type: event.type,
      objectId: typeof object.id === 'string' ? object.id : '',
      happenedAt: fromSeconds(event.created),
      livemode: event.livemode,
      change: changeOf(event),
      raw,
    })
  } catch {
    // Signed, yet not of the published shape (bad JSON, a currency that does not exist): stored by nobody.
    return refuse('malformed')
  }
}
