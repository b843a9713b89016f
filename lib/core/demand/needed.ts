import { ok, refuse, type Result } from '../result'
import { insideUnit, wholeFrom } from '../stats/argument'
import { reaches } from '../stats/tie'
import { type ForecastOptions, forecastUnits } from './forecast'
import type { Group } from './group'

/** A class with more members: its own quantities again, in turn; an empty class grows by ones. */
function extended(group: Group, more: number): Group {
  const own = group.quantities.length > 0 ? group.quantities : [1]
  const added = Array.from({ length: more }, (_, i) => own[i % own.length] as number)
  return { ...group, quantities: [...group.quantities, ...added] }
}

/**
 * How many more sign-ups of one class make the minimum as likely as wanted: the smallest number m of new members of
 * groups[at], who ask for its quantities in turn (the first new one as the first member, and so on; by ones where the
 * class is empty), with P(units ≥ minimum) ≥ chance by `forecastUnits`.
 * Units: sign-ups; minimum in units, committed ones counted.
 * Domain: whole `at` naming a class; whole minimum ≥ 0; 0 < chance < 1; whole limit ≥ 1 (default 1,000); the rest as
 * `forecastUnits` → otherwise RangeError.
 * Refuses: 'already_there' when none is needed; 'out_of_reach' when `limit` more do not do it.
 * Accuracy: exact, the chance never falls with m; a tie within 1e-12 counts as reached.
 * Cost: two dozen forecasts at most.
 * @example signupsNeeded({ groups: [{ alpha: 1, beta: 1, quantities: [1] }], at: 0, minimum: 1, chance: 0.75 })  // → ok(2)
 */
export function signupsNeeded(
  ask: ForecastOptions & {
    readonly groups: readonly Group[]
    readonly at: number
    readonly minimum: number
    readonly chance: number
    readonly limit?: number
  },
): Result<number, 'already_there' | 'out_of_reach'> {
  const { groups, at, minimum, chance, limit = 1000, ...options } = ask
  const group = groups[wholeFrom(0, 'at', at)]
  if (!group) throw new RangeError(`at must name one of ${groups.length} groups, got ${at}`)
  wholeFrom(0, 'minimum', minimum)
  insideUnit('chance', chance)
  wholeFrom(1, 'limit', limit)
  const enough = (more: number) => {
    const grown = groups.map((each, i) => (i === at ? extended(group, more) : each))
    return reaches(forecastUnits(grown, options).atLeast(minimum), chance)
  }
  if (enough(0)) return refuse('already_there')
  let low = 0
  let high = 1
  while (!enough(high)) {
    if (high === limit) return refuse('out_of_reach')
    low = high
    high = Math.min(limit, high * 2)
  }
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (enough(middle)) high = middle
    else low = middle
  }
  return ok(high)
}
