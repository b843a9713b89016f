import { insideUnit, wholeFrom } from '../stats/argument'
import { betaQuantile } from '../stats/beta'
import { normalQuantile } from '../stats/normal'

/** A range that holds the true share with the asked confidence. */
export type Interval = { readonly low: number; readonly high: number }

function check(passed: number, n: number, confidence: number): void {
  wholeFrom(1, 'n', n)
  if (wholeFrom(0, 'passed', passed) > n)
    throw new RangeError(`passed must be at most n = ${n}, got ${passed}`)
  insideUnit('confidence', confidence)
}

/**
 * The share that passes, from `passed` of `n`, as Wilson's score interval: on average as sure as it says.
 * Units: shares from 0 to 1.
 * Domain: whole n ≥ 1, whole 0 ≤ passed ≤ n, 0 < confidence < 1 → otherwise RangeError.
 * Accuracy: relative error < 1e-12.
 * Source: E. Wilson, *JASA* 22 (1927) 209; Newcombe, *Stat. Med.* 17 (1998) 857, method 3.
 * @example wilson(0, 30, 0.95).high  // → ≈ 0.1135133932
 */
export function wilson(passed: number, n: number, confidence: number): Interval {
  check(passed, n, confidence)
  const z = -normalQuantile((1 - confidence) / 2)
  const p = passed / n
  const centre = (p + (z * z) / (2 * n)) / (1 + (z * z) / n)
  const half = (z / (1 + (z * z) / n)) * Math.sqrt((p * (1 - p)) / n + (z * z) / (4 * n * n))
  return {
    low: passed === 0 ? 0 : Math.max(0, centre - half),
    high: passed === n ? 1 : Math.min(1, centre + half),
  }
}

/**
 * The same as Clopper and Pearson's exact interval: never less sure than it says, and wider.
 * Units, Domain: as `wilson`.
 * Accuracy: ends within 1e-12.
 * Source: Clopper & Pearson, *Biometrika* 26 (1934) 404; Newcombe (1998), method 5.
 * @example clopperPearson(4, 20, 0.95).low  // → ≈ 0.0573339971
 */
export function clopperPearson(passed: number, n: number, confidence: number): Interval {
  check(passed, n, confidence)
  const tail = (1 - confidence) / 2
  return {
    low: passed === 0 ? 0 : betaQuantile(tail, passed, n - passed + 1),
    // From the failures' side, so that a confidence near 1 is not lost in 1 − tail.
    high: passed === n ? 1 : 1 - betaQuantile(tail, n - passed, passed + 1),
  }
}
