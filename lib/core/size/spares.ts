import { insideUnit, share, wholeFrom } from '../stats/argument'
import { poissonQuantile } from '../stats/poisson'

/**
 * How many spares to keep for what fails after posting: the smallest s with P(Poisson(shipped · failureRate) ≤ s) ≥
 * confidence.
 * Units: units of the module; failureRate as the share expected to fail within the time the spares must last.
 * Domain: whole shipped ≥ 0, 0 ≤ failureRate ≤ 1, 0 < confidence < 1 → otherwise RangeError.
 * Accuracy: exact; a tie within 1e-12 counts as reached.
 * Source: Poisson approximation of rare failures; Devore, *Probability and Statistics*, section 3.6 (from memory).
 * @example sparesFor({ shipped: 500, failureRate: 0.02, confidence: 0.99 })  // → 18
 */
export function sparesFor(ask: {
  readonly shipped: number
  readonly failureRate: number
  readonly confidence: number
}): number {
  wholeFrom(0, 'shipped', ask.shipped)
  share('failureRate', ask.failureRate)
  insideUnit('confidence', ask.confidence)
  return poissonQuantile(ask.shipped * ask.failureRate, ask.confidence)
}
