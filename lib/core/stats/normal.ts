import { finite, insideUnit } from './argument'
import { LN_SQRT_2_PI } from './log-gamma'

/**
 * The standard normal density.
 * Domain: finite z → otherwise RangeError.
 * @example normalDensity(0)  // → ≈ 0.3989422804014327
 */
export function normalDensity(z: number): number {
  return Math.exp(-(finite('z', z) ** 2) / 2 - LN_SQRT_2_PI)
}

/** Φ(z) − ½ by its power series, z²ᵏ⁺¹ / (1·3·5…(2k+1)), times the density. */
function aboveMiddle(z: number): number {
  let term = z
  let sum = z
  for (let odd = 3; ; odd += 2) {
    term *= (z * z) / odd
    const next = sum + term
    if (next === sum) return sum * normalDensity(z)
    sum = next
  }
}

/** The upper tail for z > 2.5, by Laplace's continued fraction from the inside out. */
function tail(z: number): number {
  let below = z
  for (let k = 160; k >= 1; k -= 1) below = z + k / below
  return normalDensity(z) / below
}

/**
 * The chance that a standard normal variable is at most z.
 * Domain: finite z → otherwise RangeError.
 * Accuracy: relative error < 1e-13 in the lower tail down to z = −37, against @stdlib and mpmath 1.3.
 * Source: Abramowitz & Stegun (1964) 26.2.11 (series) and 26.2.14 (continued fraction).
 * @example normalCdf(1.959963984540054)  // → ≈ 0.975
 */
export function normalCdf(z: number): number {
  if (finite('z', z) < -2.5) return tail(-z)
  if (z > 2.5) return 1 - tail(z)
  return 0.5 + aboveMiddle(z)
}

/**
 * The value a standard normal variable stays below with the given chance.
 * Domain: 0 < chance < 1 → otherwise RangeError.
 * Accuracy: absolute error < 1e-13 (relative to the chance in the lower tail), against @stdlib.
 * Source: first guess Abramowitz & Stegun (1964) 26.2.23, then Halley's steps on `normalCdf`.
 * @example normalQuantile(0.975)  // → ≈ 1.959963984540054
 */
export function normalQuantile(chance: number): number {
  insideUnit('chance', chance)
  if (chance === 0.5) return 0
  if (chance > 0.5) return -normalQuantile(1 - chance)
  const t = Math.sqrt(-2 * Math.log(chance))
  const top = 2.515517 + t * (0.802853 + t * 0.010328)
  const bottom = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308))
  let z = top / bottom - t
  for (let turn = 0; turn < 4; turn += 1) {
    const miss = (normalCdf(z) - chance) / normalDensity(z)
    z -= miss / (1 + (z * miss) / 2)
  }
  return z
}
