import type Stripe from 'stripe'

/** A payment before the first card. */
export function newPaymentIntent(given: {
  id: string
  now: number
  amount: number
  currency: string
  customer: string | null
  description: string | null
  metadata: Stripe.Metadata
  savesCard: boolean
}): Stripe.PaymentIntent {
  return {
    id: given.id,
    object: 'payment_intent',
    allowed_payment_method_types: null,
    amount: given.amount,
    amount_capturable: 0,
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: { enabled: true },
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic_async',
    client_secret: `${given.id}_secret_sandbox`,
    confirmation_method: 'automatic',
    created: given.now,
    currency: given.currency,
    customer: given.customer,
    customer_account: null,
    description: given.description,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    metadata: given.metadata,
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_record: null,
    processing: null,
    receipt_email: null,
    review: null,
    setup_future_usage: given.savesCard ? 'off_session' : null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: 'requires_payment_method',
    transfer_data: null,
    transfer_group: null,
  }
}
