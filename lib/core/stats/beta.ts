import { insideUnit, positive, share } from './argument'
import { devianceTerm, LN_SQRT_2_PI, stirlingError } from './log-gamma'

/** x^a (1−x)^b / B(a, b) for 0 < x < 1, by Loader's saddle-point form: no large logarithms cancel. */
function powerOverBeta(x: number, complement: number, a: number, b: number): number {
  const n = a + b
  const exponent =
    stirlingError(n) -
    stirlingError(a) -
    stirlingError(b) -
    devianceTerm(a, n * x) -
    devianceTerm(b, n * complement)
  return Math.exp(exponent - LN_SQRT_2_PI) * Math.sqrt(a) * Math.sqrt(b / n)
}

/** The continued fraction of the incomplete beta, by Lentz's method; quick for x below (a+1)/(a+b+2). */
function fraction(x: number, a: number, b: number): number {
  const tiny = 1e-300
  let c = 1
  let d = 1 - ((a + b) * x) / (a + 1)
  d = 1 / (Math.abs(d) < tiny ? tiny : d)
  let h = d
  for (let m = 1; m < 1_000_000; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m))
    d = 1 / (1 + even * d || tiny)
    c = 1 + even / c || tiny
    h *= d * c
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1))
    d = 1 / (1 + odd * d || tiny)
    c = 1 + odd / c || tiny
    const step = d * c
    h *= step
    if (Math.abs(step - 1) < 1e-16) break
  }
  return h
}

/** I_x(a, b) with the complement of x given apart, so that neither tail is lost near 1. */
function incomplete(x: number, complement: number, a: number, b: number): number {
  if (x <= 0) return 0
  if (complement <= 0) return 1
  const front = powerOverBeta(x, complement, a, b)
  if (x < (a + 1) / (a + b + 2)) return (front * fraction(x, a, b)) / a
  return 1 - (front * fraction(complement, b, a)) / b
}

/**
 * The chance that a Beta(a, b) variable is at most x: the regularized incomplete beta function I_x(a, b).
 * The upper tail is `regularizedBeta(1 − x, b, a)`.
 * Domain: 0 ≤ x ≤ 1, a > 0, b > 0 → otherwise RangeError.
 * Accuracy: absolute error < 1e-13 for a, b up to 1e6, against @stdlib betainc and mpmath 1.3.
 * Source: continued fraction, NIST Digital Library of Mathematical Functions 8.17.22, by Lentz's method.
 * Cost: O(√max(a, b)).
 * @example regularizedBeta(0.5, 2, 3)  // → ≈ 0.6875
 */
export function regularizedBeta(x: number, a: number, b: number): number {
  share('x', x)
  positive('a', a)
  positive('b', b)
  return incomplete(x, 1 - x, a, b)
}

/**
 * The value a Beta(a, b) variable stays below with the given chance: the inverse of `regularizedBeta`.
 * Domain: 0 < chance < 1, a > 0, b > 0 → otherwise RangeError.
 * Accuracy: the returned x has a chance within 1e-12 of the asked one, or is the nearest double to it; quantiles below 1e-300
 * are not told apart.
 * Source: Newton's step inside a shrinking bracket.
 * Cost: some ten evaluations of `regularizedBeta`.
 * @example betaQuantile(0.6875, 2, 3)  // → ≈ 0.5
 */
export function betaQuantile(chance: number, a: number, b: number): number {
  insideUnit('chance', chance)
  positive('a', a)
  positive('b', b)
  let low = 0
  let high = 1
  let x = a / (a + b)
  for (let turn = 0; turn < 1100; turn += 1) {
    const miss = incomplete(x, 1 - x, a, b) - chance
    if (miss === 0) return x
    if (miss < 0) low = x
    else high = x
    const density = powerOverBeta(x, 1 - x, a, b) / (x * (1 - x))
    const newton = x - miss / density
    // For tiny quantiles halving the exponent's range beats halving the interval.
    const middle = low > 0 || high > 1e-3 ? (low + high) / 2 : high * 1e-3
    const next = newton > low && newton < high ? newton : middle
    if (next === x || high - low <= Number.EPSILON * low || high < 1e-300) return next
    if (Math.abs(next - x) <= 2 * Number.EPSILON * x) return next
    x = next
  }
  return x
}
