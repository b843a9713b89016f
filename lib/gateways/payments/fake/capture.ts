import 'server-only'
import type Stripe from 'stripe'
import { book, chargeFee } from '@/lib/gateways/payments/fake/balance'
import { type Books, hiddenOf, insert, load, newId, save } from '@/lib/gateways/payments/fake/books'
import { cardOf } from '@/lib/gateways/payments/fake/cards'
import { emit } from '@/lib/gateways/payments/fake/events'
import { newCharge } from '@/lib/gateways/payments/fake/objects/charge'

const DAY = 86_400
/** Days until a charge may be paid out. Own rule, inside the provider's published range. */
const SETTLES_AFTER = 2 * DAY

async function keepCard(
  books: Books,
  intent: Stripe.PaymentIntent,
  method: Stripe.PaymentMethod,
  isSetUp: boolean,
) {
  const customer = typeof intent.customer === 'string' ? intent.customer : null
  if (intent.setup_future_usage !== 'off_session' || customer === null) return
  const hidden = await hiddenOf(books, 'payment_method', method.id)
  const attached = await save(
    books,
    'payment_method',
    { ...method, customer },
    { hidden: { ...hidden, isSetUp: hidden.isSetUp || isSetUp } },
  )
  if (method.customer === null) await emit(books, 'payment_method.attached', attached)
}

async function completeSession(books: Books, intent: Stripe.PaymentIntent): Promise<void> {
  const { session: sessionId } = await hiddenOf(books, 'payment_intent', intent.id)
  if (sessionId === null) return
  const session = await load(books, 'checkout_session', sessionId)
  const done = await save(
    books,
    'checkout_session',
    { ...session, status: 'complete', payment_status: 'paid', payment_intent: intent.id, url: null },
    { dueAt: null },
  )
  await emit(books, 'checkout.session.completed', done)
}

/** Charges the card for good: charge, fee, payment and session, with the provider's events. */
export async function capture(
  books: Books,
  intent: Stripe.PaymentIntent,
  method: Stripe.PaymentMethod,
  { isAuthenticated }: { isAuthenticated: boolean },
): Promise<Stripe.PaymentIntent> {
  const { number } = await hiddenOf(books, 'payment_method', method.id)
  const card = cardOf(number)
  const id = await newId(books, 'charge')
  const booked = await book(books, {
    type: 'charge',
    amount: intent.amount,
    currency: intent.currency,
    source: id,
    fee: chargeFee(intent.amount, intent.currency),
    availableOn: card?.isAvailableAtOnce ? books.now : books.now + SETTLES_AFTER,
  })
  const charge = newCharge({ id, now: books.now, intent, method, booked: booked.id, failure: null })
  await insert(books, 'charge', charge, { hidden: {}, dueAt: card?.disputed ? books.now + DAY : null })
  const paid = await save(books, 'payment_intent', {
    ...intent,
    status: 'succeeded',
    amount_received: intent.amount,
    last_payment_error: null,
    latest_charge: id,
    next_action: null,
    payment_method: method.id,
  })
  await keepCard(books, paid, method, isAuthenticated)
  // The fee becomes known a moment after the charge (asynchronous capture), so it comes in an event of its own.
  await emit(books, 'charge.succeeded', { ...charge, balance_transaction: null })
  await emit(books, 'payment_intent.succeeded', paid)
  await completeSession(books, paid)
  await emit(books, 'charge.updated', charge)
  return paid
}
