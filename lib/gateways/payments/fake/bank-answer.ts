import 'server-only'
import type Stripe from 'stripe'
import { accountOf, hiddenOf, load, withBooks } from '@/lib/gateways/payments/fake/books'
import { sessionNow } from '@/lib/gateways/payments/fake/card-session'
import { type Tried, refuseCard, tryCard } from '@/lib/gateways/payments/fake/try-card'

/** What came of the bank’s question, and where the buyer goes next. */
export type BankAnswer = (Tried | { state: 'not_asked'; intent: Stripe.PaymentIntent }) & {
  session: Stripe.Checkout.Session | null
  returnUrl: string | null
}

const REFUSED = {
  code: 'payment_intent_authentication_failure',
  declineCode: null,
  message: 'The payment was not confirmed with the bank.',
}

/** The buyer says yes or no on the bank's page; null when there is no such payment. */
export async function answerBank(intentId: string, isConfirmed: boolean): Promise<BankAnswer | null> {
  const account = await accountOf(intentId)
  if (account === null) return null
  return withBooks(account, async (books) => {
    const hidden = await hiddenOf(books, 'payment_intent', intentId)
    // First the session: looking at one whose time has passed ends its payment too.
    const session = hidden.session === null ? null : await sessionNow(books, hidden.session)
    const intent = await load(books, 'payment_intent', intentId)
    const rest = { session, returnUrl: hidden.returnUrl }
    if (intent.status !== 'requires_action' || typeof intent.payment_method !== 'string') {
      return { state: 'not_asked', intent, ...rest }
    }
    const method = await load(books, 'payment_method', intent.payment_method)
    const answer = isConfirmed
      ? await tryCard(books, intent, method, {
          offSession: false,
          isAuthenticated: true,
          returnUrl: rest.returnUrl,
        })
      : await refuseCard(books, intent, method, REFUSED)
    return { ...answer, ...rest }
  })
}
