import { wholeFrom } from '../stats/argument'
import { type NewcomerRate, newcomers as newcomersOf } from './clock'
import { forecastOf, type UnitsForecast } from './units-forecast'

/** People on no list: how often they came, how long they still may, and the units each of those seen took. */
export type Newcomers = {
  readonly rate: NewcomerRate
  readonly daysLeft: number
  /** One entry per person seen; empty: one unit each. */
  readonly quantities: readonly number[]
}

/** Chances of so many people that may be left out: together they are below the accuracy of a forecast. */
const NEGLIGIBLE = 1e-13

/** The sum of two independent counts. */
function added(a: Float64Array, b: Float64Array): Float64Array {
  const sum = new Float64Array(a.length + b.length - 1)
  a.forEach((chance, i) => {
    if (chance > 0) b.forEach((other, k) => (sum[i + k] = (sum[i + k] as number) + chance * other))
  })
  return sum
}

/**
 * Units that people on no list will still take: a count of people by `newcomers`, each taking as many units as one of those
 * seen, drawn anew.
 * Units:    units; days; rate in people per day.
 * Domain:   whole quantities ≥ 1; the rest as `newcomers` → otherwise RangeError.
 * Accuracy: chances within 1e-12; mean and sd by the rule of compound counts (mean = people × units each).
 * Source:   compound distribution, by its definition.
 * Cost:     O(people² · most units each).
 * @example  newcomerUnits({ rate: 0.5, daysLeft: 10, quantities: [1, 3] }).mean  // → 10
 */
export function newcomerUnits({ rate, daysLeft, quantities }: Newcomers): UnitsForecast {
  const people = newcomersOf({ rate, days: daysLeft })
  const taken = quantities.length > 0 ? quantities : [1]
  const each = new Float64Array(1 + taken.reduce((most, quantity) => Math.max(most, quantity), 1))
  for (const quantity of taken)
    each[wholeFrom(1, 'quantities', quantity)] = (each[quantity] as number) + 1 / taken.length
  let last = people.pmf.length - 1
  for (let rest = 0; last > 0 && rest + (people.pmf[last] as number) < NEGLIGIBLE; last -= 1)
    rest += people.pmf[last] as number
  const pmf = new Float64Array(1 + last * (each.length - 1))
  let ofSoMany: Float64Array = new Float64Array([1])
  for (let count = 0; count <= last; count += 1) {
    const chance = people.pmf[count] as number
    ofSoMany.forEach((one, units) => (pmf[units] = (pmf[units] as number) + chance * one))
    if (count < last) ofSoMany = added(ofSoMany, each)
  }
  const mean = taken.reduce((sum, quantity) => sum + quantity, 0) / taken.length
  const square = taken.reduce((sum, quantity) => sum + quantity * quantity, 0) / taken.length
  return forecastOf(pmf, {
    mean: people.mean * mean,
    sd: Math.sqrt(people.mean * (square - mean * mean) + people.sd ** 2 * mean * mean),
  })
}
