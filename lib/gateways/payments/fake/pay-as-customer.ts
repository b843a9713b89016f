import 'server-only'
import { accountOf } from '@/lib/gateways/payments/fake/books'
import { answerBank } from '@/lib/gateways/payments/fake/bank-answer'
import { cardOf, digitsOf } from '@/lib/gateways/payments/fake/cards'
import { handInCard } from '@/lib/gateways/payments/fake/card-session'

/** What came of it, with the ids by which the application can look until it has applied it. */
export type Paid = {
  outcome: 'captured' | 'failed'
  account: string | null
  sessionId: string | null
  payment: string | null
  /** The attempt row, from the payment's metadata. */
  attemptId: string | null
  words: string
}

const NOTHING: Paid = {
  outcome: 'failed',
  account: null,
  sessionId: null,
  payment: null,
  attemptId: null,
  words: '',
}

function targetOf(payUrl: string): { kind: 'pay' | 'authenticate'; id: string } | null {
  if (!URL.canParse(payUrl)) return null
  const [, kind, id] = /^\/(pay|authenticate)\/(\w+)$/.exec(new URL(payUrl).pathname) ?? []
  return kind === undefined || id === undefined ? null : { kind: kind as 'pay' | 'authenticate', id }
}

async function finish(intentId: string, isConfirmed: boolean): Promise<Paid> {
  const account = await accountOf(intentId)
  const answer = await answerBank(intentId, isConfirmed)
  if (answer === null) return { ...NOTHING, words: 'There is no such payment.' }
  const { intent, session } = answer
  return {
    outcome: intent.status === 'succeeded' ? 'captured' : 'failed',
    account,
    sessionId: session?.id ?? null,
    payment: intent.id,
    attemptId: intent.metadata['attempt'] ?? null,
    words: intent.last_payment_error?.message ?? '',
  }
}

async function paySession(sessionId: string, card: string): Promise<Paid> {
  const account = await accountOf(sessionId)
  const done = await handInCard(sessionId, card)
  const attemptId = done.session?.metadata?.['attempt'] ?? null
  const rest = { ...NOTHING, account, sessionId, attemptId }
  switch (done.state) {
    case 'no_session':
      return { ...NOTHING, words: 'There is no such card session.' }
    case 'unknown_card':
      return { ...rest, words: 'The sandbox knows published test card numbers only.' }
    case 'not_open': {
      const isPaid = done.session.status === 'complete'
      const payment = typeof done.session.payment_intent === 'string' ? done.session.payment_intent : null
      return {
        ...rest,
        outcome: isPaid ? 'captured' : 'failed',
        payment,
        words: `The session is ${done.session.status}.`,
      }
    }
    case 'asks':
      return { ...(await finish(done.intent.id, true)), attemptId }
    case 'captured':
      return { ...rest, outcome: 'captured', payment: done.intent.id }
    case 'refused':
      return { ...rest, payment: done.intent.id, words: done.error.message }
  }
}

/**
 * Does what a buyer does on the card page: hands in a test card, or confirms with the bank where the link leads there.
 * A card that asks for the buyer counts as confirmed. `card` decides on the bank's page only whether the bank refuses.
 */
export async function payAsCustomer({ payUrl, card }: { payUrl: string; card: string }): Promise<Paid> {
  const target = targetOf(payUrl)
  if (target === null) return { ...NOTHING, words: 'This is no link of the card page.' }
  if (target.kind === 'pay') return paySession(target.id, card)
  const refuses = cardOf(digitsOf(card))?.declines?.when === 'always'
  return finish(target.id, !refuses)
}
