import type Stripe from 'stripe'
import type { CardBehaviour } from '@/lib/gateways/payments/fake/cards'

/** A customer without cards. */
export function newCustomer(given: {
  id: string
  now: number
  email: string | null
  name: string | null
  metadata: Stripe.Metadata
}): Stripe.Customer {
  return {
    id: given.id,
    object: 'customer',
    balance: 0,
    created: given.now,
    default_source: null,
    description: null,
    email: given.email,
    name: given.name,
    invoice_settings: {
      custom_fields: null,
      default_payment_method: null,
      footer: null,
      rendering_options: null,
    },
    livemode: false,
    metadata: given.metadata,
    shipping: null,
  }
}

/** All cards of the sandbox run out at the end of 2034. */
const EXPIRES = { exp_month: 12, exp_year: 2034 } as const

/** A card as a payment method. */
export function newPaymentMethod(given: {
  id: string
  now: number
  customer: string | null
  number: string
  card: CardBehaviour
}): Stripe.PaymentMethod {
  return {
    id: given.id,
    object: 'payment_method',
    billing_details: { address: null, email: null, name: null, phone: null, tax_id: null },
    card: {
      ...EXPIRES,
      brand: given.card.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
      country: given.card.country,
      display_brand: given.card.brand,
      funding: 'credit',
      generated_from: null,
      last4: given.number.slice(-4),
      networks: { available: [given.card.brand], preferred: null },
      regulated_status: 'unregulated',
      three_d_secure_usage: { supported: true },
      wallet: null,
    },
    created: given.now,
    customer: given.customer,
    customer_account: null,
    livemode: false,
    metadata: {},
    type: 'card',
  }
}

/** The card as a charge tells it. */
export function cardDetails(method: Stripe.PaymentMethod): Stripe.Charge.PaymentMethodDetails {
  return {
    type: 'card',
    card: {
      amount_authorized: null,
      authorization_code: null,
      brand: method.card?.brand ?? null,
      checks: method.card?.checks ?? null,
      country: method.card?.country ?? null,
      electronic_commerce_indicator: null,
      exp_month: EXPIRES.exp_month,
      exp_year: EXPIRES.exp_year,
      funding: method.card?.funding ?? null,
      installments: null,
      last4: method.card?.last4 ?? null,
      mandate: null,
      network: method.card?.brand ?? null,
      network_transaction_id: null,
      regulated_status: null,
      three_d_secure: null,
      transaction_link_id: null,
      wallet: null,
    },
  }
}
