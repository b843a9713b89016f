import { minor, type Minor } from '@/lib/core/brand'
import type { Curve } from '@/lib/core/costs/curve'
import { betaBinomialPmf } from '@/lib/core/demand/beta-binomial'
import type { UnitsForecast } from '@/lib/core/demand/forecast'
import { insideUnit, wholeFrom } from '@/lib/core/stats/argument'
import { reaches } from '@/lib/core/stats/tie'

/** What a run may come to, the go and the call-off together. */
export type RunOutcome = {
  /** Minor units, not rounded. */
  readonly expectedProfit: number
  /** The chance that units under deposit reach the minimum. */
  readonly chanceToGo: number
  /** The chance of a profit below 0; a call-off that costs something is a loss. */
  readonly chanceOfLoss: number
  /** The smallest profit x with P(profit ≤ x) ≥ p, for 0 < p < 1 (otherwise RangeError). */
  readonly profitQuantile: (p: number) => Minor
}

type Outcome = { readonly profit: number; readonly chance: number }

/**
 * Profit as a distribution. Units under deposit follow the forecast; below the minimum the run is called off, otherwise it
 * goes with them, at most the maximum. Deposits are not payments: of n units under deposit a beta-binomial number is
 * paid in the end, and the run earns what the curve says for those.
 * Units:    units; curve and callOffCost in minor units; callOffCost(units under deposit) ≥ 0 is the loss of a call-off.
 * Domain:   whole 1 ≤ minimum ≤ maximum, alpha and beta > 0, a curve up to the most units that can be paid, whole
 *           callOffCost ≥ 0 → otherwise RangeError. If nobody pays after a go, the run ends as a call-off of its units.
 * Note:     people beyond the maximum have no place and count neither as deposits nor as payments.
 * Accuracy: exact over the forecast's distribution (chances below 1e-16 are left out); ties of a quantile within 1e-12.
 * Cost:     units² at worst; 300 units in about a millisecond.
 * @example  runOutcome({ forecast: forecastUnits([], { committed: 1 }), curve: [{ revenue: 0, cost: 0, profit: 0, unitCost: 0 }], minimum: 2, maximum: 3, paying: { alpha: 1, beta: 1 }, callOffCost: () => minor(70) }).expectedProfit  // → -70
 */
export function runOutcome({
  forecast,
  curve,
  minimum,
  maximum,
  paying,
  callOffCost,
}: {
  readonly forecast: Pick<UnitsForecast, 'pmf' | 'atLeast'>
  readonly curve: Curve
  readonly minimum: number
  readonly maximum: number
  readonly paying: { readonly alpha: number; readonly beta: number }
  readonly callOffCost: (units: number) => number
}): RunOutcome {
  wholeFrom(1, 'runOutcome: minimum', minimum)
  wholeFrom(minimum, 'runOutcome: maximum', maximum)
  const { calledOff, underDeposit } = decide(forecast.pmf, minimum, maximum)
  const lossOf = (units: number) => 0 - wholeFrom(0, 'runOutcome: callOffCost', callOffCost(units))
  const outcomes: Outcome[] = calledOff.map(({ units, chance }) => ({ profit: lossOf(units), chance }))
  const paidChance = new Float64Array((underDeposit.at(-1)?.units ?? 0) + 1)
  if (curve.length < paidChance.length - 1) {
    throw new RangeError(`runOutcome: curve must reach ${paidChance.length - 1} units, got ${curve.length}`)
  }
  for (const { units, chance } of underDeposit) {
    const paid = betaBinomialPmf(units, paying.alpha, paying.beta)
    outcomes.push({ profit: lossOf(units), chance: chance * paid[0]! })
    for (let k = 1; k <= units; k++) paidChance[k]! += chance * paid[k]!
  }
  curve
    .slice(0, paidChance.length - 1)
    .forEach(({ profit }, i) => outcomes.push({ profit, chance: paidChance[i + 1]! }))
  return describe(outcomes, forecast.atLeast(minimum))
}

type Chance = { readonly units: number; readonly chance: number }

/** Units under deposit at the decision: those of a call-off, and those the run goes with, in rising order. */
function decide(pmf: Float64Array, minimum: number, maximum: number) {
  const calledOff: Chance[] = []
  const underDeposit: Chance[] = []
  let beyond = 0
  pmf.forEach((chance, units) => {
    if (chance < 1e-16) return
    if (units < minimum) calledOff.push({ units, chance })
    else if (units < maximum) underDeposit.push({ units, chance })
    else beyond += chance
  })
  if (beyond > 0) underDeposit.push({ units: maximum, chance: beyond })
  return { calledOff, underDeposit }
}

function describe(outcomes: readonly Outcome[], chanceToGo: number): RunOutcome {
  const rising = [...outcomes].sort((a, b) => a.profit - b.profit)
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0)
  return {
    expectedProfit: sum(rising.map(({ profit, chance }) => profit * chance)),
    chanceToGo,
    chanceOfLoss: Math.min(1, sum(rising.map(({ profit, chance }) => (profit < 0 ? chance : 0)))),
    profitQuantile: (p) => {
      insideUnit('p', p)
      let below = 0
      const found = rising.find(({ chance }) => reaches((below += chance), p))
      return minor(found?.profit ?? rising.at(-1)!.profit)
    },
  }
}
