import { share, wholeFrom } from '../stats/argument'
import { binomialAtMost } from '../stats/binomial'

/**
 * The chance that a lot passes its sampling plan: at most `accept` defectives in the sample.
 * Units: pieces; fractionDefective as a share.
 * Domain: whole sample ≥ 1, whole 0 ≤ accept, 0 ≤ fractionDefective ≤ 1 → otherwise RangeError.
 * Accuracy: absolute error < 1e-13 for the binomial; right for a stream of lots or a lot many times the sample.
 * Source: MIL-STD-105E (1989), operating characteristic curves, table X; NIST e-Handbook 6.2.3.2.
 * @example acceptanceProbability({ sample: 13, accept: 0 }, 0.1)  // → ≈ 0.2541865828
 */
export function acceptanceProbability(
  plan: { readonly sample: number; readonly accept: number },
  fractionDefective: number,
): number {
  wholeFrom(1, 'sample', plan.sample)
  wholeFrom(0, 'accept', plan.accept)
  share('fractionDefective', fractionDefective)
  return binomialAtMost(plan.accept, plan.sample, fractionDefective)
}
