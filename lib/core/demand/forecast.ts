import { wholeFrom } from '../stats/argument'
import { type Circle, fourier, unitCircle } from '../stats/fourier'
import { gaussBeta, type Rule } from '../stats/gauss-beta'
import { type Group, MOST_UNITS, quantityCounts, unitsAsked } from './group'
import { shockedRules, shocksAt } from './shared-shock'
import { type ClassSpectrum, classSpectrum, productOf, type Spectrum } from './spectrum'
import { forecastOf, type UnitsForecast } from './units-forecast'

export type { Group } from './group'
export type { UnitsForecast } from './units-forecast'

/** What else a forecast may take into account. */
export type ForecastOptions = {
  /** Units that are certain and come on top (orders under deposit). */
  readonly committed?: number
  /** Standard deviation, in log-odds, of a shock that all classes share; 0 to 2. */
  readonly spread?: number
}

/** How many values of p integrate a polynomial of degree `members` over any Beta to rounding. */
function sizeFor(members: number): number {
  return Math.min(Math.ceil((members + 1) / 2), Math.ceil(4 * Math.sqrt(members)) + 12)
}

/** Mean and variance of one class without shocks, in closed form. */
function momentsOf({ alpha, beta, quantities }: Group): { mean: number; variance: number; sway: number } {
  const units = quantities.reduce((sum, quantity) => sum + quantity, 0)
  const squares = quantities.reduce((sum, quantity) => sum + quantity * quantity, 0)
  const mean = alpha / (alpha + beta)
  const shared = 1 / (alpha + beta + 1)
  const single = mean * (1 - mean)
  const variance = single * (squares + (units * units - squares) * shared)
  return { mean: mean * units, variance, sway: units * single * (1 - shared) }
}

function classOf({ quantities }: Group, rule: Rule, circle: Circle): ClassSpectrum {
  return classSpectrum(quantityCounts(quantities), rule, circle)
}

/** The mean over the shared shock of the product of the classes' characteristic functions. */
function shockedSpectrum(
  groups: readonly Group[],
  rules: readonly Rule[],
  spread: number,
  circle: Circle,
): Spectrum {
  const moments = groups.map(momentsOf)
  const sd = Math.sqrt(moments.reduce((sum, each) => sum + each.variance, 0))
  const sway = spread * moments.reduce((sum, each) => sum + each.sway, 0)
  // The step follows the narrowest thing to be integrated: the normal density times the forecast given the shock.
  const shocks = shocksAt(0.6 / Math.sqrt(1 + (sway / sd) ** 2))
  const moved = rules.map((rule) => shockedRules(rule, spread, shocks))
  const half = circle.size / 2 + 1
  const sum = { re: new Float64Array(half), im: new Float64Array(half) }
  shocks.forEach(({ weight }, at) => {
    const given = groups.map((group, g) => classOf(group, moved[g]?.[at] as Rule, circle))
    const one = productOf(given, weight, circle)
    for (let j = 0; j < half; j += 1) {
      sum.re[j] = (sum.re[j] as number) + (one.re[j] as number)
      sum.im[j] = (sum.im[j] as number) + (one.im[j] as number)
    }
  })
  return sum
}

/** The chances behind a characteristic function; what lies below the rounding of the transform becomes 0. */
function chancesOf({ re, im }: Spectrum, circle: Circle, units: number, committed: number): Float64Array {
  const { size } = circle
  const fullRe = new Float64Array(size)
  const fullIm = new Float64Array(size)
  fullRe.set(re)
  fullIm.set(im)
  for (let j = 1; j < size / 2; j += 1) {
    fullRe[size - j] = re[j] as number
    fullIm[size - j] = -(im[j] as number)
  }
  fourier(circle, fullRe, fullIm)
  let power = 0
  for (let k = 0; k <= units; k += 1) power += ((fullRe[k] as number) / size) ** 2
  const noise = 1e-15 * Math.sqrt(power)
  const pmf = new Float64Array(committed + units + 1)
  let total = 0
  for (let k = 0; k <= units; k += 1) {
    const chance = (fullRe[k] as number) / size
    if (chance < noise) continue
    pmf[committed + k] = chance
    total += chance
  }
  for (let k = committed; k < pmf.length; k += 1) pmf[k] = (pmf[k] as number) / total
  return pmf
}

