import type { Entry } from '@/lib/core/ledger/balance'
import { assertPositive, postings } from '@/lib/core/ledger/postings'

type Sum = { readonly amount: number; readonly currency: string }

/**
 * Tax falls due on a payment whose order is not posted yet: it is owed, and waits to be counted with the order.
 * Units:   minor units.
 * Domain:  amount whole ≥ 1, an ISO 4217 currency → otherwise RangeError.
 * @example taxDue({ amount: 399, currency: 'EUR' })  // → [{ account: 'tax_on_deposits', currency: 'EUR', amount: 399 }, { account: 'tax_payable', currency: 'EUR', amount: -399 }]
 */
export function taxDue({ amount, currency }: Sum): Entry[] {
  assertPositive('taxDue', 'amount', amount)
  return postings(currency, { tax_on_deposits: amount, tax_payable: -amount })
}

/**
 * A credit note takes tax back: before posting what waited for the order, after it what had been left out of sales.
 * Domain:  as for `taxDue`.
 * @example taxDueBack({ amount: 399, currency: 'EUR', posted: false })  // → [{ account: 'tax_payable', currency: 'EUR', amount: 399 }, { account: 'tax_on_deposits', currency: 'EUR', amount: -399 }]
 */
export function taxDueBack({ amount, currency, posted }: Sum & { readonly posted: boolean }): Entry[] {
  assertPositive('taxDueBack', 'amount', amount)
  return postings(currency, { tax_payable: amount, [posted ? 'sales_returned' : 'tax_on_deposits']: -amount })
}
