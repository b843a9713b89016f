import 'server-only'
import type Stripe from 'stripe'
import { load } from '@/lib/gateways/payments/fake/books'
import { answerDispute } from '@/lib/gateways/payments/fake/dispute-money'
import { invalid } from '@/lib/gateways/payments/fake/errors'
import { type Call, route } from '@/lib/gateways/payments/fake/route'

async function update({ books, params, id }: Call): Promise<Stripe.Dispute> {
  const dispute = await load(books, 'dispute', id)
  if (dispute.status !== 'needs_response') throw invalid('This dispute is already closed or under review.')
  return answerDispute(books, dispute, params.map('evidence'), params.isTrue('submit'))
}

/** One dispute and its evidence; the list is in lists.ts. */
export const DISPUTES = [
  route<Stripe.Dispute>('get', '/v1/disputes/:id', { known: [] }, ({ books, id }) =>
    load(books, 'dispute', id),
  ),
  route<Stripe.Dispute>('post', '/v1/disputes/:id', { known: ['evidence.*', 'submit'] }, update),
]
