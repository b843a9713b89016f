import { positive } from './argument'

/**
 * ln √(2π).
 * @example LN_SQRT_2_PI  // → ≈ 0.91893853320467274
 */
export const LN_SQRT_2_PI = 0.91893853320467274178

/** B(2k) / (2k(2k−1)): the Stirling series for ln Γ; from x = 15 eight terms leave less than 1e-17. */
const STIRLING = [
  1 / 12,
  -1 / 360,
  1 / 1260,
  -1 / 1680,
  1 / 1188,
  -691 / 360360,
  1 / 156,
  -3617 / 122400,
] as const

/** From here on the series is used as it is; below, the argument is first moved up. */
const SERIES_FROM = 15

function series(x: number): number {
  const square = 1 / (x * x)
  let sum = 0
  for (let k = STIRLING.length - 1; k >= 0; k -= 1) sum = sum * square + (STIRLING[k] ?? 0)
  return sum / x
}

/**
 * The natural logarithm of the gamma function.
 * Domain: x > 0, finite → otherwise RangeError.
 * Accuracy: error < 1e-14 · max(1, |value|), against @stdlib gammaln on (1e-6, 1e8).
 * Source: Stirling's series, Abramowitz & Stegun (1964) 6.1.41, after moving x above 15 by 6.1.15.
 * @example logGamma(5)  // → ≈ 3.1780538303479458
 */
export function logGamma(x: number): number {
  positive('x', x)
  let shift = 1
  let z = x
  while (z < SERIES_FROM) {
    shift *= z
    z += 1
  }
  return (z - 0.5) * Math.log(z) - z + LN_SQRT_2_PI + series(z) - Math.log(shift)
}

/**
 * What Stirling's formula misses: ln Γ(x+1) − (x+½) ln x + x − ln √(2π).
 * Used where two large log-gammas would cancel.
 * Domain: x > 0 → otherwise RangeError.
 * Accuracy: absolute error < 1e-14.
 * Source: C. Loader, *Fast and Accurate Computation of Binomial Probabilities* (2000).
 * @example stirlingError(1)  // → ≈ 0.0810614667953
 */
export function stirlingError(x: number): number {
  positive('x', x)
  if (x >= SERIES_FROM) return series(x)
  return logGamma(x + 1) - (x + 0.5) * Math.log(x) + x - LN_SQRT_2_PI
}

/**
 * The deviance x ln(x/m) + m − x, without the cancellation near x = m.
 * Domain: x > 0, m > 0.
 * Accuracy: relative error < 1e-14.
 * Source: Loader (2000), his function D0.
 * @example devianceTerm(3, 3)  // → 0
 */
export function devianceTerm(x: number, m: number): number {
  const d = x - m
  if (Math.abs(d) >= 0.1 * (x + m)) return x * Math.log(x / m) + m - x
  const v = d / (x + m)
  let sum = d * v
  let odd = 2 * x * v
  for (let k = 3; ; k += 2) {
    odd *= v * v
    const next = sum + odd / k
    if (next === sum) return sum
    sum = next
  }
}
