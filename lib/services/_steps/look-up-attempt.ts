import 'server-only'
import { payments } from '@/lib/gateways/payments'
import type { CardFailure, CheckoutFacts, PaymentFacts } from '@/lib/gateways/payments/types'
import type { PaymentAttempt } from '@/models'

/** How a payment stands at the provider. */
export type Truth =
  /** The card page is open. */
  | { state: 'open'; sessionId: string; url: string | null; expiresAt: Date }
  | { state: 'captured'; payment: PaymentFacts; sessionId: string | null }
  | { state: 'needs_customer'; payment: PaymentFacts }
  | { state: 'failed'; payment: PaymentFacts; failure: CardFailure | null }
  /** On its way; wait. */
  | { state: 'in_flight'; payment: PaymentFacts | null; sessionId: string | null }
  /** Can never be captured any more. */
  | { state: 'ended'; sessionId: string | null }
  | { state: 'never_had_it' }
  | { state: 'unavailable' }

export function truthOfCheckout({ sessionId, ...session }: CheckoutFacts): Truth {
  if (session.payment?.state === 'captured') return { state: 'captured', payment: session.payment, sessionId }
  if (session.state === 'open')
    return { state: 'open', sessionId, url: session.url, expiresAt: session.expiresAt }
  if (session.state === 'expired') return { state: 'ended', sessionId }
  return { state: 'in_flight', payment: session.payment, sessionId }
}

export function truthOfPayment(payment: PaymentFacts): Truth {
  switch (payment.state) {
    case 'captured':
      return { state: 'captured', payment, sessionId: null }
    case 'needs_customer':
      return { state: 'needs_customer', payment }
    case 'failed':
      return { state: 'failed', payment, failure: payment.failure }
    case 'cancelled':
      return { state: 'ended', sessionId: null }
    default:
      return { state: 'in_flight', payment, sessionId: null }
  }
}

/**
 * Asks the provider how a payment stands: by the id it gave, or, when its answer was lost, by the attempt's own mark.
 * Outside any transaction; the gateway's time limits hold. Repeat: safe.
 */
export async function lookUpAttempt(attempt: PaymentAttempt): Promise<Truth> {
  const account = attempt.providerAccountId
  if (attempt.providerSessionId !== null) {
    const found = await payments().getCheckout({ account, sessionId: attempt.providerSessionId })
    return found.ok ? truthOfCheckout(found.value) : { state: 'unavailable' }
  }
  if (attempt.providerId !== null) {
    const found = await payments().getPayment({ account, payment: attempt.providerId })
    return found.ok ? truthOfPayment(found.value) : { state: 'unavailable' }
  }
  const customer = String(attempt.params['customer'])
  const found = await payments().findAttempt({ account, customer, attemptId: attempt.id })
  if (!found.ok) return { state: found.reason === 'not_found' ? 'never_had_it' : 'unavailable' }
  return found.value.kind === 'checkout'
    ? truthOfCheckout(found.value.checkout)
    : truthOfPayment(found.value.payment)
}
