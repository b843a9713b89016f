import type Stripe from 'stripe'

/**
 * The events the Connect webhook endpoint must be subscribed to; the fake sends these only.
 * Changed together with `readEvent`; an endpoint with fewer makes the application depend on its look-ups.
 */
export const WEBHOOK_EVENTS: readonly Stripe.Event.Type[] = [
  'checkout.session.completed',
  'checkout.session.async_payment_succeeded',
  'checkout.session.expired',
  'payment_intent.succeeded',
  'payment_intent.requires_action',
  'payment_intent.payment_failed',
  'payment_intent.canceled',
  'charge.updated',
  'refund.created',
  'refund.updated',
  'refund.failed',
  'charge.dispute.created',
  'charge.dispute.updated',
  'charge.dispute.closed',
  'charge.dispute.funds_withdrawn',
  'charge.dispute.funds_reinstated',
  'account.updated',
  'account.application.deauthorized',
  'payout.created',
  'payout.updated',
  'payout.paid',
  'payout.failed',
  'payout.canceled',
]
