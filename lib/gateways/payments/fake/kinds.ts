import type Stripe from 'stripe'

/** Every object the fake keeps, as the SDK types it. */
export type Kinds = {
  account: Stripe.Account
  account_link: Stripe.AccountLink & { id: string }
  customer: Stripe.Customer
  payment_method: Stripe.PaymentMethod
  checkout_session: Stripe.Checkout.Session
  payment_intent: Stripe.PaymentIntent
  charge: Stripe.Charge
  refund: Stripe.Refund
  dispute: Stripe.Dispute
  balance_transaction: Stripe.BalanceTransaction
  payout: Stripe.Payout
}
/** The name of a kind of object. */
export type Kind = keyof Kinds

/** What the provider knows of an object and never tells. */
export type Hidden = {
  account: { interval: 'manual' | 'daily'; bankMayBeDebited: boolean; paidOutOn: string }
  account_link: { account: string; returnUrl: string; refreshUrl: string; isUsed: boolean }
  customer: Record<string, never>
  payment_method: { number: string; isSetUp: boolean }
  checkout_session: { metadata: Record<string, string>; description: string | null; savesCard: boolean }
  payment_intent: { session: string | null; returnUrl: string | null }
  charge: Record<string, never>
  refund: { then: 'succeeds' | 'fails' | null }
  dispute: Record<string, never>
  balance_transaction: Record<string, never>
  payout: Record<string, never>
}

/** The prefix by which the provider's ids tell what they are. */
export const PREFIX: Readonly<Record<Kind, string>> = {
  account: 'acct_',
  account_link: 'al_',
  customer: 'cus_',
  payment_method: 'pm_',
  checkout_session: 'cs_test_',
  payment_intent: 'pi_',
  charge: 'ch_',
  refund: 're_',
  dispute: 'du_',
  balance_transaction: 'txn_',
  payout: 'po_',
}
