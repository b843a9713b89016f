import 'server-only'
import type Stripe from 'stripe'
import { refundToProvider } from '@/lib/core/money/provider'
import { refundFacts } from '@/lib/gateways/payments/facts'
import { changed, found } from '@/lib/gateways/payments/outcome'
import type { Payments } from '@/lib/gateways/payments/types'

type Part = Pick<Payments, 'refund' | 'getRefund'>

/** Paying back, in part or all; a refund that fails later is told by an event or `getRefund`. */
export function refundCalls(stripe: Stripe): Part {
  return {
    refund: async ({ account, key, payment, amount, currency, refundId }) => {
      const units = refundToProvider(amount, currency)
      if (!units.ok) return units
      const params: Stripe.RefundCreateParams = {
        payment_intent: payment,
        amount: units.value,
        reason: 'requested_by_customer',
        metadata: { refund: refundId },
      }
      const options = { stripeAccount: account, idempotencyKey: key }
      return changed(async () => refundFacts(await stripe.refunds.create(params, options)), {
        amount: 'more_than_charged',
      })
    },
    getRefund: ({ account, refund }) =>
      found(async () => refundFacts(await stripe.refunds.retrieve(refund, {}, { stripeAccount: account }))),
  }
}
