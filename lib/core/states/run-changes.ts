import type { Day } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'
import type { RunState } from '@/lib/core/states/run'
import { addDays, daysBetween } from '@/lib/core/time/day'

/** How far decide-by may be moved, once, in days (product.md, The decision). */
export const DECIDE_BY_MOVE_DAYS = 30

/** After how many days without a decision the clock calls a run off (product.md, The decision). */
export const UNDECIDED_DAYS = 7

/**
 * The day on which a run that is still undecided is called off by the clock: decide-by and 7 days.
 * Domain: a valid day → otherwise RangeError.
 * @example callOffDueOn('2026-04-01')  // → '2026-04-08'
 */
export function callOffDueOn(decideBy: Day): Day {
  return addDays(decideBy, UNDECIDED_DAYS)
}

/**
 * Whether a run's minimum may be lowered; it never rises, since buyers counted on it.
 * Refuses: 'not_taking_deposits', 'minimum_out_of_range' (not whole or below 1), 'not_lower'.
 * Source:  states.md, lower_minimum.
 * @example mayLowerMinimum({ state: 'taking_deposits', minimum: 60, proposed: 50 })  // → ok(true)
 */
export function mayLowerMinimum(facts: {
  readonly state: RunState
  readonly minimum: number
  readonly proposed: number
}): Result<true, 'not_taking_deposits' | 'minimum_out_of_range' | 'not_lower'> {
  if (facts.state !== 'taking_deposits') return refuse('not_taking_deposits')
  if (!Number.isSafeInteger(facts.proposed) || facts.proposed < 1) return refuse('minimum_out_of_range')
  return facts.proposed < facts.minimum ? ok(true) : refuse('not_lower')
}

/**
 * Whether decide-by may be moved: once, later by at most 30 days, and still before every posted-by date.
 * Refuses: 'not_taking_deposits', 'already_moved', 'not_later', 'too_far', 'decide_by_past', 'posted_by_before_decide_by'.
 * Source:  states.md, move_decide_by.
 * @example mayMoveDecideBy({ state: 'taking_deposits', decideBy: '2026-04-01', proposed: '2026-05-02', movedBefore: false, today: '2026-03-20', postedBy: ['2026-09-01'] })  // → refuse('too_far')
 */
export function mayMoveDecideBy(facts: {
  readonly state: RunState
  readonly decideBy: Day
  readonly proposed: Day
  readonly movedBefore: boolean
  readonly today: Day
  readonly postedBy: readonly Day[]
}): Result<
  true,
  | 'not_taking_deposits'
  | 'already_moved'
  | 'not_later'
  | 'too_far'
  | 'decide_by_past'
  | 'posted_by_before_decide_by'
> {
  if (facts.state !== 'taking_deposits') return refuse('not_taking_deposits')
  if (facts.movedBefore) return refuse('already_moved')
  const later = daysBetween(facts.decideBy, facts.proposed)
  if (later <= 0) return refuse('not_later')
  if (later > DECIDE_BY_MOVE_DAYS) return refuse('too_far')
  if (daysBetween(facts.today, facts.proposed) <= 0) return refuse('decide_by_past')
  const before = facts.postedBy.every((day) => daysBetween(facts.proposed, day) > 0)
  return before ? ok(true) : refuse('posted_by_before_decide_by')
}

/**
 * Whether a run's maximum may be changed: not below the places taken and held, nor below the minimum.
 * Refuses: 'run_over' (closed or called off), 'below_committed', 'below_minimum', 'maximum_out_of_range' (not whole).
 * Source:  states.md, change_maximum.
 * @example mayChangeMaximum({ state: 'taking_deposits', minimum: 60, committed: 72, proposed: 70 })  // → refuse('below_committed')
 */
export function mayChangeMaximum(facts: {
  readonly state: RunState
  readonly minimum: number
  readonly committed: number
  readonly proposed: number
}): Result<true, 'run_over' | 'maximum_out_of_range' | 'below_committed' | 'below_minimum'> {
  if (facts.state === 'closed' || facts.state === 'called_off') return refuse('run_over')
  if (!Number.isSafeInteger(facts.proposed)) return refuse('maximum_out_of_range')
  if (facts.proposed < facts.committed) return refuse('below_committed')
  return facts.proposed < facts.minimum ? refuse('below_minimum') : ok(true)
}
