import { minor, type Day, type Minor } from '@/lib/core/brand'
import { wholeFrom } from '@/lib/core/stats/argument'
import { isDay } from '@/lib/core/time/day'

/** Money in the bank on one day, after everything of that day. */
export type CashDay = { readonly day: Day; readonly balance: Minor }

/**
 * How low the bank balance of a run gets and when: below 0 it is the money a maker must have beforehand.
 * Units:    minor units, + comes in, − goes out; days 'YYYY-MM-DD'.
 * Domain:   real calendar days, safe integers → otherwise RangeError. Events may come in any order.
 * Note:     the balance starts at 0 and is taken at the end of each day that has an event; what a day brings and takes
 *           counts together. `low` is the lowest of these, `day` the first that reaches it; 0 and null without events.
 * @example  cashLow([{ day: '2026-05-02', amount: 900 }, { day: '2026-05-01', amount: -400 }])  // → { low: -400, day: '2026-05-01', series: [{ day: '2026-05-01', balance: -400 }, { day: '2026-05-02', balance: 500 }] }
 */
export function cashLow(events: readonly { readonly day: Day; readonly amount: number }[]): {
  readonly low: Minor
  readonly day: Day | null
  readonly series: readonly CashDay[]
} {
  const changes = new Map<Day, number>()
  for (const { day, amount } of events) {
    if (!isDay(day)) throw new RangeError(`cashLow: day must be a calendar day 'YYYY-MM-DD', got ${day}`)
    changes.set(day, (changes.get(day) ?? 0) + minor(amount))
  }
  let balance = 0
  const series = [...changes.keys()].sort().map((day) => {
    balance += changes.get(day)!
    return { day, balance: minor(balance) }
  })
  const [first, ...others] = series
  const lowest = others.reduce((low, at) => (at.balance < low!.balance ? at : low), first)
  return { low: minor(lowest?.balance ?? 0), day: lowest?.day ?? null, series }
}

/**
 * Whether everyone could be paid back today, and by how much the balance at the provider falls short.
 * Units:    minor units; balance may be negative; deposits is the sum to pay back, refundFees what paying back costs.
 * Domain:   safe integers, deposits and refundFees ≥ 0 → otherwise RangeError.
 * @example  canRepay({ balance: 9000, deposits: 10000, refundFees: 250 })  // → { yes: false, shortBy: 1250 }
 */
export function canRepay({
  balance,
  deposits,
  refundFees,
}: {
  readonly balance: number
  readonly deposits: number
  readonly refundFees: number
}): { readonly yes: boolean; readonly shortBy: Minor } {
  wholeFrom(0, 'canRepay: deposits', deposits)
  wholeFrom(0, 'canRepay: refundFees', refundFees)
  const missing = deposits + refundFees - minor(balance)
  return { yes: missing <= 0, shortBy: minor(Math.max(0, missing)) }
}
