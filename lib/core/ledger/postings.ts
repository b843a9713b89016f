import { minor } from '@/lib/core/brand'
import type { Account } from '@/lib/core/ledger/accounts'
import { isBalanced, type Entry } from '@/lib/core/ledger/balance'
import { isCurrency } from '@/lib/core/money/currency'

/**
 * The entries of one event, checked: a known currency, whole amounts, debits equal to credits. Amounts of 0 leave no entry.
 * Domain:  an ISO 4217 currency, safe integers, a sum of 0 → otherwise RangeError.
 * @example postings('EUR', { bank: 5, provider_balance: -5 }).length  // → 2
 */
export function postings(currency: string, amounts: Readonly<Partial<Record<Account, number>>>): Entry[] {
  if (!isCurrency(currency))
    throw new RangeError(`postings: currency must be an ISO 4217 currency, got ${currency}`)
  const entries = Object.entries(amounts)
    .filter(([, amount]) => amount !== 0)
    .map(([account, amount]) => ({ account: account as Account, currency, amount: minor(amount) }))
  if (!isBalanced(entries))
    throw new RangeError(`postings: amounts must sum to 0, got ${JSON.stringify(amounts)}`)
  return entries
}

/** Throws unless the amount is a safe integer of at least 1. */
export function assertPositive(name: string, argument: string, amount: number): void {
  if (!Number.isSafeInteger(amount) || amount < 1) {
    throw new RangeError(`${name}: ${argument} must be a whole number ≥ 1, got ${amount}`)
  }
}

/** Throws unless the part is a safe integer between 0 and the whole. */
export function assertPart(name: string, argument: string, part: number, whole: number): void {
  if (!Number.isSafeInteger(part) || part < 0 || part > whole) {
    throw new RangeError(`${name}: ${argument} must be a whole number from 0 to ${whole}, got ${part}`)
  }
}
