import 'server-only'
import type Stripe from 'stripe'
import { book, disputeFee } from '@/lib/gateways/payments/fake/balance'
import { type Books, insert, load, newId, save } from '@/lib/gateways/payments/fake/books'
import { emit } from '@/lib/gateways/payments/fake/events'
import { newDispute } from '@/lib/gateways/payments/fake/objects/after-payment'

const DAY = 86_400

/** The bank takes the money back: dispute opened, amount and fee withheld. */
export async function openDispute(
  books: Books,
  charge: Stripe.Charge,
  reason: string,
): Promise<Stripe.Dispute> {
  const dueBy = books.now + 10 * DAY
  const id = await newId(books, 'dispute')
  const fresh = newDispute({ id, now: books.now, charge, reason, dueBy })
  const booked = await book(books, {
    type: 'adjustment',
    amount: -fresh.amount,
    currency: charge.currency,
    source: id,
    fee: disputeFee(charge.currency),
    description: `Chargeback withdrawal for ${charge.id}`,
  })
  const dispute = { ...fresh, balance_transactions: [booked] }
  await insert(books, 'dispute', dispute, { hidden: {}, dueAt: dueBy })
  await save(books, 'charge', { ...charge, disputed: true }, { dueAt: null })
  await emit(books, 'charge.dispute.created', dispute)
  await emit(books, 'charge.dispute.funds_withdrawn', dispute)
  return dispute
}

/** Ends a dispute; a won one gives the amount back, never the fee. */
export async function closeDispute(
  books: Books,
  dispute: Stripe.Dispute,
  status: 'won' | 'lost',
): Promise<Stripe.Dispute> {
  const closed: Stripe.Dispute = { ...dispute, status }
  if (status === 'won') {
    const { id, amount, currency } = dispute
    const back = await book(books, {
      type: 'adjustment',
      amount,
      currency,
      source: id,
      description: 'Chargeback reversal',
    })
    closed.balance_transactions = [...dispute.balance_transactions, back]
    const charge = await load(books, 'charge', String(dispute.charge))
    await save(books, 'charge', { ...charge, disputed: false })
  }
  await save(books, 'dispute', closed, { dueAt: null })
  if (status === 'won') await emit(books, 'charge.dispute.funds_reinstated', closed)
  await emit(books, 'charge.dispute.closed', closed)
  return closed
}

/** Unanswered in time, or answered without a word that decides it: lost. */
export async function moveDispute(books: Books, dispute: Stripe.Dispute): Promise<void> {
  await closeDispute(books, dispute, 'lost')
}

/** Takes in evidence; once handed in the bank has 30 days. Published magic texts decide at once. */
export async function answerDispute(
  books: Books,
  dispute: Stripe.Dispute,
  evidence: Record<string, string>,
  isSubmitted: boolean,
): Promise<Stripe.Dispute> {
  const details = { ...dispute.evidence_details, has_evidence: true }
  const told: Stripe.Dispute = {
    ...dispute,
    evidence: { ...dispute.evidence, ...evidence },
    evidence_details: details,
  }
  if (!isSubmitted) return save(books, 'dispute', told)
  const sent: Stripe.Dispute = {
    ...told,
    status: 'under_review',
    evidence_details: {
      ...details,
      submission_count: details.submission_count + 1,
      submission_method: 'manual',
    },
  }
  await save(books, 'dispute', sent, { dueAt: books.now + 30 * DAY })
  await emit(books, 'charge.dispute.updated', sent)
  if (evidence['uncategorized_text'] === 'winning_evidence') return closeDispute(books, sent, 'won')
  if (evidence['uncategorized_text'] === 'losing_evidence') return closeDispute(books, sent, 'lost')
  return sent
}
