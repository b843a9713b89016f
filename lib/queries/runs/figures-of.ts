import 'server-only'
import type { ProfitCurve } from '@/lib/contracts/run-page'
import type { RunFigures, RunWeighed } from '@/lib/contracts/runs'
import { breakEven } from '@/lib/core/costs/break-even'
import { callOffCost } from '@/lib/core/costs/call-off'
import { costCurve } from '@/lib/core/costs/curve'
import { runOutcome } from '@/lib/core/costs/outcome'
import { mixOf, planOfRun } from './costs-of'
import { conversionOf, forecastOfRun } from './forecast-of'
import type { RunFacts } from './run-facts'
import { startsOf } from './starts-of'
import { unitsOf } from './units-of'
import { weighMoney } from './weigh-money'

/** The 80 % range leaves a tenth out on either side. */
export const TAIL = 0.1

type Figures = { figures: RunFigures; weighed: RunWeighed; curve: ProfitCurve | null }

/**
 * The owner's figures of a run, computed from its facts alone: the same facts give the same figures, so that those frozen
 * with a decision can be computed again. Money figures are null without a cost plan that knows the run's offers.
 */
export function figuresOf(facts: RunFacts): Figures {
  const { run } = facts
  const units = unitsOf(facts)
  const { forecast, fromListed, fromNewcomers } = forecastOfRun(facts, units.deposited)
  const paying = conversionOf(facts, 'depositHolder')
  const figures: RunFigures = {
    deposited: units.deposited,
    held: units.held,
    waiting: units.waiting,
    forecast: {
      mean: forecast.mean,
      low: forecast.quantile(TAIL),
      high: forecast.quantile(1 - TAIL),
      chance: forecast.atLeast(run.minimum),
    },
    breakEven: null,
    expectedProfitMinor: null,
    chanceOfLoss: null,
    starts: null,
  }
  const weighed: RunWeighed = {
    likelyToPay: (units.deposited * paying.alpha) / (paying.alpha + paying.beta),
    worstInTenMinor: null,
    tenthFails: null,
    cashLow: null,
    fromListed,
    fromNewcomers,
    silent: facts.signUps.notOrdered.filter(({ invitedAt }) => invitedAt !== null).length,
  }
  const plan = planOfRun(facts)
  if (!plan) return { figures, weighed, curve: null }
  const { mix, mixOf: mixFrom } = mixOf(facts, units)
  const curve = costCurve(plan, mix, run.maximum)
  const even = breakEven(curve)
  // A decided run goes with what it has: its minimum is behind it.
  const isDecided = run.state === 'locked' || run.state === 'closed'
  const outcome = runOutcome({
    forecast,
    curve,
    minimum: isDecided ? 1 : run.minimum,
    maximum: run.maximum,
    paying,
    callOffCost: callOffCost(plan, mix),
  })
  return {
    figures: {
      ...figures,
      breakEven: even.safeFrom,
      expectedProfitMinor: Math.round(outcome.expectedProfit),
      chanceOfLoss: outcome.chanceOfLoss,
      starts: startsOf(plan, units.toBuildByOffer, facts.built),
    },
    weighed: {
      ...weighed,
      worstInTenMinor: outcome.profitQuantile(TAIL),
      ...weighMoney(facts, { plan, mix, curve, deposited: units.deposited }),
    },
    curve: { profits: curve.map(({ profit }) => profit), breakEven: even, mixOf: mixFrom },
  }
}
