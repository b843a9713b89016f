import { positive, share, wholeFrom } from '../stats/argument'
import { chancesFromRatio } from '../stats/count-series'
import { gammaPoissonPmf } from '../stats/poisson'
import type { Conversion } from './group'
import { forecastOf, type UnitsForecast } from './units-forecast'

export { type Arrivals, arrivals } from './arrivals'

/** What invited people who have not answered are still worth. */
export type StillToCome = Conversion & {
  /** The chance that one of them still converts. */
  readonly chance: number
  /** How many of them are expected to. */
  readonly expected: number
  /** How many people still convert, as a whole distribution (people, not units). */
  readonly people: UnitsForecast
}

/** A shape parameter may not be 0; this one converts nobody. */
const NOBODY = 1e-12

/** The least k whose successor is not likelier. */
function peak(n: number, ratio: (k: number) => number): number {
  let k = 0
  while (k < n && ratio(k) > 1) k += 1
  return k
}

/**
 * What invited people who have not answered are still worth. Each would convert with p ~ Beta(alpha, beta), shared, and
 * of those who do a share `arrivedShare` would have by now; so silence speaks against p, and more so the later it is.
 * With k of the silent still to come the evidence is C(n, k)(1 − arrivedShare)^k B(alpha + k, beta + n − k): the
 * beta-binomial, tilted. The result's `alpha` and `beta` (the Beta with the same mean and second moment) go into a
 * `Group` with the quantities of the silent; `people` is exact.
 * Units: people; shares from 0 to 1.
 * Domain: alpha, beta > 0, updated by those who did answer (`updateConversion`); 0 ≤ arrivedShare ≤ 1; whole
 * silent ≥ 0 → otherwise RangeError. At arrivedShare 1 nothing is left: expected 0 and alpha 1e-12.
 * Accuracy: `chance`, `expected`, `people` within 1e-13; with arrivedShare 0 the beta-binomial itself.
 * Source: own, from Bayes' rule; the same split of "never" and "not yet" as in cure models (Boag 1949, from memory).
 * Cost: O(silent).
 * @example stillToCome({ alpha: 1, beta: 1, arrivedShare: 0.5, silent: 1 }).chance  // → ≈ 0.3333333333333333
 */
export function stillToCome(
  ask: Conversion & { readonly arrivedShare: number; readonly silent: number },
): StillToCome {
  const { alpha, beta, arrivedShare, silent: n } = ask
  positive('alpha', alpha)
  positive('beta', beta)
  const left = 1 - share('arrivedShare', arrivedShare)
  wholeFrom(0, 'silent', n)
  const ratio = (k: number) => (k >= n ? 0 : left * ((n - k) / (k + 1)) * ((alpha + k) / (beta + n - k - 1)))
  // With nobody silent the chance is that of one person yet to be asked about.
  const chances = chancesFromRatio(ratio, peak(n, ratio), 0)
  const pmf = new Float64Array(n + 1)
  pmf.set(chances)
  const people = forecastOf(pmf)
  const expected = people.mean
  const chance = n > 0 ? expected / n : (left * alpha) / (left * alpha + beta)
  let pairs = 0
  for (let k = 2; k <= n; k += 1) pairs += k * (k - 1) * (pmf[k] as number)
  const square = pairs / (n * (n - 1))
  const weight =
    n >= 2 && square > chance * chance ? (chance - square) / (square - chance * chance) : alpha + beta + n
  return {
    chance,
    expected,
    people,
    alpha: Math.max(NOBODY, chance * weight),
    beta: Math.max(NOBODY, (1 - chance) * weight),
  }
}

/** How often people come who were on no list: a bare rate per day, or what was seen in how many days. */
export type NewcomerRate = number | { readonly seen: number; readonly days: number }

/** A bare rate counts as known to half its size: a Gamma of this shape. Our own value; common practice, no source. */
const SHAPE_OF_A_GUESS = 4

/**
 * How many people who are on no list will come in the days left: a Poisson count whose rate is itself uncertain,
 * Gamma(seen + ½, days seen), so that few days watched spread it. A bare number is a guess, Gamma of shape 4 around it.
 * Units: people; days; rate per day.
 * Domain: rate ≥ 0, or whole seen ≥ 0 over days > 0; 0 ≤ days ≤ 100,000 times those watched → otherwise RangeError.
 * Accuracy: each chance within 1e-13, total 1 within 1e-13; the mean is rate × days.
 * Source: Gelman et al., *Bayesian Data Analysis* (3rd ed., 2013), section 2.6; ½ is Jeffreys's prior.
 * @example newcomers({ rate: 0.5, days: 10 }).mean  // → 5
 */
export function newcomers({
  rate,
  days,
}: {
  readonly rate: NewcomerRate
  readonly days: number
}): UnitsForecast {
  if (!(days >= 0) || !Number.isFinite(days)) throw new RangeError(`days must be 0 or more, got ${days}`)
  const guess = typeof rate === 'number'
  if (guess && (!(rate >= 0) || !Number.isFinite(rate)))
    throw new RangeError(`rate must be 0 or more, got ${rate}`)
  if (guess && rate === 0) return forecastOf(new Float64Array([1]), { mean: 0, sd: 0 })
  const shape = guess ? SHAPE_OF_A_GUESS : wholeFrom(0, 'rate.seen', rate.seen) + 0.5
  const watched = guess ? SHAPE_OF_A_GUESS / rate : positive('rate.days', rate.days)
  const mean = (shape * days) / watched
  const sd = Math.sqrt(mean * (1 + days / watched))
  return forecastOf(gammaPoissonPmf(shape, watched, days), { mean, sd })
}
