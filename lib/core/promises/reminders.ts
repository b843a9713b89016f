import type { Day } from '@/lib/core/brand'
import { addDays } from '@/lib/core/time/day'

/** A day on which the owner of a run is reminded of a day that counts. */
export type Reminder<Offer extends string = string> = {
  readonly about: 'decide_by' | 'posted_by'
  /** The offer whose promise it is; null for the decision. */
  readonly offer: Offer | null
  /** The day that counts. */
  readonly on: Day
  /** The day of the reminder. */
  readonly day: Day
}

/** Days before decide-by, and after it while the clock has not called the run off. Our own values; common practice, no source. */
const DECIDE_BY = [-14, -3, 0, 4] as const
/** Days before a posted-by date: time enough to tell buyers before it passes. Our own values; common practice, no source. */
const POSTED_BY = [-30, -14, -3] as const

/**
 * When the owner of a run is reminded: before decide-by and after it, and before each posted-by date. In rising order of the
 * day of the reminder.
 * Domain: valid days → otherwise RangeError.
 * Source: own rule (product.md, The decision and Promises).
 * @example remindersOf({ decideBy: '2027-04-20', postedBy: [] }).map(({ day }) => day)  // → ['2027-04-06', '2027-04-17', '2027-04-20', '2027-04-24']
 */
export function remindersOf<Offer extends string>({
  decideBy,
  postedBy,
}: {
  readonly decideBy: Day
  readonly postedBy: readonly { readonly offer: Offer; readonly on: Day }[]
}): Reminder<Offer>[] {
  const decision = DECIDE_BY.map((days) => ({
    ...{ about: 'decide_by' as const, offer: null, on: decideBy },
    day: addDays(decideBy, days),
  }))
  const promises = postedBy.flatMap(({ offer, on }) =>
    POSTED_BY.map((days) => ({ about: 'posted_by' as const, offer, on, day: addDays(on, days) })),
  )
  return [...decision, ...promises].sort((a, b) => (a.day < b.day ? -1 : a.day > b.day ? 1 : 0))
}
