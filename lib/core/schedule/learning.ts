import { positive, wholeFrom } from '../stats/argument'

function check(first: number, rate: number, n: number): number {
  positive('first', first)
  wholeFrom(1, 'n', n)
  if (!(rate > 0 && rate <= 1)) throw new RangeError(`rate must be above 0 and at most 1, got ${rate}`)
  return Math.log2(rate)
}

/**
 * The time of the n-th unit by Crawford's model: with each doubling the *unit* time falls to `rate`.
 * Units: any time in, the same out; rate as a share (0.85 = an 85 % curve).
 * Domain: first > 0, 0 < rate ≤ 1, whole n ≥ 1 → otherwise RangeError.
 * Source: J. Crawford (1944), after the `learningCurve` vignette.
 * @example crawfordUnitTime(100, 0.85, 2)  // → 85
 */
export function crawfordUnitTime(first: number, rate: number, n: number): number {
  return first * n ** check(first, rate, n)
}

/**
 * The time of units 1 to n together by Crawford's model.
 * Units, Domain, Source: as `crawfordUnitTime`.
 * Accuracy: summed term by term; relative error < 1e-13 up to a million units.
 * Cost: O(n).
 * @example crawfordTotal(100, 0.85, 2)  // → 185
 */
export function crawfordTotal(first: number, rate: number, n: number): number {
  const slope = check(first, rate, n)
  let total = 0
  for (let unit = n; unit >= 1; unit -= 1) total += first * unit ** slope
  return total
}

/**
 * The time of units 1 to n together by Wright's model: with each doubling the *average* time so far falls to `rate`.
 * Less than Crawford's total for the same figures, so say which is meant.
 * Units, Domain: as `crawfordUnitTime`.
 * Source: T. Wright, *J. Aeronautical Sciences* 3 (1936) 122.
 * @example wrightTotal(100, 0.85, 2)  // → 170
 */
export function wrightTotal(first: number, rate: number, n: number): number {
  return first * n ** (1 + check(first, rate, n))
}
