import { share, wholeFrom } from '../stats/argument'
import type { Arrivals } from './arrivals'
import { stillToCome } from './clock'
import { updateConversion } from './conversion'
import { forecastUnits, type Group } from './forecast'
import { newcomerUnits, type Newcomers } from './newcomer-units'
import type { Conversion } from './group'
import { together } from './together'
import type { UnitsForecast } from './units-forecast'

/** People of one class on the list of a run: those who have answered, counted, and those who have not, one by one. */
export type Listed<Name extends string = string> = Conversion & {
  readonly name: Name
  /** People under deposit, or on the way to it. */
  readonly ordered: number
  /** People who said no, or gave their place back. */
  readonly declined: number
  /** Who has not answered: the units asked for, and the share of such people who would have answered by now. */
  readonly silent: readonly { readonly quantity: number; readonly arrivedShare: number }[]
}

/** Units in the end, and what they are made of. */
export type RunForecast<Name extends string = string> = {
  readonly forecast: UnitsForecast
  /** What is believed of each class that still has silent people; a `Group` for every other question about them. */
  readonly groups: readonly (Group & { readonly name: Name })[]
  /** Expected units of the silent, and of newcomers. */
  readonly fromListed: number
  readonly fromNewcomers: number
}

/**
 * The share of somebody's answers that would be in by now, asked at one part of the window and looked at at another.
 * Domain: parts from 0 to 1 → otherwise RangeError. Asked at the very end, nobody could have answered yet.
 * Source: conditional share of the arrival curve.
 * @example arrivedSince({ shareBy: (part) => part, tenths: [] }, 0.5, 0.75)  // → 0.5
 */
export function arrivedSince({ shareBy }: Arrivals, asked: number, now: number): number {
  const [before, by] = [shareBy(share('asked', asked)), shareBy(share('now', now))]
  return before >= 1 || by <= before ? 0 : (by - before) / (1 - before)
}

/**
 * How many units a run that takes deposits will have in the end: those it has, what the people on its list who have not
 * answered are still worth, and people who are on no list. Within a class those who answered teach what to think of those
 * who did not, and their silence speaks against them, the more the later it is (`stillToCome`, at the mean of their
 * shares). Classes and newcomers are independent.
 * Units:    units; people; shares from 0 to 1.
 * Domain:   whole committed, ordered, declined ≥ 0; the rest as `stillToCome`, `forecastUnits`, `newcomers` → otherwise
 *           RangeError.
 * Accuracy: what is known of the silent of a class is stood for by the Beta with the same mean and second moment, so those of
 *           their units are exact where all were asked together; ranges are held against simulated runs in
 *           tests/core/demand/honesty.test.ts.
 * Source:   own, from `stillToCome`.
 * Cost:     one forecast and one convolution; 5,000 silent people in some 80 ms.
 * @example  runForecast({ committed: 5, listed: [], newcomers: null }).forecast.mean  // → 5
 */
export function runForecast<Name extends string>({
  committed,
  listed,
  newcomers,
}: {
  readonly committed: number
  readonly listed: readonly Listed<Name>[]
  readonly newcomers: Newcomers | null
}): RunForecast<Name> {
  wholeFrom(0, 'committed', committed)
  const groups = listed.filter(({ silent }) => silent.length > 0).map(silentGroup)
  const own = forecastUnits(groups, { committed })
  const others = newcomers && newcomerUnits(newcomers)
  return {
    forecast: others ? together([own, others]) : own,
    groups,
    fromListed: own.mean - committed,
    fromNewcomers: others?.mean ?? 0,
  }
}

function silentGroup<Name extends string>(people: Listed<Name>): Group & { name: Name } {
  const { name, ordered, declined, silent } = people
  const known = updateConversion(people, { converted: ordered, notConverted: declined })
  const arrivedShare = silent.reduce((sum, each) => sum + each.arrivedShare, 0) / silent.length
  // Rounding must not lift a mean of ones above 1.
  const ask = { ...known, arrivedShare: Math.min(1, arrivedShare), silent: silent.length }
  // Nobody could have answered yet: silence says nothing, and the Beta itself stands.
  const { alpha, beta } = arrivedShare > 0 ? stillToCome(ask) : known
  return { name, alpha, beta, quantities: silent.map(({ quantity }) => quantity) }
}
