import type { Entry } from '@/lib/core/ledger/balance'
import { assertPart, assertPositive, postings } from '@/lib/core/ledger/postings'

/**
 * Money that went back to a buyer.
 * `posted`: whether the order's revenue was already counted. `tax`: the tax in the amount that is no longer owed
 * (before posting: of what fell due on the deposit). `feeReturned` and `feeLost`: the provider's fee for the charge,
 * by what became of it; a fee that does not come back is a cost of the refund.
 */
export type Refund = {
  readonly amount: number
  readonly currency: string
  readonly posted?: boolean
  readonly tax?: number
  readonly feeReturned?: number
  readonly feeLost?: number
  /** Paid back outside the provider, for an order that was paid there. */
  readonly outside?: boolean
}

/**
 * Money went back to a buyer: before posting it lessens what is owed, after posting it lessens sales.
 * Units:   minor units, all amounts positive.
 * Domain:  amount whole ≥ 1, tax from 0 to amount, fees whole ≥ 0, an ISO 4217 currency → otherwise RangeError.
 * @example refunded({ amount: 2500, currency: 'EUR', feeLost: 63 })  // → [{ account: 'customer_deposits', currency: 'EUR', amount: 2500 }, { account: 'provider_balance', currency: 'EUR', amount: -2500 }, { account: 'processing_fees', currency: 'EUR', amount: -63 }, { account: 'fees_lost_on_refunds', currency: 'EUR', amount: 63 }]
 */
export function refunded(refund: Refund): Entry[] {
  const { amount, currency, posted = false, tax = 0, feeReturned = 0, feeLost = 0, outside = false } = refund
  assertPositive('refunded', 'amount', amount)
  assertPart('refunded', 'tax', tax, amount)
  assertPart('refunded', 'feeReturned', feeReturned, Number.MAX_SAFE_INTEGER)
  assertPart('refunded', 'feeLost', feeLost, Number.MAX_SAFE_INTEGER)
  const owed = posted
    ? { sales_returned: amount - tax, tax_payable: tax }
    : { customer_deposits: amount, tax_payable: tax, tax_on_deposits: -tax }
  const paid = outside
    ? { outside_receipts: -amount, provider_balance: feeReturned }
    : { provider_balance: feeReturned - amount }
  return postings(currency, {
    ...owed,
    ...paid,
    processing_fees: -feeReturned - feeLost,
    fees_lost_on_refunds: feeLost,
  })
}

/**
 * A refund failed after it had been booked: everything it booked is taken back. A retry is a refund of its own.
 * Domain:  as for `refunded`.
 * @example refundFailed({ amount: 2500, currency: 'EUR' })  // → [{ account: 'customer_deposits', currency: 'EUR', amount: -2500 }, { account: 'provider_balance', currency: 'EUR', amount: 2500 }]
 */
export function refundFailed(refund: Refund): Entry[] {
  return reversed(refunded(refund))
}

/**
 * The entries that undo others. Nothing in the ledger is ever changed; a mistake is booked back.
 * @example reversed([])  // → []
 */
export function reversed(entries: readonly Entry[]): Entry[] {
  return entries.map((entry) => ({ ...entry, amount: -entry.amount as Entry['amount'] }))
}
