import type { Entry } from '@/lib/core/ledger/balance'
import { assertPart, assertPositive, postings } from '@/lib/core/ledger/postings'

/** A payment that a buyer's bank disputes, and the fee the provider takes for it (0 or left out where none). */
export type Dispute = { readonly amount: number; readonly currency: string; readonly fee?: number }

function assertDispute(name: string, { amount, fee = 0 }: Dispute): void {
  assertPositive(name, 'amount', amount)
  assertPart(name, 'fee', fee, Number.MAX_SAFE_INTEGER)
}

/**
 * A buyer's bank disputes a payment: the provider holds the amount back and takes its fee.
 * Units:   minor units.
 * Domain:  amount whole ≥ 1, fee whole ≥ 0, an ISO 4217 currency → otherwise RangeError.
 * @example disputed({ amount: 2500, currency: 'EUR', fee: 2000 })  // → [{ account: 'disputed_funds', currency: 'EUR', amount: 2500 }, { account: 'dispute_fees', currency: 'EUR', amount: 2000 }, { account: 'provider_balance', currency: 'EUR', amount: -4500 }]
 */
export function disputed(dispute: Dispute): Entry[] {
  assertDispute('disputed', dispute)
  const { amount, currency, fee = 0 } = dispute
  return postings(currency, { disputed_funds: amount, dispute_fees: fee, provider_balance: -amount - fee })
}

/**
 * A dispute was decided for the workshop: the amount comes back, and the fee given as `fee` with it (0 where it stays).
 * Domain:  as for `disputed`.
 * @example disputeWon({ amount: 2500, currency: 'EUR' })  // → [{ account: 'provider_balance', currency: 'EUR', amount: 2500 }, { account: 'disputed_funds', currency: 'EUR', amount: -2500 }]
 */
export function disputeWon(dispute: Dispute): Entry[] {
  assertDispute('disputeWon', dispute)
  const { amount, currency, fee = 0 } = dispute
  return postings(currency, { provider_balance: amount + fee, disputed_funds: -amount, dispute_fees: -fee })
}

/**
 * A dispute was decided for the buyer: before posting the buyer has the money back and is owed no more; after posting
 * it is a loss.
 * Domain:  amount whole ≥ 1, an ISO 4217 currency → otherwise RangeError.
 * @example disputeLost({ amount: 2500, currency: 'EUR', posted: true })  // → [{ account: 'dispute_losses', currency: 'EUR', amount: 2500 }, { account: 'disputed_funds', currency: 'EUR', amount: -2500 }]
 */
export function disputeLost(dispute: {
  readonly amount: number
  readonly currency: string
  readonly posted: boolean
}): Entry[] {
  const { amount, currency, posted } = dispute
  assertPositive('disputeLost', 'amount', amount)
  const account = posted ? 'dispute_losses' : 'customer_deposits'
  return postings(currency, { [account]: amount, disputed_funds: -amount })
}
