import { wholeFrom } from '@/lib/core/stats/argument'

/**
 * How many pieces to have at hand so that losses at the placing do not stop the run: the need, and on top a share of it
 * or a fixed number (the leader of a reel), whichever is more.
 * Units:    whole pieces; share in basis points.
 * Domain:   all whole ≥ 0 → otherwise RangeError. A need of 0 still gets `atLeast`: who needs nothing does not ask.
 * Rounding: the share up to a whole piece, in whole numbers (7 % of 100 is 7, not 8).
 * @example  withAttrition(100, { basisPoints: 700, atLeast: 5 })  // → 107
 * @example  withAttrition(10, { basisPoints: 700, atLeast: 5 })  // → 15
 */
export function withAttrition(
  needed: number,
  { basisPoints, atLeast }: { readonly basisPoints: number; readonly atLeast: number },
): number {
  wholeFrom(0, 'withAttrition: needed', needed)
  wholeFrom(0, 'withAttrition: basisPoints', basisPoints)
  wholeFrom(0, 'withAttrition: atLeast', atLeast)
  const product = wholeFrom(0, 'withAttrition: needed × basisPoints', needed * basisPoints)
  const rest = product % 10_000
  return needed + Math.max(atLeast, (product - rest) / 10_000 + (rest > 0 ? 1 : 0))
}
