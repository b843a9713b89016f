import { finite } from '../stats/argument'

/**
 * Passes three estimates in order: 0 ≤ optimistic ≤ likely ≤ pessimistic.
 * Domain: otherwise RangeError naming the estimate and its value.
 * @example assertEstimates(1, 2, 4)  // → undefined
 */
export function assertEstimates(optimistic: number, likely: number, pessimistic: number): void {
  if (finite('optimistic', optimistic) < 0)
    throw new RangeError(`optimistic must be 0 or more, got ${optimistic}`)
  if (finite('likely', likely) < optimistic)
    throw new RangeError(`likely must be at least optimistic, got ${likely}`)
  if (finite('pessimistic', pessimistic) < likely) {
    throw new RangeError(`pessimistic must be at least likely, got ${pessimistic}`)
  }
}

/**
 * The expected length of a step from three estimates: (o + 4m + p) / 6.
 * Units: days in, days out.
 * Domain: 0 ≤ o ≤ m ≤ p → otherwise RangeError.
 * Source: Malcolm, Roseboom, Clark, Fazar, *Operations Research* 7 (1959) 646.
 * @example pertMean(5, 8, 17)  // → 9
 */
export function pertMean(optimistic: number, likely: number, pessimistic: number): number {
  assertEstimates(optimistic, likely, pessimistic)
  return (optimistic + 4 * likely + pessimistic) / 6
}

/**
 * The variance of a step's length from its two outer estimates: ((p − o) / 6)².
 * Units: days in, days squared out.
 * Domain: as `pertMean`.
 * Source: as `pertMean`.
 * @example pertVariance(5, 8, 17)  // → 4
 */
export function pertVariance(optimistic: number, likely: number, pessimistic: number): number {
  assertEstimates(optimistic, likely, pessimistic)
  return ((pessimistic - optimistic) / 6) ** 2
}

/**
 * The Beta on [optimistic, pessimistic] with the mean and variance of `pertMean` and `pertVariance`.
 * Domain: as `pertMean`, and optimistic < pessimistic → otherwise RangeError.
 * Source: moments of the Beta; own choice among the distributions with those moments.
 * @example pertShape(0, 3, 6)  // → { alpha: 4, beta: 4 }
 */
export function pertShape(
  optimistic: number,
  likely: number,
  pessimistic: number,
): { alpha: number; beta: number } {
  assertEstimates(optimistic, likely, pessimistic)
  const range = pessimistic - optimistic
  if (range === 0) throw new RangeError(`pessimistic must be above optimistic, got ${pessimistic}`)
  const mean = (1 + (4 * (likely - optimistic)) / range) / 6
  const weight = 36 * mean * (1 - mean) - 1
  return { alpha: mean * weight, beta: (1 - mean) * weight }
}
