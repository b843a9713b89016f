import 'server-only'
import type Stripe from 'stripe'
import { fromProvider } from '@/lib/core/money/provider'
import { fromSeconds } from '@/lib/gateways/payments/facts'
import { changed, found } from '@/lib/gateways/payments/outcome'
import type { AccountFacts, Payments } from '@/lib/gateways/payments/types'

type Part = Pick<
  Payments,
  'createAccount' | 'onboardingLink' | 'getAccount' | 'setManualPayouts' | 'setAutomaticPayouts' | 'balance'
>

/** The account's own facts, without the payout schedule, which is kept apart. */
export function accountFacts(account: Stripe.Account): Omit<AccountFacts, 'payoutSchedule'> {
  return {
    account: account.id,
    chargesEnabled: account.charges_enabled,
    payoutsEnabled: account.payouts_enabled,
    detailsSubmitted: account.details_submitted,
    country: account.country ?? null,
    currency: account.default_currency?.toUpperCase() ?? null,
  }
}

function sum({ currency, amount }: { currency: string; amount: number }) {
  const code = currency.toUpperCase()
  return { currency: code, amount: fromProvider(amount, code) }
}

/**
 * Accounts whose owner has the provider's own desk and answers to the provider for losses and fees; we only charge
 * on them. With a real key the platform must have its controls over payout schedules switched on.
 */
export function accountCalls(stripe: Stripe): Part {
  async function setInterval(account: string, key: string, interval: 'manual' | 'daily') {
    await stripe.balanceSettings.update(
      { payments: { payouts: { schedule: { interval } } } },
      { stripeAccount: account, idempotencyKey: key },
    )
  }
  return {
    createAccount: ({ key, workshopId, country, currency, email, name }) =>
      changed(async () => {
        const account = await stripe.accounts.create(
          {
            country,
            email,
            default_currency: currency.toLowerCase(),
            business_profile: { name },
            controller: {
              fees: { payer: 'account' },
              losses: { payments: 'stripe' },
              requirement_collection: 'stripe',
              stripe_dashboard: { type: 'full' },
            },
            metadata: { workshop: workshopId },
          },
          { idempotencyKey: key },
        )
        return { account: account.id }
      }),
    onboardingLink: ({ account, returnUrl, refreshUrl }) =>
      changed(async () => {
        const link = await stripe.accountLinks.create({
          account,
          type: 'account_onboarding',
          return_url: returnUrl,
          refresh_url: refreshUrl,
        })
        return { url: link.url, expiresAt: fromSeconds(link.expires_at) }
      }),
    getAccount: ({ account }) =>
      found(async () => {
        const [facts, settings] = await Promise.all([
          stripe.accounts.retrieve(account),
          stripe.balanceSettings.retrieve({}, { stripeAccount: account }),
        ])
        const interval = settings.payments.payouts?.schedule?.interval
        return {
          ...accountFacts(facts),
          payoutSchedule: interval === 'manual' ? ('manual' as const) : ('automatic' as const),
        }
      }),
    setManualPayouts: ({ account, key }) =>
      changed(async () => {
        await setInterval(account, key, 'manual')
        return { payoutSchedule: 'manual' as const }
      }),
    setAutomaticPayouts: ({ account, key }) =>
      changed(async () => {
        await setInterval(account, key, 'daily')
        return { payoutSchedule: 'automatic' as const }
      }),
    balance: ({ account }) =>
      found(async () => {
        const balance = await stripe.balance.retrieve({}, { stripeAccount: account })
        return { available: balance.available.map(sum), pending: balance.pending.map(sum) }
      }),
  }
}
