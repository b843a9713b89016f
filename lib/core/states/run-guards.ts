import type { Day } from '@/lib/core/brand'
import { toProvider } from '@/lib/core/money/provider'
import { ok, refuse, type Result } from '@/lib/core/result'
import { READINESS_KEYS, type ReadinessLine } from '@/lib/core/states/run-readiness'
import { daysBetween } from '@/lib/core/time/day'

export { readinessOf } from '@/lib/core/states/run-readiness'

/** An offer of a run as it is about to be opened; null where the owner has not said yet. Money in minor units. */
export type OfferFacts = {
  readonly priceMinor: number | null
  readonly depositMinor: number | null
  readonly postedBy: Day | null
}

/** What must be known to open a run for deposits. */
export type OpenFacts = {
  readonly minimum: number
  readonly maximum: number
  readonly today: Day
  readonly decideBy: Day
  readonly currency: string
  readonly offers: readonly OfferFacts[]
  readonly accountCanCharge: boolean
  readonly pagePublished: boolean
  readonly termsSet: boolean
  /** How many days the provider lets a deposit lie; null when it sets no limit. */
  readonly holdingLimitDays: number | null
  /** How deposits are kept beyond that limit, in the owner's words; shown to buyers. */
  readonly statedPlan: string | null
}

/** Why a run may not be opened. */
export type OpenRefusal =
  | 'minimum_out_of_range'
  | 'decide_by_past'
  | 'no_offer'
  | 'offer_without_date'
  | 'posted_by_before_decide_by'
  | 'offer_without_price'
  | 'deposit_out_of_range'
  | 'amount_not_chargeable'
  | 'account_cannot_charge'
  | 'page_not_published'
  | 'terms_missing'
  | 'beyond_holding_limit'

const hasText = (text: string | null | undefined) => text !== null && text !== undefined && text.trim() !== ''

/**
 * Whether a run may be opened for deposits.
 * Refuses: in this order: 'minimum_out_of_range' (not 1 ≤ minimum ≤ maximum, whole), 'decide_by_past' (today or earlier),
 *          'no_offer', 'offer_without_date', 'posted_by_before_decide_by' (decide-by must come first),
 *          'offer_without_price', 'deposit_out_of_range' (not 0 < deposit ≤ price), 'amount_not_chargeable' (the provider
 *          cannot take the deposit or write the price), 'account_cannot_charge', 'page_not_published', 'terms_missing',
 *          'beyond_holding_limit' (no stated plan either).
 * Domain:  valid days, an ISO 4217 currency → otherwise RangeError.
 * Source:  states.md, open_deposits.
 * @example mayOpen({ minimum: 5, maximum: 4, today: '2026-03-01', decideBy: '2026-04-01', currency: 'EUR', offers: [], accountCanCharge: true, pagePublished: true, termsSet: true, holdingLimitDays: 90, statedPlan: null })  // → refuse('minimum_out_of_range')
 */
export function mayOpen(facts: OpenFacts): Result<true, OpenRefusal> {
  const { minimum, maximum, today, decideBy } = facts
  const whole = Number.isSafeInteger(minimum) && Number.isSafeInteger(maximum)
  if (!whole || minimum < 1 || minimum > maximum) return refuse('minimum_out_of_range')
  const daysToDecide = daysBetween(today, decideBy)
  if (daysToDecide <= 0) return refuse('decide_by_past')
  const offers = mayOffer(facts)
  if (!offers.ok) return offers
  if (!facts.accountCanCharge) return refuse('account_cannot_charge')
  if (!facts.pagePublished) return refuse('page_not_published')
  if (!facts.termsSet) return refuse('terms_missing')
  const held = facts.holdingLimitDays === null || daysToDecide <= facts.holdingLimitDays
  return held || hasText(facts.statedPlan) ? ok(true) : refuse('beyond_holding_limit')
}

function mayOffer({ offers, decideBy, currency }: OpenFacts): Result<true, OpenRefusal> {
  if (offers.length === 0) return refuse('no_offer')
  for (const { priceMinor, depositMinor, postedBy } of offers) {
    if (postedBy === null) return refuse('offer_without_date')
    if (daysBetween(decideBy, postedBy) <= 0) return refuse('posted_by_before_decide_by')
    if (priceMinor === null || depositMinor === null || priceMinor <= 0) return refuse('offer_without_price')
    if (depositMinor <= 0 || depositMinor > priceMinor) return refuse('deposit_out_of_range')
    if (!toProvider(depositMinor, currency).ok || !toProvider(priceMinor, currency).ok) {
      return refuse('amount_not_chargeable')
    }
  }
  return ok(true)
}

