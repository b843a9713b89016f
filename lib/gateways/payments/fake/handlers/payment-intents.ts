import 'server-only'
import type Stripe from 'stripe'
import { requireAmount, requireCharges } from '@/lib/gateways/payments/fake/amounts'
import { type Books, hiddenOf, insert, load, newId, save } from '@/lib/gateways/payments/fake/books'
import { cancelIntent } from '@/lib/gateways/payments/fake/card-session'
import { cardError, invalid, unexpected } from '@/lib/gateways/payments/fake/errors'
import { emit } from '@/lib/gateways/payments/fake/events'
import { LIST_PARAMS } from '@/lib/gateways/payments/fake/handlers/lists'
import { listObjects } from '@/lib/gateways/payments/fake/list-objects'
import { newPaymentIntent } from '@/lib/gateways/payments/fake/objects/payment-intent'
import { type Call, route } from '@/lib/gateways/payments/fake/route'
import { type Tried, tryCard } from '@/lib/gateways/payments/fake/try-card'

async function savedMethod(books: Books, id: string, customer: string | null): Promise<Stripe.PaymentMethod> {
  const method = await load(books, 'payment_method', id)
  if (method.customer !== null && method.customer !== customer) {
    throw invalid('The payment method you provided belongs to another customer.', 'payment_method')
  }
  return method
}

function answerOf(tried: Tried): Stripe.PaymentIntent {
  if (tried.state === 'refused') throw cardError(tried.error)
  return tried.intent
}

async function create({ books, params }: Call): Promise<Stripe.PaymentIntent> {
  const amount = params.whole('amount')
  const currency = params.text('currency')
  requireAmount(amount, currency)
  await requireCharges(books)
  const customer = params.text('customer')
  await load(books, 'customer', customer)
  const method = await savedMethod(books, params.text('payment_method'), customer)
  if (method.customer === null) {
    throw invalid(
      'A payment method must be attached to the customer before it is used again.',
      'payment_method',
    )
  }
  if (!params.isTrue('confirm') || !params.isTrue('off_session')) {
    throw invalid('The sandbox makes payments off session and confirmed only.', 'confirm')
  }
  const intent = newPaymentIntent({
    id: await newId(books, 'payment_intent'),
    now: books.now,
    amount,
    currency,
    customer,
    description: params.optional('description') ?? null,
    metadata: params.map('metadata'),
    savesCard: false,
  })
  await insert(books, 'payment_intent', intent, { hidden: { session: null, returnUrl: null } })
  await emit(books, 'payment_intent.created', intent)
  return answerOf(
    await tryCard(books, intent, method, { offSession: true, isAuthenticated: false, returnUrl: null }),
  )
}

const FINISHED: readonly string[] = ['succeeded', 'canceled', 'processing']

function stateError(intent: Stripe.PaymentIntent, verb: string) {
  return unexpected(
    'payment_intent_unexpected_state',
    `This PaymentIntent could not be ${verb} because it has a status of ${intent.status}.`,
  )
}

async function confirm({ books, params, id }: Call): Promise<Stripe.PaymentIntent> {
  const intent = await load(books, 'payment_intent', id)
  if (FINISHED.includes(intent.status)) throw stateError(intent, 'confirmed')
  const { session } = await hiddenOf(books, 'payment_intent', id)
  if (session !== null) throw invalid('This payment belongs to a Checkout Session and is confirmed there.')
  const customer = typeof intent.customer === 'string' ? intent.customer : null
  const chosen = params.optional('payment_method') ?? intent.payment_method
  if (typeof chosen !== 'string')
    throw invalid('You cannot confirm this PaymentIntent: missing a payment method.')
  const method = await savedMethod(books, chosen, customer)
  const returnUrl = params.text('return_url')
  await save(books, 'payment_intent', intent, { hidden: { session: null, returnUrl } })
  return answerOf(
    await tryCard(books, intent, method, { offSession: false, isAuthenticated: false, returnUrl }),
  )
}

async function cancel({ books, params, id }: Call): Promise<Stripe.PaymentIntent> {
  const intent = await load(books, 'payment_intent', id)
  if (FINISHED.includes(intent.status)) throw stateError(intent, 'canceled')
  const { session } = await hiddenOf(books, 'payment_intent', id)
  if (session !== null)
    throw invalid('This payment belongs to a Checkout Session: expire the session instead.')
  return cancelIntent(books, intent, params.optional('cancellation_reason') ?? null)
}

const CREATE = [
  'amount',
  'currency',
  'customer',
  'payment_method',
  'description',
  'metadata.*',
  'off_session',
  'confirm',
]

/** Payments off session, and finishing or cancelling them. */
export const PAYMENT_INTENTS = [
  route<Stripe.PaymentIntent>(
    'post',
    '/v1/payment_intents',
    { known: [...CREATE, 'automatic_payment_methods.*'], mayBreak: true },
    create,
  ),
  route<Stripe.PaymentIntent>('get', '/v1/payment_intents/:id', { known: [] }, ({ books, id }) =>
    load(books, 'payment_intent', id),
  ),
  route<Stripe.ApiList<Stripe.PaymentIntent>>(
    'get',
    '/v1/payment_intents',
    { known: [...LIST_PARAMS, 'customer'] },
    ({ books, params, path }) => listObjects(books, 'payment_intent', path, params, ['customer']),
  ),
  route<Stripe.PaymentIntent>(
    'post',
    '/v1/payment_intents/:id/confirm',
    { known: ['payment_method', 'return_url', 'off_session'], mayBreak: true },
    confirm,
  ),
  route<Stripe.PaymentIntent>(
    'post',
    '/v1/payment_intents/:id/cancel',
    { known: ['cancellation_reason'], mayBreak: true },
    cancel,
  ),
]
