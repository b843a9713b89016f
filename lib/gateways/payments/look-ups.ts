import 'server-only'
import type Stripe from 'stripe'
import { refuse } from '@/lib/core/result'
import { WHOLE_PAYMENT } from '@/lib/gateways/payments/charges'
import { WHOLE_SESSION } from '@/lib/gateways/payments/checkout'
import { checkoutFacts, paymentFacts, refundFacts } from '@/lib/gateways/payments/facts'
import { found } from '@/lib/gateways/payments/outcome'
import type { Payments } from '@/lib/gateways/payments/types'

type Part = Pick<Payments, 'findAttempt' | 'findRefund'>

const inList = (paths: readonly string[]): string[] => paths.map((path) => `data.${path}`)
/** The provider expands four levels at most, counting `data`. */
const SESSIONS = inList(['payment_intent.latest_charge'])

/** The look-ups that end an unknown outcome; they only read, so they may be repeated at will. */
export function lookUpCalls(stripe: Stripe): Part {
  async function sessionOf(account: string, customer: string, attemptId: string) {
    const sessions = stripe.checkout.sessions.list(
      { customer, limit: 100, expand: SESSIONS },
      { stripeAccount: account },
    )
    for await (const session of sessions) {
      if (session.metadata?.['attempt'] !== attemptId) continue
      const whole = await stripe.checkout.sessions.retrieve(
        session.id,
        { expand: WHOLE_SESSION },
        { stripeAccount: account },
      )
      return { kind: 'checkout' as const, checkout: checkoutFacts(whole) }
    }
    return null
  }

  async function paymentOf(account: string, customer: string, attemptId: string) {
    const intents = stripe.paymentIntents.list(
      { customer, limit: 100, expand: inList(WHOLE_PAYMENT) },
      { stripeAccount: account },
    )
    for await (const intent of intents) {
      if (intent.metadata['attempt'] === attemptId)
        return { kind: 'payment' as const, payment: paymentFacts(intent) }
    }
    return null
  }

  return {
    findAttempt: async ({ account, customer, attemptId }) => {
      // A session first: once it is paid it tells both, and before that no payment exists.
      const answer = await found(
        async () =>
          (await sessionOf(account, customer, attemptId)) ?? (await paymentOf(account, customer, attemptId)),
      )
      if (!answer.ok) return answer
      return answer.value === null ? refuse('not_found') : { ok: true, value: answer.value }
    },
    findRefund: async ({ account, payment, refundId }) => {
      const answer = await found(async () => {
        for await (const refund of stripe.refunds.list(
          { payment_intent: payment, limit: 100 },
          { stripeAccount: account },
        )) {
          if (refund.metadata?.['refund'] === refundId) return refundFacts(refund)
        }
        return null
      })
      if (!answer.ok) return answer
      return answer.value === null ? refuse('not_found') : { ok: true, value: answer.value }
    },
  }
}
