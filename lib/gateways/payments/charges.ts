import 'server-only'
import Stripe from 'stripe'
import { toProvider } from '@/lib/core/money/provider'
import { ok, type Result } from '@/lib/core/result'
import { metadataOf, paymentFacts } from '@/lib/gateways/payments/facts'
import { cardFailure } from '@/lib/gateways/payments/failure'
import { changed, found } from '@/lib/gateways/payments/outcome'
import type { ChangeReason, ChargeOutcome, PaymentFacts, Payments } from '@/lib/gateways/payments/types'

type Part = Pick<Payments, 'chargeSavedCard' | 'finishPayment' | 'cancelPayment' | 'getPayment' | 'getMethod'>

/** What `paymentFacts` needs to tell fee, card and refunds. */
export const WHOLE_PAYMENT = ['latest_charge.balance_transaction']

function outcomeOf(payment: PaymentFacts): ChargeOutcome {
  switch (payment.state) {
    case 'captured':
    case 'needs_customer':
    case 'processing':
      return { state: payment.state, payment }
    default:
      return { state: 'failed', payment, failure: payment.failure ?? cardFailure({}) }
  }
}

/** Charging a saved card, and what becomes of that payment. Differences of the fake: fake/README.md. */
export function chargeCalls(stripe: Stripe): Part {
  const whole = async (account: string, id: string) =>
    paymentFacts(
      await stripe.paymentIntents.retrieve(id, { expand: WHOLE_PAYMENT }, { stripeAccount: account }),
    )

  /** A refused card arrives as an error (HTTP 402) that carries the payment; for us it is an answer. */
  async function tried<T>(
    account: string,
    call: () => Promise<T>,
  ): Promise<Result<{ refused: PaymentFacts } | { intent: T }, ChangeReason>> {
    return changed(async () => {
      try {
        return { intent: await call() }
      } catch (error) {
        const intent = error instanceof Stripe.errors.StripeCardError ? error.payment_intent : undefined
        if (intent === undefined) throw error
        const refused = paymentFacts(intent)
        // The payment may have moved on since (an idempotent replay of an old refusal): the object is the truth.
        const now = await whole(account, intent.id).catch(() => refused)
        return { refused: now }
      }
    })
  }

  return {
    chargeSavedCard: async (args) => {
      const amount = toProvider(args.amount, args.currency)
      if (!amount.ok) return amount
      const answer = await tried(args.account, () =>
        stripe.paymentIntents.create(
          {
            amount: amount.value,
            currency: args.currency.toLowerCase(),
            customer: args.customer,
            payment_method: args.method,
            description: args.description,
            metadata: metadataOf(args),
            automatic_payment_methods: { enabled: true },
            off_session: true,
            confirm: true,
            expand: WHOLE_PAYMENT,
          },
          { stripeAccount: args.account, idempotencyKey: args.key },
        ),
      )
      if (!answer.ok) return answer
      return ok(
        outcomeOf('refused' in answer.value ? answer.value.refused : paymentFacts(answer.value.intent)),
      )
    },

    finishPayment: async ({ account, key, payment, method, returnUrl }) => {
      const before = await changed(() => whole(account, payment))
      if (!before.ok) return before
      if (before.value.state === 'captured') return ok(outcomeOf(before.value))
      const card = method ?? before.value.method
      const answer = await tried(account, () =>
        stripe.paymentIntents.confirm(
          payment,
          {
            return_url: returnUrl,
            off_session: false,
            expand: WHOLE_PAYMENT,
            ...(card === null ? {} : { payment_method: card }),
          },
          { stripeAccount: account, idempotencyKey: key },
        ),
      )
      if (!answer.ok) return answer
      if ('refused' in answer.value) return ok(outcomeOf(answer.value.refused))
      const facts = paymentFacts(answer.value.intent)
      const url = answer.value.intent.next_action?.redirect_to_url?.url
      return ok(url ? { state: 'go' as const, url, payment: facts } : outcomeOf(facts))
    },

    cancelPayment: async ({ account, key, payment }) => {
      const cancelled = await changed(async () => {
        await stripe.paymentIntents.cancel(
          payment,
          { cancellation_reason: 'abandoned' },
          { stripeAccount: account, idempotencyKey: key },
        )
        return whole(account, payment)
      })
      if (cancelled.ok) return cancelled
      // Too late, cancelled before, or the answer was lost: the payment itself says what it is.
      const now = await found(() => whole(account, payment))
      const isSettled = now.ok && (now.value.state === 'captured' || now.value.state === 'cancelled')
      return isSettled ? ok(now.value) : cancelled
    },

    getPayment: ({ account, payment }) => found(() => whole(account, payment)),

    getMethod: ({ account, customer, method }) =>
      found(async () => {
        const saved = await stripe.customers.retrievePaymentMethod(
          customer,
          method,
          {},
          { stripeAccount: account },
        )
        const { brand, last4, exp_month: month, exp_year: year } = saved.card ?? {}
        const expires = year === undefined ? '' : `${year}-${String(month).padStart(2, '0')}`
        return { brand: brand ?? saved.type, last4: last4 ?? '', expires }
      }),
  }
}
