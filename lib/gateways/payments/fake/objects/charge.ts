import type Stripe from 'stripe'
import { cardDetails } from '@/lib/gateways/payments/fake/objects/payer'

/** A charge of a payment; `failure` null for one that went through. */
export function newCharge(given: {
  id: string
  now: number
  intent: Stripe.PaymentIntent
  method: Stripe.PaymentMethod
  booked: string | null
  failure: { code: string; message: string } | null
}): Stripe.Charge {
  const { intent, failure } = given
  return {
    id: given.id,
    object: 'charge',
    amount: intent.amount,
    amount_captured: failure === null ? intent.amount : 0,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: given.booked,
    billing_details: given.method.billing_details,
    calculated_statement_descriptor: null,
    captured: failure === null,
    created: given.now,
    currency: intent.currency,
    customer: intent.customer,
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: failure?.code ?? null,
    failure_message: failure?.message ?? null,
    fraud_details: {},
    livemode: false,
    metadata: intent.metadata,
    on_behalf_of: null,
    outcome: null,
    paid: failure === null,
    payment_intent: intent.id,
    payment_method: given.method.id,
    payment_method_details: cardDetails(given.method),
    receipt_email: null,
    receipt_number: null,
    receipt_url: null,
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: failure === null ? 'succeeded' : 'failed',
    transfer_data: null,
    transfer_group: null,
  }
}
