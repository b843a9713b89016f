import 'server-only'
import type Stripe from 'stripe'
import { fromProvider } from '@/lib/core/money/provider'
import { asksForCustomer, cardFailure } from '@/lib/gateways/payments/failure'
import type {
  CheckoutFacts,
  DisputeFacts,
  PaymentFacts,
  PaymentPurpose,
  Purpose,
  RefundFacts,
} from '@/lib/gateways/payments/types'

/** The id of something the provider answers either as an id or as the object. */
export function idOf(ref: string | { id: string } | null | undefined): string | null {
  if (ref === null || ref === undefined) return null
  return typeof ref === 'string' ? ref : ref.id
}

/** Whole seconds as the provider counts time, rounded down. */
export const seconds = (at: Date): number => Math.floor(at.getTime() / 1000)
/** The instant of the provider’s seconds. */
export const fromSeconds = (at: number): Date => new Date(at * 1000)

/** Whose payment it is, from the metadata we put there; null for one that did not come from us. */
export function purposeOf(metadata: Stripe.Metadata | null | undefined): PaymentPurpose | null {
  const { order, attempt, purpose } = metadata ?? {}
  if (order === undefined || attempt === undefined || purpose === undefined) return null
  return { orderId: order, attemptId: attempt, purpose: purpose as Purpose }
}

/** The metadata by which `purposeOf` and `findAttempt` know a payment again. */
export function metadataOf({ orderId, attemptId, purpose }: PaymentPurpose): Record<string, string> {
  return { order: orderId, attempt: attemptId, purpose }
}

/** An object only when it was asked for with `expand`. */
export function expanded<T extends object>(ref: string | T | null | undefined): T | null {
  return typeof ref === 'object' ? ref : null
}

function paymentState(intent: Stripe.PaymentIntent): PaymentFacts['state'] {
  switch (intent.status) {
    case 'succeeded':
      return 'captured'
    case 'canceled':
      return 'cancelled'
    case 'processing':
      return 'processing'
    case 'requires_action':
      return 'needs_customer'
    default: {
      const error = intent.last_payment_error
      if (error === null) return 'open'
      return asksForCustomer(error) ? 'needs_customer' : 'failed'
    }
  }
}

/** A payment intent as `getPayment` answers it; fee and card only when charge and balance transaction are expanded. */
export function paymentFacts(intent: Stripe.PaymentIntent): PaymentFacts {
  const currency = intent.currency.toUpperCase()
  const charge = expanded(intent.latest_charge)
  const card = charge?.payment_method_details?.card
  const booked = expanded(charge?.balance_transaction)
  const error = intent.last_payment_error
  const failed = error !== null && intent.status !== 'succeeded' && intent.status !== 'requires_action'
  return {
    payment: intent.id,
    state: paymentState(intent),
    amount: fromProvider(intent.amount, currency),
    currency,
    capturedAmount: fromProvider(intent.amount_received, currency),
    refundedAmount: fromProvider(charge?.amount_refunded ?? 0, currency),
    customer: idOf(intent.customer),
    method: idOf(intent.payment_method) ?? error?.payment_method?.id ?? null,
    card: card
      ? { brand: card.brand ?? 'card', last4: card.last4 ?? '', country: card.country ?? null }
      : null,
    charge: idOf(intent.latest_charge),
    fee: booked ? fromProvider(booked.fee, booked.currency.toUpperCase()) : null,
    feeCurrency: booked ? booked.currency.toUpperCase() : null,
    failure: failed ? cardFailure(error) : null,
    about: purposeOf(intent.metadata),
    disputed: charge?.disputed ?? false,
    createdAt: fromSeconds(intent.created),
  }
}

const SESSION_STATES = ['complete', 'expired'] as const

/** A card session; `payment` only when the payment intent is expanded. */
export function checkoutFacts(session: Stripe.Checkout.Session): CheckoutFacts {
  const currency = (session.currency ?? '').toUpperCase()
  const intent = expanded(session.payment_intent)
  const state = SESSION_STATES.find((known) => known === session.status) ?? 'open'
  return {
    sessionId: session.id,
    state,
    url: state === 'open' ? session.url : null,
    expiresAt: fromSeconds(session.expires_at),
    amount: fromProvider(session.amount_total ?? 0, currency),
    currency,
    about: purposeOf(session.metadata),
    payment: intent === null ? null : paymentFacts(intent),
  }
}

/** A cancelled refund gave the money back to the account: for the buyer it failed. */
const REFUND_STATES: Readonly<Record<string, RefundFacts['state']>> = {
  succeeded: 'succeeded',
  failed: 'failed',
  canceled: 'failed',
}

/** A refund as the provider has it now. */
export function refundFacts(refund: Stripe.Refund): RefundFacts {
  const currency = refund.currency.toUpperCase()
  return {
    id: refund.id,
    state: REFUND_STATES[refund.status ?? ''] ?? 'pending',
    amount: fromProvider(refund.amount, currency),
    currency,
    payment: idOf(refund.payment_intent),
    charge: idOf(refund.charge),
    refundId: refund.metadata?.['refund'] ?? null,
    failure: refund.failure_reason ?? refund.pending_reason ?? null,
    createdAt: fromSeconds(refund.created),
  }
}

const DISPUTE_STATES: Readonly<Record<string, DisputeFacts['state']>> = {
  needs_response: 'needs_response',
  warning_needs_response: 'needs_response',
  appeal_needs_response: 'needs_response',
  won: 'won',
  lost: 'lost',
  warning_closed: 'closed',
  prevented: 'closed',
}

/** A dispute as the provider has it now; its dozen states in five of ours. */
export function disputeFacts(dispute: Stripe.Dispute): DisputeFacts {
  const currency = dispute.currency.toUpperCase()
  const dueBy = dispute.evidence_details.due_by
  return {
    id: dispute.id,
    state: DISPUTE_STATES[dispute.status] ?? 'under_review',
    reason: dispute.reason,
    amount: fromProvider(dispute.amount, currency),
    currency,
    payment: idOf(dispute.payment_intent),
    charge: idOf(dispute.charge) ?? '',
    isWithheld: dispute.balance_transactions.length > 0,
    fee: fromProvider(
      dispute.balance_transactions.reduce((sum, booked) => sum + booked.fee, 0),
      currency,
    ),
    answerBy: dueBy === null ? null : fromSeconds(dueBy),
    createdAt: fromSeconds(dispute.created),
  }
}
