import type Stripe from 'stripe'

/** A refund before it moved money. */
export function newRefund(given: {
  id: string
  now: number
  amount: number
  charge: Stripe.Charge
  reason: string | null
  metadata: Stripe.Metadata
}): Stripe.Refund {
  return {
    id: given.id,
    object: 'refund',
    amount: given.amount,
    balance_transaction: null,
    charge: given.charge.id,
    created: given.now,
    currency: given.charge.currency,
    customer: given.charge.customer,
    customer_account: null,
    metadata: given.metadata,
    payment_intent: given.charge.payment_intent,
    payment_method: given.charge.payment_method,
    reason: given.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'pending',
    transfer_reversal: null,
  }
}

const NO_EVIDENCE: Omit<Stripe.Dispute.Evidence, 'enhanced_evidence'> = {
  access_activity_log: null,
  billing_address: null,
  cancellation_policy: null,
  cancellation_policy_disclosure: null,
  cancellation_rebuttal: null,
  customer_communication: null,
  customer_email_address: null,
  customer_name: null,
  customer_purchase_ip: null,
  customer_signature: null,
  duplicate_charge_documentation: null,
  duplicate_charge_explanation: null,
  duplicate_charge_id: null,
  product_description: null,
  receipt: null,
  refund_policy: null,
  refund_policy_disclosure: null,
  refund_refusal_explanation: null,
  service_date: null,
  service_documentation: null,
  shipping_address: null,
  shipping_carrier: null,
  shipping_date: null,
  shipping_documentation: null,
  shipping_tracking_number: null,
  uncategorized_file: null,
  uncategorized_text: null,
}

/** A dispute as it is opened, over what is left of the charge. */
export function newDispute(given: {
  id: string
  now: number
  charge: Stripe.Charge
  reason: string
  dueBy: number
}): Stripe.Dispute {
  return {
    id: given.id,
    object: 'dispute',
    amount: given.charge.amount - given.charge.amount_refunded,
    balance_transactions: [],
    charge: given.charge.id,
    created: given.now,
    currency: given.charge.currency,
    enhanced_eligibility_types: [],
    evidence: { ...NO_EVIDENCE, enhanced_evidence: {} },
    evidence_details: {
      due_by: given.dueBy,
      enhanced_eligibility: {},
      has_evidence: false,
      past_due: false,
      submission_count: 0,
      submission_method: 'not_submitted',
    },
    intended_submission_method: null,
    is_charge_refundable: false,
    livemode: false,
    metadata: {},
    payment_intent: given.charge.payment_intent,
    reason: given.reason,
    status: 'needs_response',
  }
}

/** A payout on its way to the bank. */
export function newPayout(given: {
  id: string
  now: number
  amount: number
  currency: string
  booked: string
}): Stripe.Payout {
  return {
    id: given.id,
    object: 'payout',
    amount: given.amount,
    application_fee: null,
    application_fee_amount: null,
    arrival_date: given.now + 86_400,
    automatic: true,
    balance_transaction: given.booked,
    created: given.now,
    currency: given.currency,
    description: null,
    destination: null,
    failure_balance_transaction: null,
    failure_code: null,
    failure_message: null,
    livemode: false,
    metadata: {},
    method: 'standard',
    original_payout: null,
    payout_method: null,
    reconciliation_status: 'in_progress',
    reversed_by: null,
    source_type: 'card',
    statement_descriptor: null,
    status: 'pending',
    trace_id: null,
    type: 'bank_account',
  }
}
