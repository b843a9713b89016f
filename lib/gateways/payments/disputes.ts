import 'server-only'
import type Stripe from 'stripe'
import { disputeFacts } from '@/lib/gateways/payments/facts'
import { changed, found } from '@/lib/gateways/payments/outcome'
import type { DisputeEvidence, Payments } from '@/lib/gateways/payments/types'

type Part = Pick<Payments, 'getDispute' | 'sendEvidence'>

function evidenceParams(evidence: DisputeEvidence): Stripe.DisputeUpdateParams.Evidence {
  const params = {
    customer_name: evidence.customerName,
    customer_email_address: evidence.customerEmail,
    product_description: evidence.productDescription,
    shipping_address: evidence.shippingAddress,
    shipping_carrier: evidence.shippingCarrier,
    shipping_date: evidence.shippingDate,
    shipping_tracking_number: evidence.shippingTracking,
    refund_policy_disclosure: evidence.refundPolicy,
    uncategorized_text: evidence.notes,
  }
  return Object.fromEntries(Object.entries(params).filter(([, text]) => text !== undefined))
}

/** Reading a dispute and answering it with evidence. */
export function disputeCalls(stripe: Stripe): Part {
  return {
    getDispute: ({ account, dispute }) =>
      found(async () =>
        disputeFacts(await stripe.disputes.retrieve(dispute, {}, { stripeAccount: account })),
      ),
    sendEvidence: ({ account, key, dispute, evidence, submit }) =>
      changed(async () =>
        disputeFacts(
          await stripe.disputes.update(
            dispute,
            { evidence: evidenceParams(evidence), submit },
            { stripeAccount: account, idempotencyKey: key },
          ),
        ),
      ),
  }
}
