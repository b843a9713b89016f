import type { Day } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import type { RunState } from '@/lib/core/states/run'
import { addDays, daysBetween } from '@/lib/core/time/day'

/** For how long a place offered to a waiting person is kept, in hours (states.md, place_offered). */
export const PLACE_OFFER_HOURS = 48

/** States in which an order needs nothing more from anybody; a withdrawn one still waits for its return. */
const ENDS: readonly OrderState[] = ['posted', 'returned', 'cancelled', 'expired', 'lapsed']

/**
 * Whether an order has reached an end, so that its run may close.
 * @example isOrderAtEnd('posted')  // → true
 * @example isOrderAtEnd('withdrawn')  // → false
 */
export function isOrderAtEnd(state: OrderState): boolean {
  return ENDS.includes(state)
}

/**
 * Whether a person may place an order in a run, and whether it takes a place at once or queues. It queues when the units do
 * not fit or when others wait already: nobody overtakes. A waiting person who was offered a place does not place again.
 * Refuses: 'run_not_open' (not taking deposits), 'decide_by_past' (the day after decide-by and later),
 *          'not_open_to_all_yet' (head start of the invited), 'limit_reached' (units per person and run).
 * Domain:  units whole ≥ 1 → otherwise RangeError.
 * Source:  states.md, run and order.
 * @example mayPlace({ run: 'taking_deposits', today: '2026-04-01', decideBy: '2026-04-01', openToThem: true, units: 1, unitsBefore: 0, limit: 2, free: 3, waiting: 0 })  // → ok('place')
 */
export function mayPlace(facts: {
  readonly run: RunState
  readonly today: Day
  readonly decideBy: Day
  /** False while only the invited may order and this person is not among them. */
  readonly openToThem: boolean
  readonly units: number
  /** Units this person already has in live orders of the run. */
  readonly unitsBefore: number
  readonly limit: number
  /** Units of the maximum neither taken nor held. */
  readonly free: number
  /** Orders waiting for a place. */
  readonly waiting: number
}): Result<'place' | 'queue', 'run_not_open' | 'decide_by_past' | 'not_open_to_all_yet' | 'limit_reached'> {
  if (!Number.isSafeInteger(facts.units) || facts.units < 1) {
    throw new RangeError(`mayPlace: units must be a whole number ≥ 1, got ${facts.units}`)
  }
  if (facts.run !== 'taking_deposits') return refuse('run_not_open')
  if (daysBetween(facts.today, facts.decideBy) < 0) return refuse('decide_by_past')
  if (!facts.openToThem) return refuse('not_open_to_all_yet')
  if (facts.unitsBefore + facts.units > facts.limit) return refuse('limit_reached')
  return ok(facts.units <= facts.free && facts.waiting === 0 ? 'place' : 'queue')
}

/** What was asked of the provider, or what it says it took. */
export type PaymentFacts = { readonly amount: number; readonly currency: string; readonly order: string }

/**
 * Whether a payment that arrived is the one asked for; otherwise it goes back at once.
 * Refuses: 'order_differs', 'currency_differs', 'amount_differs', in this order.
 * Source:  states.md, deposit_captured.
 * @example mayAccept({ amount: 2500, currency: 'EUR', order: 'a' }, { amount: 2500, currency: 'USD', order: 'a' })  // → refuse('currency_differs')
 */
export function mayAccept(
  asked: PaymentFacts,
  arrived: PaymentFacts,
): Result<true, 'order_differs' | 'currency_differs' | 'amount_differs'> {
  if (asked.order !== arrived.order) return refuse('order_differs')
  if (asked.currency !== arrived.currency) return refuse('currency_differs')
  return asked.amount === arrived.amount ? ok(true) : refuse('amount_differs')
}

/**
 * Whether a deposit that arrived after its hold had ended may still take a place; otherwise it goes back at once.
 * Refuses: 'run_not_open', 'no_place'.
 * Source:  states.md, late_capture.
 * @example mayReserveLate({ run: 'taking_deposits', units: 2, free: 1 })  // → refuse('no_place')
 */
export function mayReserveLate(facts: {
  readonly run: RunState
  readonly units: number
  readonly free: number
}): Result<true, 'run_not_open' | 'no_place'> {
  if (facts.run !== 'taking_deposits') return refuse('run_not_open')
  return facts.units <= facts.free ? ok(true) : refuse('no_place')
}

/**
 * Whether a buyer may cancel for the full deposit without a reason: until the lock.
 * Refuses: 'run_locked'.
 * Source:  states.md, cancel.
 * @example mayCancelFreely('locked')  // → refuse('run_locked')
 */
export function mayCancelFreely(run: RunState): Result<true, 'run_locked'> {
  return run === 'locked' || run === 'closed' ? refuse('run_locked') : ok(true)
}

/**
 * Whether a balance may be asked for, once the run is locked. An order with nothing left to pay is paid (nothing_due).
 * Refuses: 'run_not_locked', 'nothing_due', 'disputed' (the buyer's bank has to decide first).
 * Source:  states.md, ask_balance and nothing_due.
 * @example mayAskBalance({ run: 'locked', dueMinor: 0, disputed: false })  // → refuse('nothing_due')
 */
export function mayAskBalance(facts: {
  readonly run: RunState
  readonly dueMinor: number
  readonly disputed: boolean
}): Result<true, 'run_not_locked' | 'nothing_due' | 'disputed'> {
  if (facts.run !== 'locked') return refuse('run_not_locked')
  if (facts.dueMinor <= 0) return refuse('nothing_due')
  return facts.disputed ? refuse('disputed') : ok(true)
}

