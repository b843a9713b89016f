import { type Minor, minor } from '../brand'
import type { Curve } from '../costs/curve'
import { wholeFrom } from '../stats/argument'
import { forecastUnits } from './forecast'
import type { Conversion, Group } from './group'
import type { UnitsForecast } from './units-forecast'

/** Sign-ups of one class, each with the highest price at which it would still join (null: not asked). */
export type PricedGroup = Conversion & {
  readonly members: readonly { readonly quantity: number; readonly topPrice: number | null }[]
}

/** What would be wanted at one price. */
export type PriceDemand = {
  readonly price: Minor
  /** The classes as they stand at this price, for `forecastUnits`. */
  readonly groups: readonly Group[]
  /** Sign-ups that would still join. */
  readonly members: number
  readonly forecast: UnitsForecast
}

/** A rung of the price ladder and what to expect there. */
export type PricePoint = {
  readonly price: Minor
  /** The chance that units wanted reach the minimum. */
  readonly chanceToGo: number
  /** The mean of the forecast, not cut at the maximum. */
  readonly expectedUnits: number
  /** Over go and call-off together, in minor units; an expectation, so not rounded. */
  readonly expectedProfit: number
}

/**
 * The highest price that sign-ups speak for: the highest one stated, or the lowest rung where none was.
 * @example highestBacked([100, 200, 300], [{ alpha: 1, beta: 1, members: [{ quantity: 1, topPrice: 200 }] }])  // → 200
 */
export function highestBacked(ladder: readonly number[], groups: readonly PricedGroup[]): number {
  const stated = groups.flatMap(({ members }) => members.flatMap(({ topPrice }) => topPrice ?? []))
  return stated.length > 0 ? Math.max(...stated) : (ladder[0] ?? 0)
}

/**
 * What would be wanted at each price of the ladder: at a price p those join whose top price is p or more. Who was not
 * asked joins at every price that somebody stated or, where nobody was asked, at the lowest only: above the asked
 * prices sign-ups say nothing. Stated prices run high, as all answers without a purchase do; conversions carry that.
 * Units: minor units.
 * Domain: ladder of rising whole prices ≥ 1, at least one; whole topPrice ≥ 0 or null; classes as `forecastUnits` →
 * otherwise RangeError.
 * Source: the payment-card question of market research (Boyle & Bishop 1988, from memory).
 * Cost: one forecast per price.
 * @example demandByPrice([100, 200], [{ alpha: 1, beta: 1, members: [{ quantity: 2, topPrice: 100 }] }]).map((d) => d.forecast.mean)  // → [1, 0]
 */
export function demandByPrice(ladder: readonly number[], groups: readonly PricedGroup[]): PriceDemand[] {
  if (ladder.length === 0) throw new RangeError('ladder must hold at least one price, got none')
  ladder.forEach((price, i) => {
    wholeFrom(1, 'ladder', price)
    if (i > 0 && price <= (ladder[i - 1] as number))
      throw new RangeError(`ladder must rise, got ${price} at ${i}`)
  })
  for (const { members } of groups) {
    for (const { topPrice } of members) if (topPrice !== null) wholeFrom(0, 'topPrice', topPrice)
  }
  const backed = highestBacked(ladder, groups)
  return ladder.map((price) => {
    const staying = groups.map(({ alpha, beta, members }) => {
      const joins = members.filter(({ topPrice }) => (topPrice ?? backed) >= price)
      return { alpha, beta, quantities: joins.map(({ quantity }) => quantity) }
    })
    const members = staying.reduce((sum, { quantities }) => sum + quantities.length, 0)
    return { price: minor(price), groups: staying, members, forecast: forecastUnits(staying) }
  })
}

/** The profit of a run that goes with `units` wanted, cut at the maximum. */
function profitAt(curve: Curve, units: number, maximum: number): number {
  const point = curve[Math.min(units, maximum) - 1]
  if (!point)
    throw new RangeError(`curveAt must reach ${Math.min(units, maximum)} units, got ${curve.length}`)
  return point.profit
}

/**
 * The price with the highest expected profit, and what every price of the ladder promises: too low earns nothing, too
 * high and the run does not go. A run goes when units wanted reach the minimum; it earns curve[n−1].profit for
 * n = min(units, maximum); otherwise it costs `callOffCost`. Ties go to the lower price, and no price above those
 * asked for can be best.
 * Units: minor units; `curveAt(price)` as `costCurve` gives it; `callOffCost` a sum, or one by units to be repaid.
 * Domain: whole 1 ≤ minimum ≤ maximum; curves reaching min(maximum, units that can be wanted); ladder and groups as
 * `demandByPrice` → otherwise RangeError.
 * Rounding: none; prices whose profits differ by less than 1e-6 minor units tie.
 * Cost: one forecast and one curve per price.
 * @example bestPrice({ ladder: [100], groups: [], minimum: 1, maximum: 9, callOffCost: 50, curveAt: () => [] }).best  // → 100
 */
export function bestPrice(ask: {
  readonly ladder: readonly number[]
  readonly groups: readonly PricedGroup[]
  readonly minimum: number
  readonly maximum: number
  readonly callOffCost: number | ((units: number) => number)
  readonly curveAt: (price: Minor) => Curve
}): { readonly best: Minor; readonly frontier: readonly PricePoint[] } {
  const { ladder, groups, minimum, maximum, callOffCost, curveAt } = ask
  wholeFrom(1, 'minimum', minimum)
  wholeFrom(minimum, 'maximum', maximum)
  const costOf = typeof callOffCost === 'number' ? () => callOffCost : callOffCost
  const frontier = demandByPrice(ladder, groups).map(({ price, forecast }) => {
    const curve = curveAt(price)
    let expectedProfit = 0
    forecast.pmf.forEach((chance, units) => {
      if (chance > 0)
        expectedProfit += chance * (units >= minimum ? profitAt(curve, units, maximum) : -costOf(units))
    })
    return { price, chanceToGo: forecast.atLeast(minimum), expectedUnits: forecast.mean, expectedProfit }
  })
  const backed = Math.max(highestBacked(ladder, groups), ladder[0] as number)
  const best = frontier
    .filter(({ price }) => price <= backed)
    .reduce((top, next) => (next.expectedProfit > top.expectedProfit + 1e-6 ? next : top))
  return { best: best.price, frontier }
}
