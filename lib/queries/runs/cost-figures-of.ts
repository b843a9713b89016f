import 'server-only'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import type { OfferKind } from '@/lib/contracts/fields'
import { callOffCost } from '@/lib/core/costs/call-off'
import { cashLow } from '@/lib/core/costs/cash'
import { movers } from '@/lib/core/costs/movers'
import { runCash } from '@/lib/core/costs/run-cash'
import { costRun } from '@/lib/core/costs/run-cost'
import { unitBreakdown } from '@/lib/core/costs/unit-breakdown'
import { divide } from '@/lib/core/money/allocate'
import { daysBetween } from '@/lib/core/time/day'
import { buildOf } from './build-of'
import { mixOf, planOfRun } from './costs-of'
import { figuresOf } from './figures-of'
import { runDaysOf } from './run-days-of'
import type { RunFacts } from './run-facts'
import { unitsOf } from './units-of'

const MOST_MOVERS = 5

type Asked = { units?: number | undefined; locale: string }

/**
 * A run's sheet of costs from its facts alone; null without a plan that knows every offer of the run. Everything but the
 * curve stands at `units`, by default what is under deposit, at least the minimum.
 */
export function costFiguresOf(facts: RunFacts, asked: Asked): CostFigures | null {
  const plan = planOfRun(facts)
  const { figures, curve } = figuresOf(facts)
  if (!plan || !curve) return null
  const { run, today } = facts
  const counted = unitsOf(facts)
  const { mix, mixOf: mixFrom } = mixOf(facts, counted)
  const units = asked.units ?? Math.max(run.minimum, counted.deposited)
  const split = divide(units, Object.values(mix))
  const parts = split.ok ? split.value : []
  const quantities = Object.fromEntries(Object.keys(mix).map((offer, i) => [offer, parts[i] ?? 0]))
  const cost = costRun(plan, quantities)
  const days = runDaysOf(facts)
  const cash = cashLow(runCash(plan, quantities, days))
  const callOff = callOffCost(plan, mix)
  const isOpen = run.state === 'draft' || run.state === 'taking_deposits'
  return {
    currency: plan.currency,
    locale: asked.locale,
    units,
    byOffer: Object.entries(quantities).map(([offer, count]) => ({
      offer: offer as OfferKind,
      units: count,
    })),
    minimum: run.minimum,
    maximum: run.maximum,
    deposited: figures.deposited,
    forecast: isOpen ? figures.forecast : null,
    mixOf: mixFrom,
    profits: curve.profits,
    breakEven: curve.breakEven,
    expectedProfit: figures.expectedProfitMinor ?? 0,
    chanceOfLoss: figures.chanceOfLoss ?? 0,
    perUnit: breakdown(cost, units),
    lines: [...cost.lines],
    totals: { revenue: cost.revenue, cost: cost.cost, profit: cost.profit },
    unpriced: [...cost.unpriced],
    movers: movers(plan, quantities)
      .slice(0, MOST_MOVERS)
      .map(({ key, name, less, more }) => ({ key, name, less, more })),
    cash: {
      series: [...cash.series],
      low: cash.low,
      lowOn: cash.day,
      canLayOut: plan.outlook?.canLayOut ?? null,
      boughtOn: days.boughtOn,
      balancesOn: days.balancesOn,
      postedOn: days.postedOn,
    },
    callOff: { atDeposited: callOff(figures.deposited), atMinimum: callOff(run.minimum) },
    build: buildOf(facts, plan, quantities),
    rates: plan.rates.map(({ currency, rate, on, marginBasisPoints }) => ({
      ...{ currency, rate, on, marginBasisPoints },
      ageDays: Math.max(0, daysBetween(on, today)),
    })),
  }
}

function breakdown(cost: ReturnType<typeof costRun>, units: number): CostFigures['perUnit'] {
  const one = unitBreakdown(cost, units)
  return { ...one, costs: [...one.costs] }
}
