import type { Entry } from '@/lib/core/ledger/balance'
import { assertPart, assertPositive, postings } from '@/lib/core/ledger/postings'

export { balanceOf, isBalanced, type Entry } from '@/lib/core/ledger/balance'
export { disputed, disputeLost, disputeWon, type Dispute } from '@/lib/core/ledger/disputes'
export { reconcile, type Difference, type Movement } from '@/lib/core/ledger/reconcile'
export { taxDue, taxDueBack } from '@/lib/core/ledger/tax-entries'
export { refunded, refundFailed, reversed, type Refund } from '@/lib/core/ledger/refunds'

/** A sum of money in minor units of a currency. */
export type Sum = { readonly amount: number; readonly currency: string }

/** A sum a buyer paid, with the tax in it that falls due at once (0 where tax waits for the posting). */
export type Payment = Sum & { readonly taxNow?: number }

function paid(name: string, { amount, currency, taxNow = 0 }: Payment): Entry[] {
  assertPositive(name, 'amount', amount)
  assertPart(name, 'taxNow', taxNow, amount)
  return postings(currency, {
    provider_balance: amount,
    customer_deposits: -amount,
    tax_on_deposits: taxNow,
    tax_payable: -taxNow,
  })
}

/**
 * A buyer's deposit arrived with the provider: ours to hold, the buyer's until posting.
 * Units:   minor units.
 * Domain:  amount whole ≥ 1, taxNow from 0 to amount, an ISO 4217 currency → otherwise RangeError.
 * @example depositPaid({ amount: 2500, currency: 'EUR' })  // → [{ account: 'provider_balance', currency: 'EUR', amount: 2500 }, { account: 'customer_deposits', currency: 'EUR', amount: -2500 }]
 */
export function depositPaid(payment: Payment): Entry[] {
  return paid('depositPaid', payment)
}

/**
 * A buyer's balance arrived with the provider; still the buyer's until posting.
 * Domain:  as for `depositPaid`.
 * @example isBalanced(balancePaid({ amount: 16400, currency: 'EUR', taxNow: 2618 }))  // → true
 */
export function balancePaid(payment: Payment): Entry[] {
  return paid('balancePaid', payment)
}

/**
 * The difference for a change of an order arrived with the provider.
 * Domain:  as for `depositPaid`.
 * @example changePaid({ amount: 700, currency: 'EUR' }).length  // → 2
 */
export function changePaid(payment: Payment): Entry[] {
  return paid('changePaid', payment)
}

/**
 * An order entered by hand was paid outside the provider. A free one has no entries: do not book it.
 * Domain:  amount whole ≥ 1, an ISO 4217 currency → otherwise RangeError.
 * @example paidOutside({ amount: 700, currency: 'EUR' }).length  // → 2
 */
export function paidOutside({ amount, currency }: Sum): Entry[] {
  assertPositive('paidOutside', 'amount', amount)
  return postings(currency, { outside_receipts: amount, customer_deposits: -amount })
}

/**
 * An order's last parcel was handed over: what the buyer paid becomes sales and tax.
 * Units:   gross is all the buyer paid for it; tax the tax in it; taxBooked the part of the tax already due by deposits.
 * Domain:  gross whole ≥ 1, tax from 0 to gross, taxBooked from 0 to tax → otherwise RangeError.
 * @example isBalanced(orderPosted({ gross: 18900, tax: 3018, taxBooked: 399, currency: 'EUR' }))  // → true
 */
export function orderPosted(order: {
  readonly gross: number
  readonly tax: number
  readonly taxBooked?: number
  readonly currency: string
}): Entry[] {
  const { gross, tax, taxBooked = 0, currency } = order
  assertPositive('orderPosted', 'gross', gross)
  assertPart('orderPosted', 'tax', tax, gross)
  assertPart('orderPosted', 'taxBooked', taxBooked, tax)
  return postings(currency, {
    customer_deposits: gross,
    sales: tax - gross,
    tax_payable: taxBooked - tax,
    tax_on_deposits: -taxBooked,
  })
}

/**
 * A lapsed order's deposit is kept, where the terms said so and the law allows it.
 * Units:   tax is what of it is taxable as a payment, 0 where it counts as damages; taxBooked was already due by the deposit.
 * Domain:  amount whole ≥ 1, tax and taxBooked from 0 to amount → otherwise RangeError.
 * @example isBalanced(depositKept({ amount: 2500, currency: 'EUR' }))  // → true
 */
export function depositKept(kept: Sum & { readonly tax?: number; readonly taxBooked?: number }): Entry[] {
  const { amount, currency, tax = 0, taxBooked = 0 } = kept
  assertPositive('depositKept', 'amount', amount)
  assertPart('depositKept', 'tax', tax, amount)
  assertPart('depositKept', 'taxBooked', taxBooked, amount)
  return postings(currency, {
    customer_deposits: amount,
    kept_deposits: tax - amount,
    tax_payable: taxBooked - tax,
    tax_on_deposits: -taxBooked,
  })
}

/**
 * The provider kept its fee for a charge.
 * Domain:  amount whole ≥ 1, an ISO 4217 currency → otherwise RangeError.
 * @example feeCharged({ amount: 63, currency: 'EUR' }).length  // → 2
 */
export function feeCharged({ amount, currency }: Sum): Entry[] {
  assertPositive('feeCharged', 'amount', amount)
  return postings(currency, { processing_fees: amount, provider_balance: -amount })
}

/**
 * The provider paid money out to the workshop's bank.
 * Domain:  amount whole ≥ 1, an ISO 4217 currency → otherwise RangeError.
 * @example paidOut({ amount: 90000, currency: 'EUR' })  // → [{ account: 'bank', currency: 'EUR', amount: 90000 }, { account: 'provider_balance', currency: 'EUR', amount: -90000 }]
 */
export function paidOut({ amount, currency }: Sum): Entry[] {
  assertPositive('paidOut', 'amount', amount)
  return postings(currency, { bank: amount, provider_balance: -amount })
}

/**
 * A payout came back, or the workshop put money in so that refunds can go on.
 * Domain:  amount whole ≥ 1, an ISO 4217 currency → otherwise RangeError.
 * @example isBalanced(paidIn({ amount: 90000, currency: 'EUR' }))  // → true
 */
export function paidIn({ amount, currency }: Sum): Entry[] {
  assertPositive('paidIn', 'amount', amount)
  return postings(currency, { provider_balance: amount, bank: -amount })
}
