import 'server-only'
import type Stripe from 'stripe'
import { load } from '@/lib/gateways/payments/fake/books'
import { invalid, unexpected } from '@/lib/gateways/payments/fake/errors'
import { LIST_PARAMS } from '@/lib/gateways/payments/fake/handlers/lists'
import { listObjects } from '@/lib/gateways/payments/fake/list-objects'
import { startRefund } from '@/lib/gateways/payments/fake/refund-money'
import { type Call, route } from '@/lib/gateways/payments/fake/route'

async function chargeOf({ books, params }: Call): Promise<Stripe.Charge> {
  const intent = await load(books, 'payment_intent', params.text('payment_intent'))
  if (intent.status !== 'succeeded' || typeof intent.latest_charge !== 'string') {
    throw invalid(
      `This PaymentIntent (${intent.id}) does not have a successful charge to refund.`,
      'payment_intent',
    )
  }
  return load(books, 'charge', intent.latest_charge)
}

async function create(call: Call): Promise<Stripe.Refund> {
  const { params } = call
  const charge = await chargeOf(call)
  const left = charge.amount_captured - charge.amount_refunded
  if (left === 0)
    throw unexpected('charge_already_refunded', `Charge ${charge.id} has already been refunded.`)
  if (charge.disputed)
    throw unexpected('charge_disputed', `Charge ${charge.id} has been charged back; cannot issue a refund.`)
  const amount = params.optional('amount') === undefined ? left : params.whole('amount')
  if (amount < 1) throw invalid('Invalid positive integer', 'amount')
  if (amount > left) {
    throw invalid(`Refund amount (${amount}) is greater than unrefunded amount on charge (${left})`, 'amount')
  }
  return startRefund(call.books, charge, {
    amount,
    reason: params.optional('reason') ?? null,
    metadata: params.map('metadata'),
  })
}

/** Refunds. */
export const REFUNDS = [
  route<Stripe.Refund>(
    'post',
    '/v1/refunds',
    { known: ['payment_intent', 'amount', 'reason', 'metadata.*'], mayBreak: true },
    create,
  ),
  route<Stripe.Refund>('get', '/v1/refunds/:id', { known: [] }, ({ books, id }) => load(books, 'refund', id)),
  route<Stripe.ApiList<Stripe.Refund>>(
    'get',
    '/v1/refunds',
    { known: [...LIST_PARAMS, 'payment_intent', 'charge'] },
    ({ books, params, path }) => listObjects(books, 'refund', path, params, ['payment_intent', 'charge']),
  ),
]
