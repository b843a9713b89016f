import type { Curve } from '@/lib/core/costs/curve'

/** Where a run stops losing money, and where a price step makes it lose again. Quantities are units. */
export type BreakEven = {
  /** The least quantity with a profit of 0 or more; null when there is none on the curve. */
  readonly firstProfit: number | null
  /** The least quantity from which every one to the end of the curve is without loss; null when the last one loses. */
  readonly safeFrom: number | null
  /** Stretches of loss beyond the first profit, both ends included. */
  readonly lossGaps: readonly (readonly [from: number, to: number])[]
}

/**
 * From how many units on a run does not lose money, and the quantities above that at which it does again: an array, a
 * reel or a set-up that bites at one unit more can eat the margin of many.
 * Domain:   curve[n − 1] is the run of n units, n = 1, 2, …; a profit of 0 counts as not losing. An empty curve has none.
 * Note:     lossGaps lie above `firstProfit`; a gap that reaches the end of the curve is listed and `safeFrom` is null.
 * Cost:     one pass.
 * @example  breakEven([-5, 1, -2, 0].map((profit) => ({ revenue: 0, cost: -profit, profit, unitCost: 0 })))  // → { firstProfit: 2, safeFrom: 4, lossGaps: [[3, 3]] }
 */
export function breakEven(curve: Curve): BreakEven {
  const lossGaps: [number, number][] = []
  let firstProfit: number | null = null
  let safeFrom: number | null = null
  curve.forEach(({ profit }, i) => {
    const units = i + 1
    if (!Number.isFinite(profit))
      throw new RangeError(`breakEven: curve[${i}].profit must be finite, got ${profit}`)
    if (profit >= 0) {
      firstProfit ??= units
      safeFrom ??= units
      return
    }
    safeFrom = null
    const gap = lossGaps.at(-1)
    if (gap?.[1] === i) gap[1] = units
    else if (firstProfit !== null) lossGaps.push([units, units])
  })
  return { firstProfit, safeFrom, lossGaps }
}