/**
 * How many units the people of some classes will buy, as a whole distribution and not only its middle.
 * Each class has one unknown conversion p ~ Beta(alpha, beta) that its members share; given p they decide alone, each
 * for the whole quantity asked. Classes are independent but for `spread`, a shock in the log-odds that moves them all
 * together (a bad month, a rival, a good review): at 0.3 a conversion of 40 % lies between 33 and 47 % two times in
 * three. It leaves the expected units as they are and only widens. `committed` units are certain and come on top:
 * pmf[k], quantiles and `atLeast` all count them.
 *
 * Units: units of the module; chances from 0 to 1.
 * Domain: alpha, beta > 0; whole quantities ≥ 1; whole committed ≥ 0; 0 ≤ spread ≤ 2; at most 1,000,000 units
 * together → otherwise RangeError. No classes, or empty ones, are allowed.
 * Accuracy: each chance within 1e-13 (absolute), total 1 within 1e-12 up to 50,000 units; chances below the rounding
 * of the transform (1e-15 of the root of Σ pmf²) are 0. Equal quantities agree with `betaBinomialPmf` within 1e-12,
 * mixed ones with enumeration in exact fractions. With a spread, within 1e-9.
 * Source: own: Gauss–Jacobi quadrature over p (size growing with √members, since a Bernstein polynomial of degree n is
 * one of degree ~ √n to rounding), characteristic functions multiplied per frequency, one Fourier transform.
 * Cost: O(units · √members) at worst; 5,000 members of 1–10 in some 60 ms. A spread multiplies that by 30 or more.
 * @example forecastUnits([{ alpha: 2, beta: 3, quantities: [1, 1, 1, 1, 1, 1, 1, 1, 1, 1] }]).atLeast(5)  // → ≈ 0.4055944055944056
 * @example forecastUnits([{ alpha: 3, beta: 1, quantities: [2] }], { committed: 5 }).mean  // → 6.5
 */
export function forecastUnits(groups: readonly Group[], options: ForecastOptions = {}): UnitsForecast {
  const { committed = 0, spread = 0 } = options
  wholeFrom(0, 'committed', committed)
  if (!(spread >= 0 && spread <= 2)) throw new RangeError(`spread must be from 0 to 2, got ${spread}`)
  const units = groups.reduce((sum, group) => sum + unitsAsked(group), 0)
  if (units + committed > MOST_UNITS) {
    throw new RangeError(`groups must ask for at most ${MOST_UNITS} units, got ${units + committed}`)
  }
  const asking = groups.filter((group) => group.quantities.length > 0)
  if (asking.length === 0) {
    const certain = new Float64Array(committed + 1)
    certain[committed] = 1
    return forecastOf(certain, { mean: committed, sd: 0 })
  }
  const circle = unitCircle(2 ** Math.max(1, Math.ceil(Math.log2(units + 1))))
  const stretch = spread > 0 ? (members: number) => Math.ceil(1.5 * (4.5 * Math.sqrt(members))) + 40 : sizeFor
  const rules = asking.map(({ alpha, beta, quantities }) =>
    gaussBeta(alpha, beta, stretch(quantities.length)),
  )
  const spectrum =
    spread > 0
      ? shockedSpectrum(asking, rules, spread, circle)
      : productOf(
          asking.map((group, g) => classOf(group, rules[g] as Rule, circle)),
          1,
          circle,
        )
  const pmf = chancesOf(spectrum, circle, units, committed)
  const moments = asking.map(momentsOf)
  const mean = committed + moments.reduce((sum, each) => sum + each.mean, 0)
  if (spread === 0) {
    return forecastOf(pmf, { mean, sd: Math.sqrt(moments.reduce((sum, each) => sum + each.variance, 0)) })
  }
  let variance = 0
  for (let k = 0; k < pmf.length; k += 1) variance += (k - mean) ** 2 * (pmf[k] as number)
  return forecastOf(pmf, { mean, sd: Math.sqrt(variance) })
}
