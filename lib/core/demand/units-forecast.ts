import { insideUnit } from '../stats/argument'
import { reaches } from '../stats/tie'

/** A distribution of units: what may be wanted, and how likely each count is. */
export type UnitsForecast = {
  /** pmf[k] is the chance of exactly k units; the index starts at 0 and the chances add up to 1. */
  readonly pmf: Float64Array
  /** The expected number of units. */
  readonly mean: number
  /** The standard deviation, in units. */
  readonly sd: number
  /** The smallest k with P(X ≤ k) ≥ p, for 0 < p < 1 (otherwise RangeError); a tie within 1e-12 counts. */
  readonly quantile: (p: number) => number
  /** The chance of n units or more. */
  readonly atLeast: (n: number) => number
}

/** The mean and standard deviation of a distribution, where no closed form is at hand. */
function momentsOf(pmf: Float64Array): { mean: number; sd: number } {
  let mean = 0
  for (let k = 0; k < pmf.length; k += 1) mean += k * (pmf[k] as number)
  let variance = 0
  for (let k = 0; k < pmf.length; k += 1) variance += (k - mean) ** 2 * (pmf[k] as number)
  return { mean, sd: Math.sqrt(variance) }
}

/**
 * Wraps chances of 0, 1, 2, … units as a forecast.
 * Domain: chances of 0 or more that add up to 1 within 1e-9 → otherwise RangeError.
 * Accuracy: `atLeast` sums from the far end, `quantile` from the near one; mean and sd come from the chances
 * unless given.
 * Cost: O(length) once, then O(1) for `atLeast` and O(log length) for `quantile`.
 * @example forecastOf(new Float64Array([0.25, 0.5, 0.25])).atLeast(1)  // → 0.75
 */
export function forecastOf(pmf: Float64Array, known?: { mean: number; sd: number }): UnitsForecast {
  const below = new Float64Array(pmf.length)
  const above = new Float64Array(pmf.length)
  let sum = 0
  for (let k = 0; k < pmf.length; k += 1) {
    const chance = pmf[k] as number
    if (!(chance >= 0)) throw new RangeError(`pmf must hold chances of 0 or more, got ${chance} at ${k}`)
    sum += chance
    below[k] = sum
  }
  if (!(Math.abs(sum - 1) <= 1e-9)) throw new RangeError(`pmf must add up to 1, got ${sum}`)
  let rest = 0
  for (let k = pmf.length - 1; k >= 0; k -= 1) {
    rest += pmf[k] as number
    above[k] = Math.min(1, rest)
  }
  const { mean, sd } = known ?? momentsOf(pmf)
  const quantile = (p: number) => {
    insideUnit('p', p)
    let low = 0
    let high = pmf.length - 1
    while (low < high) {
      const middle = (low + high) >> 1
      if (reaches(below[middle] as number, p)) high = middle
      else low = middle + 1
    }
    return low
  }
  const atLeast = (n: number) => {
    if (Number.isNaN(n)) throw new RangeError(`n must be a number, got ${n}`)
    if (n <= 0) return 1
    // Chances of 0 at the start (units already committed) must not cost 1e-16 of certainty.
    const first = Math.ceil(n)
    if (first >= pmf.length) return 0
    return (below[first - 1] as number) === 0 ? 1 : (above[first] as number)
  }
  return { pmf, mean, sd, quantile, atLeast }
}
