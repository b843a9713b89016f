import { minor, type Minor } from '@/lib/core/brand'
import type { Account } from '@/lib/core/ledger/accounts'

/** One line of a transfer: a debit (+) or credit (−) of an account, in minor units of a currency. */
export type Entry = { readonly account: Account; readonly currency: string; readonly amount: Minor }

function totals(entries: readonly Entry[], keyOf: (entry: Entry) => string): Map<string, bigint> {
  const sums = new Map<string, bigint>()
  for (const entry of entries) {
    if (!Number.isSafeInteger(entry.amount)) {
      throw new RangeError(`entries: amount must be a safe integer, got ${entry.amount}`)
    }
    const key = keyOf(entry)
    sums.set(key, (sums.get(key) ?? 0n) + BigInt(entry.amount))
  }
  return sums
}

/**
 * Whether debits and credits are equal in every currency by itself. No entries are balanced.
 * Domain:   amounts safe integers → otherwise RangeError.
 * Accuracy: exact, however many entries.
 * @example  isBalanced([{ account: 'bank', currency: 'EUR', amount: minor(5) }, { account: 'provider_balance', currency: 'EUR', amount: minor(-5) }])  // → true
 */
export function isBalanced(entries: readonly Entry[]): boolean {
  return [...totals(entries, (entry) => entry.currency).values()].every((sum) => sum === 0n)
}

/**
 * What stands on an account in a currency: debits less credits, 0 when nothing was booked.
 * Units:    minor units; positive for what we have or spent, negative for what we owe or earned.
 * Domain:   amounts and the sum safe integers → otherwise RangeError.
 * Accuracy: exact.
 * @example  balanceOf([{ account: 'bank', currency: 'EUR', amount: minor(5) }], 'bank', 'EUR')  // → 5
 */
export function balanceOf(entries: readonly Entry[], account: Account, currency: string): Minor {
  const own = entries.filter((entry) => entry.account === account && entry.currency === currency)
  return minor(Number(totals(own, () => '').get('') ?? 0n))
}
