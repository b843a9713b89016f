import 'server-only'
import type Stripe from 'stripe'
import { env } from '@/lib/config/env'
import { type Books, hiddenOf, insert, newId, save } from '@/lib/gateways/payments/fake/books'
import { capture } from '@/lib/gateways/payments/fake/capture'
import { cardOf, verdict } from '@/lib/gateways/payments/fake/cards'
import { type ErrorBody, SandboxBug } from '@/lib/gateways/payments/fake/errors'
import { emit } from '@/lib/gateways/payments/fake/events'
import { newCharge } from '@/lib/gateways/payments/fake/objects/charge'

/** What came of one try. */
export type Tried =
  | { state: 'captured'; intent: Stripe.PaymentIntent }
  | { state: 'asks'; intent: Stripe.PaymentIntent; url: string }
  | { state: 'refused'; intent: Stripe.PaymentIntent; error: Omit<ErrorBody, 'type'> }

type Try = {
  offSession: boolean
  isAuthenticated: boolean
  /** Where the bank's page sends the buyer back to. */
  returnUrl: string | null
}

type Refusal = { code: string; declineCode: string | null; message: string }

const MESSAGES: Readonly<Record<string, string>> = {
  insufficient_funds: 'Your card has insufficient funds.',
  expired_card: 'Your card has expired.',
  incorrect_cvc: "Your card's security code is incorrect.",
  processing_error: 'An error occurred while processing your card. Try again in a little bit.',
  authentication_required: 'Your card was declined. This transaction requires authentication.',
}

/** Puts a refused try into the books: a failed charge, the error on the payment, both events. */
export async function refuseCard(
  books: Books,
  intent: Stripe.PaymentIntent,
  method: Stripe.PaymentMethod,
  { code, declineCode, message }: Refusal,
): Promise<Tried> {
  const id = await newId(books, 'charge')
  const charge = newCharge({ id, now: books.now, intent, method, booked: null, failure: { code, message } })
  await insert(books, 'charge', charge, { hidden: {} })
  const error: Omit<ErrorBody, 'type'> = { code, message, charge: id, payment_method: method }
  if (declineCode !== null) error.decline_code = declineCode
  const refused = await save(books, 'payment_intent', {
    ...intent,
    status: 'requires_payment_method',
    latest_charge: id,
    next_action: null,
    payment_method: null,
    last_payment_error: { ...error, type: 'card_error' } as Stripe.PaymentIntent.LastPaymentError,
  })
  await emit(books, 'charge.failed', charge)
  await emit(books, 'payment_intent.payment_failed', refused)
  return { state: 'refused', intent: refused, error: { ...error, payment_intent: refused } }
}

async function askBuyer(
  books: Books,
  intent: Stripe.PaymentIntent,
  method: Stripe.PaymentMethod,
  returnUrl: string | null,
): Promise<Tried> {
  const url = `${env().CARD_PAGE_URL}/authenticate/${intent.id}`
  const asking = await save(books, 'payment_intent', {
    ...intent,
    status: 'requires_action',
    payment_method: method.id,
    next_action: { type: 'redirect_to_url', redirect_to_url: { url, return_url: returnUrl } },
  })
  await emit(books, 'payment_intent.requires_action', asking)
  return { state: 'asks', intent: asking, url }
}

/** One try to charge a card for a payment, as the card's number says it goes. */
export async function tryCard(
  books: Books,
  intent: Stripe.PaymentIntent,
  method: Stripe.PaymentMethod,
  { offSession, isAuthenticated, returnUrl }: Try,
): Promise<Tried> {
  const { number, isSetUp } = await hiddenOf(books, 'payment_method', method.id)
  const card = cardOf(number)
  if (card === undefined) throw new SandboxBug(`no card ${number}`)
  const said = verdict(card, { offSession, isSetUp, isAuthenticated })
  if (said === 'pays') {
    return { state: 'captured', intent: await capture(books, intent, method, { isAuthenticated }) }
  }
  if (said === 'asks' && !offSession) return askBuyer(books, intent, method, returnUrl)
  const code = said === 'asks' ? 'authentication_required' : said.code
  const declineCode = said === 'asks' ? 'authentication_required' : said.declineCode
  const message = MESSAGES[declineCode] ?? MESSAGES[code] ?? 'Your card was declined.'
  return refuseCard(books, intent, method, { code, declineCode, message })
}
