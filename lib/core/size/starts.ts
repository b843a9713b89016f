import { betaBinomialTail } from '../demand/beta-binomial'
import { insideUnit, positive, wholeFrom } from '../stats/argument'
import { binomialAtLeast } from '../stats/binomial'
import { reaches } from '../stats/tie'

/** The most starts a question may lead to; beyond, the yield makes no run. */
const MOST_STARTS = 1_000_000

/** The least s ≥ need with chanceOf(s) ≥ confidence, for a chance that never falls in s. */
function leastStarts(need: number, confidence: number, chanceOf: (starts: number) => number): number {
  let low = need - 1
  let step = 1
  let high = need
  while (!reaches(chanceOf(high), confidence)) {
    if (high >= MOST_STARTS) {
      throw new RangeError(
        `need must be reachable with ${MOST_STARTS} starts, got ${need} at confidence ${confidence}`,
      )
    }
    low = high
    high = Math.min(MOST_STARTS, high + step)
    step *= 2
  }
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2)
    if (reaches(chanceOf(middle), confidence)) high = middle
    else low = middle
  }
  return high
}

/**
 * How many assembled boards to start so that enough come out good: the smallest s with
 * P(Binomial(s, yield) ≥ need) ≥ confidence. `yield` is the final yield, good at once or after rework. For assembled
 * boards only: a bare kit is not tested here. Rounding need / yield up gives a chance of 60 to 80 %, not 95 %.
 * Units: boards; yield and confidence as shares.
 * Domain: whole need ≥ 0, 0 < yield ≤ 1, 0 < confidence < 1, answer ≤ 1,000,000 → otherwise RangeError.
 * Accuracy: exact; a chance within 1e-12 below the confidence counts as reaching it.
 * Source: binomial distribution; checked against R's qnbinom.
 * @example startsForYield({ need: 100, yield: 0.95, confidence: 0.95 })  // → 109
 */
export function startsForYield(ask: {
  readonly need: number
  readonly yield: number
  readonly confidence: number
}): number {
  const { need, yield: good, confidence } = ask
  wholeFrom(0, 'need', need)
  insideUnit('confidence', confidence)
  if (!(good > 0 && good <= 1)) throw new RangeError(`yield must be above 0 and at most 1, got ${good}`)
  if (need === 0) return 0
  return leastStarts(need, confidence, (starts) => binomialAtLeast(need, starts, good))
}

/**
 * The same where the yield is known only from boards tested so far: yield ~ Beta(prior + passed, prior + failed), so
 * the good ones among s starts are beta-binomial. Few tests ask for more starts than their average says.
 * Units: boards; confidence as a share.
 * Domain: whole need, passed, failed ≥ 0; prior alpha, beta > 0; 0 < confidence < 1; answer ≤ 1,000,000 →
 * otherwise RangeError.
 * Accuracy: exact; a chance within 1e-12 below the confidence counts as reaching it.
 * Source: Gelman et al., *Bayesian Data Analysis* (3rd ed., 2013), section 2.4 (posterior prediction).
 * Cost: O(answer · log answer).
 * @example startsForUncertainYield({ need: 1, passed: 0, failed: 0, prior: { alpha: 1, beta: 1 }, confidence: 0.75 })  // → 3
 */
export function startsForUncertainYield(ask: {
  readonly need: number
  readonly passed: number
  readonly failed: number
  readonly prior: { readonly alpha: number; readonly beta: number }
  readonly confidence: number
}): number {
  const { need, passed, failed, prior, confidence } = ask
  wholeFrom(0, 'need', need)
  insideUnit('confidence', confidence)
  const alpha = positive('prior.alpha', prior.alpha) + wholeFrom(0, 'passed', passed)
  const beta = positive('prior.beta', prior.beta) + wholeFrom(0, 'failed', failed)
  if (need === 0) return 0
  return leastStarts(need, confidence, (starts) => betaBinomialTail(starts, alpha, beta, need))
}
