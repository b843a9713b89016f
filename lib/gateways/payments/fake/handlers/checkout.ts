import 'server-only'
import type Stripe from 'stripe'
import { env } from '@/lib/config/env'
import { requireAmount, requireCharges } from '@/lib/gateways/payments/fake/amounts'
import { insert, load, newId } from '@/lib/gateways/payments/fake/books'
import { expireSession, sessionNow } from '@/lib/gateways/payments/fake/card-session'
import { invalid, unexpected } from '@/lib/gateways/payments/fake/errors'
import { LIST_PARAMS } from '@/lib/gateways/payments/fake/handlers/lists'
import { listObjects } from '@/lib/gateways/payments/fake/list-objects'
import { newCheckoutSession } from '@/lib/gateways/payments/fake/objects/checkout-session'
import { type Call, route } from '@/lib/gateways/payments/fake/route'

const MINUTE = 60

/** Source: the provider's documentation of `expires_at`: 30 minutes to 24 hours from now, 24 hours unless given. */
function expiryOf({ params, books }: Call): number {
  if (params.optional('expires_at') === undefined) return books.now + 24 * 60 * MINUTE
  const at = params.whole('expires_at')
  if (at < books.now + 30 * MINUTE) {
    throw invalid(
      'The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.',
      'expires_at',
    )
  }
  if (at > books.now + 24 * 60 * MINUTE) {
    throw invalid(
      'The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.',
      'expires_at',
    )
  }
  return at
}

async function createSession(call: Call): Promise<Stripe.Checkout.Session> {
  const { books, params } = call
  if (params.text('mode') !== 'payment') throw invalid('The sandbox knows mode payment only.', 'mode')
  const currency = params.text('line_items.0.price_data.currency')
  const quantity = params.whole('line_items.0.quantity')
  const amount = params.whole('line_items.0.price_data.unit_amount') * quantity
  requireAmount(amount, currency)
  params.text('line_items.0.price_data.product_data.name')
  await requireCharges(books)
  const customer = params.text('customer')
  await load(books, 'customer', customer)
  const expiresAt = expiryOf(call)
  const id = await newId(books, 'checkout_session')
  const session = newCheckoutSession({
    id,
    now: books.now,
    url: `${env().CARD_PAGE_URL}/pay/${id}`,
    amount,
    currency,
    customer,
    reference: params.optional('client_reference_id') ?? null,
    metadata: params.map('metadata'),
    successUrl: params.text('success_url'),
    cancelUrl: params.optional('cancel_url') ?? null,
    expiresAt,
  })
  const hidden = {
    // As with the provider, the session's own metadata does not reach its payment.
    metadata: params.map('payment_intent_data.metadata'),
    description: params.optional('payment_intent_data.description') ?? null,
    savesCard: params.optional('payment_intent_data.setup_future_usage') === 'off_session',
  }
  return insert(books, 'checkout_session', session, { hidden, dueAt: expiresAt })
}

async function expire({ books, id }: Call): Promise<Stripe.Checkout.Session> {
  const session = await sessionNow(books, id)
  if (session.status === 'open') return expireSession(books, session)
  const message = `Only Checkout Sessions with a status in ["open"] can be expired. This one has a status of ${session.status}.`
  throw unexpected('checkout_session_not_open', message)
}

/** Card sessions. */
export const CHECKOUT = [
  route<Stripe.Checkout.Session>(
    'post',
    '/v1/checkout/sessions',
    {
      mayBreak: true,
      known: [
        ...[
          'mode',
          'customer',
          'client_reference_id',
          'success_url',
          'cancel_url',
          'expires_at',
          'metadata.*',
        ],
        ...[
          'line_items.0.quantity',
          'line_items.0.price_data.*',
          'payment_intent_data.*',
          'adaptive_pricing.enabled',
        ],
      ],
    },
    createSession,
  ),
  route<Stripe.Checkout.Session>('get', '/v1/checkout/sessions/:id', { known: [] }, ({ books, id }) =>
    sessionNow(books, id),
  ),
  route<Stripe.ApiList<Stripe.Checkout.Session>>(
    'get',
    '/v1/checkout/sessions',
    { known: [...LIST_PARAMS, 'customer', 'payment_intent', 'status'] },
    ({ books, params, path }) =>
      listObjects(books, 'checkout_session', path, params, ['customer', 'payment_intent', 'status']),
  ),
  route<Stripe.Checkout.Session>(
    'post',
    '/v1/checkout/sessions/:id/expire',
    { known: [], mayBreak: true },
    expire,
  ),
]