/**
 * Whether an order lapses for want of its balance: the days of grace count from the failed charge.
 * Refuses: 'disputed', 'payment_in_flight' (an attempt unknown, sent or with the customer's bank), 'mails_bounce'
 *          (the buyer cannot know), 'not_yet' (no charge failed, or the days are not over).
 * Domain:  valid days, lapseAfterDays whole ≥ 0 → otherwise RangeError.
 * Source:  states.md, lapse; product.md, Balances.
 * @example mayLapse({ disputed: false, paymentInFlight: false, mailsBounce: false, chargeFailedOn: '2026-06-01', lapseAfterDays: 14, today: '2026-06-14' })  // → refuse('not_yet')
 */
export function mayLapse(facts: {
  readonly disputed: boolean
  readonly paymentInFlight: boolean
  readonly mailsBounce: boolean
  readonly chargeFailedOn: Day | null
  readonly lapseAfterDays: number
  readonly today: Day
}): Result<true, 'disputed' | 'payment_in_flight' | 'mails_bounce' | 'not_yet'> {
  if (facts.disputed) return refuse('disputed')
  if (facts.paymentInFlight) return refuse('payment_in_flight')
  if (facts.mailsBounce) return refuse('mails_bounce')
  if (!Number.isSafeInteger(facts.lapseAfterDays) || facts.lapseAfterDays < 0) {
    throw new RangeError(`mayLapse: lapseAfterDays must be a whole number ≥ 0, got ${facts.lapseAfterDays}`)
  }
  if (facts.chargeFailedOn === null) return refuse('not_yet')
  return facts.today >= addDays(facts.chargeFailedOn, facts.lapseAfterDays) ? ok(true) : refuse('not_yet')
}

/**
 * Whether an order is all packed.
 * Refuses: 'disputed', 'destination_paused', 'line_not_packed' (something of it is in no packed parcel).
 * Source:  states.md, pack.
 * @example mayPack({ disputed: false, destinationPaused: false, unitsUnpacked: 1 })  // → refuse('line_not_packed')
 */
export function mayPack(facts: {
  readonly disputed: boolean
  readonly destinationPaused: boolean
  readonly unitsUnpacked: number
}): Result<true, 'disputed' | 'destination_paused' | 'line_not_packed'> {
  if (facts.disputed) return refuse('disputed')
  if (facts.destinationPaused) return refuse('destination_paused')
  return facts.unitsUnpacked > 0 ? refuse('line_not_packed') : ok(true)
}

/**
 * Whether an amount of a payment may be paid back.
 * Refuses: 'disputed' (the bank may pay it back, and twice is too much), 'more_than_paid' (with what went back before).
 * Domain:  amount whole ≥ 1 → otherwise RangeError.
 * Source:  data.md point 7; states.md on disputes.
 * @example mayRefund({ disputed: false, capturedMinor: 2500, refundedMinor: 2000, amountMinor: 501 })  // → refuse('more_than_paid')
 */
export function mayRefund(facts: {
  readonly disputed: boolean
  readonly capturedMinor: number
  /** Refunds of this payment that have not failed, pending ones among them. */
  readonly refundedMinor: number
  readonly amountMinor: number
}): Result<true, 'disputed' | 'more_than_paid'> {
  if (!Number.isSafeInteger(facts.amountMinor) || facts.amountMinor < 1) {
    throw new RangeError(`mayRefund: amountMinor must be a whole number ≥ 1, got ${facts.amountMinor}`)
  }
  if (facts.disputed) return refuse('disputed')
  return facts.refundedMinor + facts.amountMinor <= facts.capturedMinor ? ok(true) : refuse('more_than_paid')
}

/**
 * Whether a buyer may change what is ordered: until the lock, within the limit per person, and only as far as places are
 * free that nobody waits for.
 * Refuses: 'run_locked', 'limit_reached', 'no_place'.
 * Domain:  units whole ≥ 1 → otherwise RangeError.
 * Source:  own rule, from product.md: nobody overtakes, two people never get the last place.
 * @example mayChangeOrder({ run: 'taking_deposits', units: 2, unitsNow: 1, unitsElsewhere: 0, limit: 2, free: 1, waiting: 0 })  // → ok(true)
 * @example mayChangeOrder({ run: 'taking_deposits', units: 2, unitsNow: 1, unitsElsewhere: 0, limit: 2, free: 1, waiting: 1 })  // → refuse('no_place')
 */
export function mayChangeOrder(facts: {
  readonly run: RunState
  /** Units the order would have, and has. */
  readonly units: number
  readonly unitsNow: number
  /** Units of the person's other live orders in the run. */
  readonly unitsElsewhere: number
  readonly limit: number
  /** Units of the maximum neither taken nor held, for what grows. */
  readonly free: number
  readonly waiting: number
}): Result<true, 'run_locked' | 'limit_reached' | 'no_place'> {
  const { units, unitsNow } = facts
  if (!Number.isSafeInteger(units) || units < 1)
    throw new RangeError(`mayChangeOrder: units must be a whole number ≥ 1, got ${units}`)
  if (facts.run !== 'taking_deposits') return refuse('run_locked')
  if (units > unitsNow && facts.unitsElsewhere + units > facts.limit) return refuse('limit_reached')
  if (facts.free < units - unitsNow) return refuse('no_place')
  return units > unitsNow && facts.waiting > 0 ? refuse('no_place') : ok(true)
}
