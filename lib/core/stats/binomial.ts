import { share, wholeFrom } from './argument'
import { regularizedBeta } from './beta'

/**
 * The chance of at least `count` successes in `n` independent tries.
 * Domain: whole n ≥ 0, whole count ≥ 0, 0 ≤ p ≤ 1 → otherwise RangeError.
 * Accuracy: absolute error < 1e-13 for n up to 1e6, against @stdlib and exact sums.
 * Source: NIST Digital Library of Mathematical Functions 8.17.5: the tail is I_p(count, n − count + 1).
 * @example binomialAtLeast(2, 2, 0.5)  // → ≈ 0.25
 */
export function binomialAtLeast(count: number, n: number, p: number): number {
  wholeFrom(0, 'count', count)
  wholeFrom(0, 'n', n)
  share('p', p)
  if (count === 0) return 1
  if (count > n) return 0
  return regularizedBeta(p, count, n - count + 1)
}

/**
 * The chance of at most `count` successes in `n` independent tries.
 * Domain: as `binomialAtLeast`.
 * Accuracy: as `binomialAtLeast`.
 * @example binomialAtMost(1, 2, 0.5)  // → ≈ 0.75
 */
export function binomialAtMost(count: number, n: number, p: number): number {
  wholeFrom(0, 'count', count)
  wholeFrom(0, 'n', n)
  share('p', p)
  return count >= n ? 1 : regularizedBeta(1 - p, n - count, count + 1)
}
