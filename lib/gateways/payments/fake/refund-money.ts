import 'server-only'
import type Stripe from 'stripe'
import { balanceOf, book } from '@/lib/gateways/payments/fake/balance'
import { type Books, hiddenOf, insert, load, newId, save } from '@/lib/gateways/payments/fake/books'
import { cardOf } from '@/lib/gateways/payments/fake/cards'
import { emit } from '@/lib/gateways/payments/fake/events'
import { newRefund } from '@/lib/gateways/payments/fake/objects/after-payment'

const DAY = 86_400
/** Days a refund waits for money before it fails. Own rule. */
const WAITS_FOR = 30 * DAY

/** A refund may use the pending balance too; what is missing is debited from the owner's bank where that is allowed. */
async function isCovered(books: Books, refund: Stripe.Refund): Promise<boolean> {
  const { bankMayBeDebited } = await hiddenOf(books, 'account', books.account)
  if (bankMayBeDebited) return true
  const sum = (await balanceOf(books)).find(({ currency }) => currency === refund.currency)
  return sum !== undefined && sum.available + sum.pending >= refund.amount
}

async function takeFromBalance(books: Books, refund: Stripe.Refund): Promise<Stripe.Refund> {
  const { id, amount, currency } = refund
  const booked = await book(books, { type: 'refund', amount: -amount, currency, source: id })
  return { ...refund, balance_transaction: booked.id }
}

async function countOnCharge(books: Books, chargeId: string, amount: number): Promise<Stripe.Charge> {
  const charge = await load(books, 'charge', chargeId)
  const refunded = charge.amount_refunded + amount
  return save(books, 'charge', {
    ...charge,
    amount_refunded: refunded,
    refunded: refunded === charge.amount_captured,
  })
}

async function numberOf(books: Books, charge: Stripe.Charge): Promise<string> {
  if (charge.payment_method === null) return ''
  return (await hiddenOf(books, 'payment_method', charge.payment_method)).number
}

/** Pays back as far as balance and card allow; the caller has checked what is left of the charge. */
export async function startRefund(
  books: Books,
  charge: Stripe.Charge,
  given: { amount: number; reason: string | null; metadata: Stripe.Metadata },
): Promise<Stripe.Refund> {
  const behaviour = cardOf(await numberOf(books, charge))?.refund
  const fresh = newRefund({ id: await newId(books, 'refund'), now: books.now, charge, ...given })
  const isEnough = await isCovered(books, fresh)
  let refund = isEnough ? await takeFromBalance(books, fresh) : fresh
  if (!isEnough) refund = { ...refund, pending_reason: 'insufficient_funds' }
  else if (behaviour === 'succeeds_later') refund = { ...refund, pending_reason: 'processing' }
  else refund = { ...refund, status: 'succeeded' }
  const then =
    behaviour === 'fails_later'
      ? ('fails' as const)
      : behaviour === 'succeeds_later'
        ? ('succeeds' as const)
        : null
  const dueAt = !isEnough ? books.now + 60 : then === null ? null : books.now + DAY
  await insert(books, 'refund', refund, { hidden: { then }, dueAt })
  const counted = await countOnCharge(books, charge.id, refund.amount)
  await emit(books, 'refund.created', refund)
  await emit(books, 'charge.refunded', counted)
  return refund
}

/** The money comes back to the account; for the buyer the refund did not happen. */
async function failRefund(books: Books, refund: Stripe.Refund, reason: string): Promise<void> {
  const { id, amount, currency, pending_reason: _, ...rest } = refund
  const back =
    refund.balance_transaction === null
      ? null
      : await book(books, { type: 'refund_failure', amount, currency, source: id })
  const failed: Stripe.Refund = { ...rest, id, amount, currency, status: 'failed', failure_reason: reason }
  if (back !== null) failed.failure_balance_transaction = back.id
  await save(books, 'refund', failed, { dueAt: null })
  if (typeof refund.charge === 'string') await countOnCharge(books, refund.charge, -amount)
  await emit(books, 'refund.updated', failed)
  await emit(books, 'refund.failed', failed)
}

async function succeedRefund(books: Books, refund: Stripe.Refund): Promise<void> {
  const { pending_reason: _, ...rest } = refund
  const { then } = await hiddenOf(books, 'refund', refund.id)
  const done = await save(
    books,
    'refund',
    { ...rest, status: 'succeeded' },
    { dueAt: then === 'fails' ? books.now + DAY : null },
  )
  await emit(books, 'refund.updated', done)
}

/** What time brings to a refund: money found, success, failure. */
export async function moveRefund(books: Books, refund: Stripe.Refund): Promise<void> {
  if (refund.status === 'succeeded') return failRefund(books, refund, 'declined')
  if (refund.pending_reason !== 'insufficient_funds') return succeedRefund(books, refund)
  if (await isCovered(books, refund)) return succeedRefund(books, await takeFromBalance(books, refund))
  if (books.now - refund.created > WAITS_FOR) return failRefund(books, refund, 'insufficient_funds')
  await save(books, 'refund', refund, { dueAt: books.now + 60 })
}
