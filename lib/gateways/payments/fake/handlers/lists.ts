import 'server-only'
import type { HttpHandler } from 'msw'
import type Stripe from 'stripe'
import { load } from '@/lib/gateways/payments/fake/books'
import type { Kind, Kinds } from '@/lib/gateways/payments/fake/kinds'
import { listObjects } from '@/lib/gateways/payments/fake/list-objects'
import { route } from '@/lib/gateways/payments/fake/route'

/** What every list of the provider takes. */
export const LIST_PARAMS = ['limit', 'starting_after', 'ending_before', 'created.*']

function list<K extends Kind>(kind: K, path: string, filters: readonly string[]): HttpHandler {
  return route<Stripe.ApiList<Kinds[K]>>('get', path, { known: [...LIST_PARAMS, ...filters] }, (call) =>
    listObjects(call.books, kind, call.path, call.params, filters),
  )
}

/** What the daily comparison reads. */
export const LISTS: HttpHandler[] = [
  list('charge', '/v1/charges', ['payment_intent', 'customer']),
  list('dispute', '/v1/disputes', ['charge', 'payment_intent']),
  list('balance_transaction', '/v1/balance_transactions', ['type', 'source', 'currency']),
  list('payout', '/v1/payouts', ['status']),
  route<Stripe.Charge>('get', '/v1/charges/:id', { known: [] }, ({ books, id }) => load(books, 'charge', id)),
  route<Stripe.Payout>('get', '/v1/payouts/:id', { known: [] }, ({ books, id }) => load(books, 'payout', id)),
]
