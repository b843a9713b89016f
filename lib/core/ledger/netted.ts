import type { Movement } from '@/lib/core/ledger/reconcile'
import { minor } from '@/lib/core/brand'

/**
 * One movement per kind, thing and currency, those that come to nothing left out: a refund that failed was booked there and
 * back. A dispute's sum and its fee are one movement of ours and two lines of the provider's, so that the fees of a payment
 * and what a bank holds back of it are one sum, under the kind 'fee'.
 * Units:   minor units, signs kept.
 * Domain:  amounts safe integers → otherwise RangeError.
 * @example netted([{ id: 'r', kind: 'refund', amount: 5, currency: 'EUR' }, { id: 'r', kind: 'refund', amount: -5, currency: 'EUR' }])  // → []
 */
export function netted(movements: readonly Movement[]): Movement[] {
  const sums = new Map<string, Movement>()
  for (const each of movements) {
    const kind = each.kind === 'dispute' ? 'fee' : each.kind
    const key = JSON.stringify([kind, each.id, each.currency])
    sums.set(key, { ...each, kind, amount: minor((sums.get(key)?.amount ?? 0) + each.amount) })
  }
  return [...sums.values()].filter(({ amount }) => amount !== 0)
}