/** What must be known to lock a run. */
export type LockFacts = {
  /** Units of orders under deposit, without held places and orders entered by hand. */
  readonly deposited: number
  readonly minimum: number
  /** Why the run goes below its minimum, told to buyers; null where there is no need. */
  readonly reason: string | null
  readonly readiness: readonly ReadinessLine[]
  /** Card sessions for deposits of this run still open at the provider. */
  readonly openSessions: number
  /** Deposit attempts whose outcome is not known. */
  readonly unknownAttempts: number
}

/**
 * Whether a run may be locked.
 * Refuses: in this order: 'below_minimum' (and no written reason), 'not_ready' (one of the nine
 *          readiness lines missing, unknown or not there), 'session_open' (expire them at the provider first), 'attempt_unknown' (look it up first).
 * Source:  states.md, lock.
 * @example mayLock({ deposited: 59, minimum: 60, reason: null, readiness: [], openSessions: 0, unknownAttempts: 0 })  // → refuse('below_minimum')
 */
export function mayLock(
  facts: LockFacts,
): Result<true, 'below_minimum' | 'not_ready' | 'session_open' | 'attempt_unknown'> {
  if (facts.deposited < facts.minimum && !hasText(facts.reason)) return refuse('below_minimum')
  const passed = facts.readiness.filter(({ state }) => state === 'ready' || state === 'waived')
  const all = READINESS_KEYS.every((key) => passed.some((line) => line.key === key))
  if (!all || passed.length < facts.readiness.length) return refuse('not_ready')
  if (facts.openSessions > 0) return refuse('session_open')
  return facts.unknownAttempts > 0 ? refuse('attempt_unknown') : ok(true)
}

/** What must be known to call a run off. */
export type CallOffFacts = {
  /** Why, told to buyers; the clock gives its own. */
  readonly reason: string
  /** Parcels of the run already handed over. */
  readonly handedOver: number
}

/**
 * Whether a run may be called off, by its owner or by the clock.
 * Refuses: 'reason_missing', 'already_handed_over' (something of the run is in the post).
 * Source:  states.md, call_off.
 * @example mayCallOff({ reason: 'The power stage is not stable.', handedOver: 0 })  // → ok(true)
 */
export function mayCallOff(facts: CallOffFacts): Result<true, 'reason_missing' | 'already_handed_over'> {
  if (!hasText(facts.reason)) return refuse('reason_missing')
  return facts.handedOver > 0 ? refuse('already_handed_over') : ok(true)
}

/** What must be known to close a run. */
export type CloseFacts = {
  /** Orders that have not reached an end (see `isOrderAtEnd`); waiting ones are cancelled by the close itself. */
  readonly ordersShortOfEnd: number
  readonly openProblems: number
  readonly pendingRefunds: number
  readonly unknownAttempts: number
  /** Whether what became of each class of sign-ups is stored for the next forecast. */
  readonly conversionsStored: boolean
}

/**
 * Whether a run may be closed.
 * Refuses: in this order: 'order_short_of_end', 'problem_open', 'refund_pending', 'attempt_unknown', 'conversions_missing'.
 * Source:  states.md, close.
 * @example mayClose({ ordersShortOfEnd: 0, openProblems: 1, pendingRefunds: 0, unknownAttempts: 0, conversionsStored: true })  // → refuse('problem_open')
 */
export function mayClose(
  facts: CloseFacts,
): Result<
  true,
  'order_short_of_end' | 'problem_open' | 'refund_pending' | 'attempt_unknown' | 'conversions_missing'
> {
  if (facts.ordersShortOfEnd > 0) return refuse('order_short_of_end')
  if (facts.openProblems > 0) return refuse('problem_open')
  if (facts.pendingRefunds > 0) return refuse('refund_pending')
  if (facts.unknownAttempts > 0) return refuse('attempt_unknown')
  return facts.conversionsStored ? ok(true) : refuse('conversions_missing')
}
