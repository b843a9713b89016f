import { finite, positive } from '../stats/argument'
import { normalDensity, normalQuantile } from '../stats/normal'
import { reaches } from '../stats/tie'

/** What a unit too few and a unit too many cost, in minor units (fractions allowed: they are estimates). */
type Mismatch = {
  /** Profit missed on a unit wanted and not there. */
  readonly underage: number
  /** Loss on a unit built and not wanted. */
  readonly overage: number
}

/** How much to build beyond the orders. */
export type Stock = {
  readonly quantity: number
  /** underage / (underage + overage): the chance of not running out that is worth paying for. */
  readonly criticalRatio: number
  /** The expected cost of being wrong, in the unit of `underage` and `overage`. */
  readonly expectedCost: number
}

function ratioOf({ underage, overage }: Mismatch): number {
  return positive('underage', underage) / (underage + positive('overage', overage))
}

/**
 * How many units to build beyond the orders when unsold and missed ones both cost: the smallest Q with
 * F(Q) ≥ underage / (underage + overage), where `pmf` is the demand *beyond* orders.
 * Units: units; costs per unit.
 * Domain: underage, overage > 0; `pmf` holds the chances of 0, 1, 2, … adding up to 1 within 1e-6 →
 * otherwise RangeError.
 * Accuracy: exact for the chances given; a tie within 1e-12 counts as reached. Not rounded.
 * Source: Snyder & Shen, *Fundamentals of Supply Chain Theory* (2nd ed., 2019), section 4.3.
 * Cost: O(length).
 * @example stockQuantity([0.25, 0.25, 0.25, 0.25], { underage: 3, overage: 1 }).quantity  // → 2
 */
export function stockQuantity(pmf: ArrayLike<number>, mismatch: Mismatch): Stock {
  const criticalRatio = ratioOf(mismatch)
  let total = 0
  for (let k = 0; k < pmf.length; k += 1) {
    const chance = pmf[k] as number
    if (!(chance >= 0)) throw new RangeError(`pmf must hold chances of 0 or more, got ${chance} at ${k}`)
    total += chance
  }
  if (!(Math.abs(total - 1) <= 1e-6)) throw new RangeError(`pmf must add up to 1, got ${total}`)
  let quantity = 0
  for (let sum = pmf[0] as number; quantity < pmf.length - 1 && !reaches(sum, criticalRatio);) {
    quantity += 1
    sum += pmf[quantity] as number
  }
  let expectedCost = 0
  for (let k = 0; k < pmf.length; k += 1) {
    const cost = k > quantity ? (k - quantity) * mismatch.underage : (quantity - k) * mismatch.overage
    expectedCost += (pmf[k] as number) * cost
  }
  return { quantity, criticalRatio, expectedCost }
}

/**
 * The same for a normal demand, real-valued: for reference and comparison, since units come whole.
 * Domain: finite mean, sd > 0, underage, overage > 0 → otherwise RangeError.
 * Accuracy: relative error < 1e-12.
 * Source: Snyder & Shen (2nd ed., 2019), equations 4.24 and 4.30: Q = μ + zσ, cost = (underage + overage) φ(z) σ.
 * @example stockQuantityNormal({ mean: 50, sd: 8, underage: 0.7, overage: 0.18 }).quantity  // → ≈ 56.60395593
 */
export function stockQuantityNormal(ask: Mismatch & { readonly mean: number; readonly sd: number }): Stock {
  const criticalRatio = ratioOf(ask)
  finite('mean', ask.mean)
  positive('sd', ask.sd)
  const z = normalQuantile(criticalRatio)
  const expectedCost = (ask.underage + ask.overage) * normalDensity(z) * ask.sd
  return { quantity: ask.mean + z * ask.sd, criticalRatio, expectedCost }
}
