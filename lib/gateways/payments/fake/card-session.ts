import 'server-only'
import type Stripe from 'stripe'
import { env } from '@/lib/config/env'
import {
  accountOf,
  type Books,
  hiddenOf,
  insert,
  load,
  newId,
  save,
  withBooks,
} from '@/lib/gateways/payments/fake/books'
import { cardOf, digitsOf } from '@/lib/gateways/payments/fake/cards'
import { emit } from '@/lib/gateways/payments/fake/events'
import { newPaymentMethod } from '@/lib/gateways/payments/fake/objects/payer'
import { newPaymentIntent } from '@/lib/gateways/payments/fake/objects/payment-intent'
import { type Tried, tryCard } from '@/lib/gateways/payments/fake/try-card'

/** Ends an open session: it can never be paid any more, and neither can its payment. */
export async function expireSession(
  books: Books,
  session: Stripe.Checkout.Session,
): Promise<Stripe.Checkout.Session> {
  const expired = await save(
    books,
    'checkout_session',
    { ...session, status: 'expired', url: null },
    { dueAt: null },
  )
  if (typeof session.payment_intent === 'string') {
    const intent = await load(books, 'payment_intent', session.payment_intent)
    await cancelIntent(books, intent, 'automatic')
  }
  await emit(books, 'checkout.session.expired', expired)
  return expired
}

/** Ends a payment for good. */
export async function cancelIntent(
  books: Books,
  intent: Stripe.PaymentIntent,
  reason: Stripe.PaymentIntent.CancellationReason | null,
): Promise<Stripe.PaymentIntent> {
  const cancelled = await save(books, 'payment_intent', {
    ...intent,
    status: 'canceled',
    canceled_at: books.now,
    cancellation_reason: reason,
    next_action: null,
  })
  await emit(books, 'payment_intent.canceled', cancelled)
  return cancelled
}

/** The session as it is by the clock: one whose time has passed is expired at the latest when somebody looks. */
export async function sessionNow(books: Books, id: string): Promise<Stripe.Checkout.Session> {
  const session = await load(books, 'checkout_session', id)
  if (session.status !== 'open') return session
  // The card page's port may be another one since the last start.
  if (session.expires_at > books.now) return { ...session, url: `${env().CARD_PAGE_URL}/pay/${id}` }
  return expireSession(books, session)
}

/** The session's payment, made when the first card is handed in. */
async function intentOf(books: Books, session: Stripe.Checkout.Session): Promise<Stripe.PaymentIntent> {
  if (typeof session.payment_intent === 'string') return load(books, 'payment_intent', session.payment_intent)
  const { metadata, description, savesCard } = await hiddenOf(books, 'checkout_session', session.id)
  const intent = newPaymentIntent({
    id: await newId(books, 'payment_intent'),
    now: books.now,
    amount: session.amount_total ?? 0,
    currency: session.currency ?? '',
    customer: typeof session.customer === 'string' ? session.customer : null,
    description,
    metadata,
    savesCard,
  })
  await insert(books, 'payment_intent', intent, {
    hidden: { session: session.id, returnUrl: session.success_url },
  })
  await save(books, 'checkout_session', { ...session, payment_intent: intent.id })
  await emit(books, 'payment_intent.created', intent)
  return intent
}

/** What came of a card handed in. */
export type HandedIn =
  Tried | { state: 'no_session' | 'unknown_card' } | { state: 'not_open'; session: Stripe.Checkout.Session }

/** The buyer hands in a card number on the card page. */
export async function handInCard(
  sessionId: string,
  typed: string,
): Promise<HandedIn & { session?: Stripe.Checkout.Session }> {
  const account = await accountOf(sessionId)
  if (account === null) return { state: 'no_session' }
  const number = digitsOf(typed)
  const card = cardOf(number)
  return withBooks(account, async (books) => {
    const session = await sessionNow(books, sessionId)
    if (session.status !== 'open') return { state: 'not_open', session }
    if (card === undefined) return { state: 'unknown_card', session }
    const intent = await intentOf(books, session)
    const method = newPaymentMethod({
      id: await newId(books, 'payment_method'),
      now: books.now,
      customer: null,
      number,
      card,
    })
    await insert(books, 'payment_method', method, { hidden: { number, isSetUp: false } })
    const tried = await tryCard(books, intent, method, {
      offSession: false,
      isAuthenticated: false,
      returnUrl: session.success_url,
    })
    return { ...tried, session }
  })
}
