import { positive, wholeFrom } from '../stats/argument'
import { chancesFromRatio } from '../stats/count-series'

/** The most likely count, or an end from which the chances fall away without underflow. */
function start(n: number, alpha: number, beta: number): number {
  if (alpha < 1) return 0
  if (beta < 1) return n
  if (alpha + beta === 2) return 0
  return Math.min(n, Math.floor(((n + 1) * (alpha - 1)) / (alpha + beta - 2)))
}

/**
 * The chances that 0, 1, …, n of n people buy, when all share one unknown conversion p ~ Beta(alpha, beta).
 * Units: people; the result holds n + 1 chances.
 * Domain: whole n ≥ 0, alpha, beta > 0 → otherwise RangeError.
 * Accuracy: relative error < 1e-15·n, total 1 within 1e-13, against exact fractions and R 4.2.2.
 * Source: J. Skellam, *J. Royal Stat. Soc. B* 10 (1948) 257; neighbours by their ratio
 * (n−k)(α+k) / ((k+1)(β+n−k−1)).
 * Cost: O(n).
 * @example betaBinomialPmf(10, 2, 3)[3]  // → ≈ 0.14385614385614385
 */
export function betaBinomialPmf(n: number, alpha: number, beta: number): Float64Array {
  wholeFrom(0, 'n', n)
  positive('alpha', alpha)
  positive('beta', beta)
  const pmf = new Float64Array(n + 1)
  pmf.set(
    chancesFromRatio(
      (k) => (k >= n ? 0 : ((n - k) / (k + 1)) * ((alpha + k) / (beta + n - k - 1))),
      start(n, alpha, beta),
      0,
    ),
  )
  return pmf
}

/**
 * The chance that at least `atLeast` of n people buy, all sharing one unknown conversion p ~ Beta(alpha, beta).
 * Domain: as `betaBinomialPmf`; whole `atLeast` ≥ 0 (above n the chance is 0) → otherwise RangeError.
 * Accuracy: as `betaBinomialPmf`; summed from the smallest term, so small tails keep their digits.
 * Cost: O(n).
 * @example betaBinomialTail(10, 2, 3, 5)  // → ≈ 0.4055944055944056
 */
export function betaBinomialTail(n: number, alpha: number, beta: number, atLeast: number): number {
  wholeFrom(0, 'atLeast', atLeast)
  const pmf = betaBinomialPmf(n, alpha, beta)
  if (atLeast === 0) return 1
  let sum = 0
  for (let k = n; k >= atLeast; k -= 1) sum += pmf[k] ?? 0
  return Math.min(1, sum)
}
