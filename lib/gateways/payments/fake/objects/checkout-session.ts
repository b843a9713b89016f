import type Stripe from 'stripe'

const CUSTOM_TEXT = {
  after_submit: null,
  shipping_address: null,
  submit: null,
  terms_of_service_acceptance: null,
}

/** An open session. */
export function newCheckoutSession(given: {
  id: string
  now: number
  url: string
  amount: number
  currency: string
  customer: string
  reference: string | null
  metadata: Stripe.Metadata
  successUrl: string
  cancelUrl: string | null
  expiresAt: number
}): Stripe.Checkout.Session {
  return {
    id: given.id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: false },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: null,
    amount_subtotal: given.amount,
    amount_total: given.amount,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: null,
    cancel_url: given.cancelUrl,
    client_reference_id: given.reference,
    client_secret: null,
    collected_information: null,
    consent: null,
    consent_collection: null,
    created: given.now,
    currency: given.currency,
    currency_conversion: null,
    custom_fields: [],
    custom_text: CUSTOM_TEXT,
    customer: given.customer,
    customer_account: null,
    customer_creation: null,
    customer_details: null,
    customer_email: null,
    discounts: [],
    expires_at: given.expiresAt,
    integration_identifier: null,
    invoice: null,
    invoice_creation: null,
    livemode: false,
    locale: null,
    managed_payments: null,
    metadata: given.metadata,
    mode: 'payment',
    origin_context: null,
    // The provider makes the payment only when the buyer first hands in a card.
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'if_required',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_status: 'unpaid',
    permissions: null,
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: null,
    subscription: null,
    success_url: given.successUrl,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: given.url,
    wallet_options: null,
  }
}
