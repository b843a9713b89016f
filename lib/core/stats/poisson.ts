import { insideUnit, notNegative, positive, wholeFrom } from './argument'
import { chancesFromRatio } from './count-series'
import { reaches } from './tie'

/**
 * The Poisson chances of 0, 1, 2, … events, cut where they fall below 1e-22 of the largest.
 * Domain: mean ≥ 0, at most 1e7 → otherwise RangeError.
 * Accuracy: absolute error < 1e-14, total 1 within 1e-14, against @stdlib.
 * Cost: O(mean + √mean).
 * @example poissonPmf(0)  // → new Float64Array([1])
 */
export function poissonPmf(mean: number): Float64Array {
  if (notNegative('mean', mean) > 1e7) throw new RangeError(`mean must be at most 1e7, got ${mean}`)
  if (mean === 0) return new Float64Array([1])
  return chancesFromRatio((k) => mean / (k + 1), Math.floor(mean))
}

/**
 * The smallest count that a Poisson variable stays at or below with at least the given chance.
 * Domain: mean ≥ 0, 0 < chance < 1 → otherwise RangeError.
 * Accuracy: exact but for ties closer than 1e-12, which count as reached.
 * @example poissonQuantile(10, 0.99)  // → 18
 */
export function poissonQuantile(mean: number, chance: number): number {
  insideUnit('chance', chance)
  const pmf = poissonPmf(mean)
  let sum = 0
  for (let k = 0; k < pmf.length; k += 1) {
    sum += pmf[k] ?? 0
    if (reaches(sum, chance)) return k
  }
  return pmf.length
}

/**
 * The chances of 0, 1, 2, … events when the rate itself is uncertain: a Poisson count over `exposure` whose rate
 * is Gamma(shape, rate), that is a negative binomial.
 * Units: `rate` and `exposure` in the same unit (days).
 * Domain: shape, rate > 0, 0 ≤ exposure ≤ 100,000·rate, expected count ≤ 1e6 → otherwise RangeError.
 * Accuracy: absolute error < 1e-13, total 1 within 1e-13, against @stdlib.
 * Source: Gelman et al., *Bayesian Data Analysis* (3rd ed., 2013), section 2.6.
 * @example gammaPoissonPmf(1, 1, 1)[2]  // → ≈ 0.125
 */
export function gammaPoissonPmf(shape: number, rate: number, exposure: number): Float64Array {
  positive('shape', shape)
  positive('rate', rate)
  if (notNegative('exposure', exposure) === 0) return new Float64Array([1])
  const q = exposure / (rate + exposure)
  if (exposure / rate > 1e5 || (shape * exposure) / rate > 1e6) {
    throw new RangeError(
      `exposure must expect at most 1e6 events and be at most 1e5 times the rate, got ${exposure}`,
    )
  }
  const mode = Math.max(0, Math.floor(((shape - 1) * q) / (1 - q)))
  return chancesFromRatio((k) => (q * (shape + k)) / (k + 1), mode)
}

/**
 * The chance of at most `count` events of a Poisson variable.
 * Domain: whole count ≥ 0 → otherwise RangeError.
 * @example poissonCdf(0, 1)  // → ≈ 0.36787944117144233
 */
export function poissonCdf(count: number, mean: number): number {
  wholeFrom(0, 'count', count)
  const pmf = poissonPmf(mean)
  let sum = 0
  for (let k = 0; k <= count && k < pmf.length; k += 1) sum += pmf[k] ?? 0
  return Math.min(1, sum)
}
