import type Stripe from 'stripe'

type Given = {
  id: string
  now: number
  country: string
  currency: string
  email: string
  name: string
  metadata: Stripe.Metadata
}

/** An account before its onboarding. */
export function newAccount(given: Given): Stripe.Account {
  return {
    id: given.id,
    object: 'account',
    business_profile: null,
    business_type: null,
    capabilities: { card_payments: 'inactive', transfers: 'inactive' },
    charges_enabled: false,
    controller: { type: 'application', is_controller: true },
    country: given.country,
    created: given.now,
    default_currency: given.currency,
    details_submitted: false,
    email: given.email,
    metadata: given.metadata,
    payouts_enabled: false,
    settings: null,
    type: 'none',
  }
}

/** The account after the owner finished the provider's forms. */
export function onboarded(account: Stripe.Account): Stripe.Account {
  return {
    ...account,
    charges_enabled: true,
    payouts_enabled: true,
    details_submitted: true,
    capabilities: { card_payments: 'active', transfers: 'active' },
  }
}

/** The settings as the provider tells them. */
export function balanceSettings(
  interval: 'manual' | 'daily',
  bankMayBeDebited: boolean,
): Stripe.BalanceSettings {
  return {
    object: 'balance_settings',
    payments: {
      debit_negative_balances: bankMayBeDebited,
      payouts: {
        automatic_transfer_rules_by_currency: null,
        minimum_balance_by_currency: null,
        schedule: { interval },
        statement_descriptor: null,
        status: 'enabled',
      },
      settlement_timing: { delay_days: 2, start_of_day: null },
    },
  }
}
