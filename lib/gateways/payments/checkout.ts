import 'server-only'
import type Stripe from 'stripe'
import { toProvider } from '@/lib/core/money/provider'
import { checkoutFacts, fromSeconds, metadataOf, seconds } from '@/lib/gateways/payments/facts'
import { ok } from '@/lib/core/result'
import { changed, found } from '@/lib/gateways/payments/outcome'
import type { Payments } from '@/lib/gateways/payments/types'

type Part = Pick<Payments, 'ensureCustomer' | 'createCheckout' | 'getCheckout' | 'expireCheckout'>

/** What `checkoutFacts` needs to tell the whole payment. */
export const WHOLE_SESSION = ['payment_intent.latest_charge.balance_transaction']

/** Customers and hosted card sessions. Differences of the fake: fake/README.md. */
export function checkoutCalls(stripe: Stripe): Part {
  const whole = async (account: string, sessionId: string) =>
    checkoutFacts(
      await stripe.checkout.sessions.retrieve(
        sessionId,
        { expand: WHOLE_SESSION },
        { stripeAccount: account },
      ),
    )

  return {
    ensureCustomer: ({ account, key, personId, email, name }) =>
      changed(async () => {
        // A list is consistent at once, the provider's search is not; it also ends a lost answer to an earlier try.
        for await (const customer of stripe.customers.list(
          { email, limit: 100 },
          { stripeAccount: account },
        )) {
          if (customer.metadata['person'] === personId) return { customer: customer.id }
        }
        const made = await stripe.customers.create(
          { email, metadata: { person: personId }, ...(name === undefined ? {} : { name }) },
          { stripeAccount: account, idempotencyKey: key },
        )
        return { customer: made.id }
      }),

    createCheckout: async (args) => {
      const amount = toProvider(args.amount, args.currency)
      if (!amount.ok) return amount
      const metadata = metadataOf(args)
      return changed(async () => {
        const session = await stripe.checkout.sessions.create(
          {
            mode: 'payment',
            customer: args.customer,
            client_reference_id: args.orderId,
            line_items: [
              {
                quantity: 1,
                price_data: {
                  currency: args.currency.toLowerCase(),
                  unit_amount: amount.value,
                  product_data: { name: args.description },
                },
              },
            ],
            // The session's metadata is not copied to its payment intent, so both get it.
            metadata,
            payment_intent_data: {
              metadata,
              description: args.description,
              ...(args.saveCard ? { setup_future_usage: 'off_session' as const } : {}),
            },
            // Else the provider may charge in the buyer's currency instead of the price's.
            adaptive_pricing: { enabled: false },
            success_url: args.successUrl,
            cancel_url: args.cancelUrl,
            expires_at: seconds(args.expiresAt),
          },
          { stripeAccount: args.account, idempotencyKey: args.key },
        )
        return { sessionId: session.id, url: session.url ?? '', expiresAt: fromSeconds(session.expires_at) }
      })
    },

    getCheckout: ({ account, sessionId }) => found(() => whole(account, sessionId)),

    expireCheckout: async ({ account, key, sessionId }) => {
      const expired = await changed(async () => {
        await stripe.checkout.sessions.expire(sessionId, {}, { stripeAccount: account, idempotencyKey: key })
        return whole(account, sessionId)
      })
      if (expired.ok) return expired
      // Refused because it is no longer open, or the answer was lost: the session itself says what it is.
      const now = await found(() => whole(account, sessionId))
      const isSettled = now.ok && now.value.state !== 'open'
      return isSettled ? ok(now.value) : expired
    },
  }
}
