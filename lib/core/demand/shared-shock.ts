import type { Rule } from '../stats/gauss-beta'
import { normalDensity } from '../stats/normal'

/** One value of the shock all classes feel, and its weight. */
export type Shock = { readonly z: number; readonly weight: number }

/** Beyond 8.5 standard deviations lies less than 2e-17 of a normal variable. */
const REACH = 8.5

/**
 * The values of a standard normal shock at an even step, weighted to add up to 1: the trapezoid rule, which for a
 * normal density times something smooth on the scale of the step is right to the last digits.
 * Source: N. Trefethen, J. Weideman, *The Exponentially Convergent Trapezoidal Rule*, SIAM Review 56 (2014) 385.
 * @example shocksAt(8.5).length  // → 3
 */
export function shocksAt(step: number): Shock[] {
  const side = Math.ceil(REACH / step)
  const raw = Array.from({ length: 2 * side + 1 }, (_, k) => (k - side) * step)
  const total = raw.reduce((sum, z) => sum + normalDensity(z), 0)
  return raw.map((z) => ({ z, weight: normalDensity(z) / total }))
}

function shifted(logOdds: number): number {
  return 1 / (1 + Math.exp(-logOdds))
}

/** The log-odds whose mean conversion over all shocks is p; Newton's steps from p itself, inside a bracket. */
function centreFor(p: number, spread: number, shocks: readonly Shock[]): number {
  const start = Math.log(p / (1 - p))
  let low = start - spread * spread - 1
  let high = start + spread * spread + 1
  let centre = start
  for (let turn = 0; turn < 60; turn += 1) {
    let mean = 0
    let slope = 0
    for (const { z, weight } of shocks) {
      const q = shifted(centre + spread * z)
      mean += weight * q
      slope += weight * q * (1 - q)
    }
    if (mean > p) high = centre
    else low = centre
    const newton = centre - (mean - p) / slope
    const next = newton > low && newton < high ? newton : (low + high) / 2
    if (Math.abs(next - centre) < 1e-15 * Math.max(1, Math.abs(centre))) return next
    centre = next
  }
  return centre
}

/**
 * A rule's conversions as they would be under each shock: log-odds moved by `spread`·z around a centre chosen so that
 * the mean over all shocks is the conversion itself. Expected units therefore stay, and only their spread grows.
 * Domain: spread > 0.
 * @example shockedRules({ points: new Float64Array([0]), weights: new Float64Array([1]) }, 1, shocksAt(8.5)).length  // → 3
 */
export function shockedRules(rule: Rule, spread: number, shocks: readonly Shock[]): Rule[] {
  const centres = rule.points.map((p) =>
    p > 0 && p < 1 ? centreFor(p, spread, shocks) : p === 0 ? -Infinity : Infinity,
  )
  return shocks.map(({ z }) => ({
    points: centres.map((c) => shifted(c + spread * z)),
    weights: rule.weights,
  }))
}
