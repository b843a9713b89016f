import 'server-only'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { newcomers } from '@/lib/core/demand/clock'
import { divide } from '@/lib/core/money/allocate'
import { stockQuantity } from '@/lib/core/size/newsvendor'
import { sparesFor } from '@/lib/core/size/spares'
import type { RunFacts } from './run-facts'
import { startsOf } from './starts-of'

/** How sure to be that the spares last. Our own value; common practice, no source. */
const SPARES_SURE = 0.95

type Quantities = Readonly<Record<string, number>>

/** What to build for a run of these quantities: boards to put into work, spares, and units more for stock. */
export function buildOf(facts: RunFacts, plan: CostPlan, quantities: Quantities): CostFigures['build'] {
  const total = Object.values(quantities).reduce((sum, units) => sum + units, 0)
  const need = plan.offers
    .filter(({ isAssembled }) => isAssembled)
    .reduce((sum, { offer }) => sum + (quantities[offer] ?? 0), 0)
  const failureBasisPoints = plan.outlook?.failureBasisPoints ?? 0
  return {
    need,
    starts: startsOf(plan, quantities, facts.built),
    yieldBasisPoints: plan.yield.basisPoints,
    confidenceBasisPoints: plan.yield.confidenceBasisPoints,
    spares: sparesFor({ shipped: total, failureRate: failureBasisPoints / 10_000, confidence: SPARES_SURE }),
    failureBasisPoints,
    extra: extraOf(plan, quantities, total),
  }
}

/**
 * Units beyond the orders: one too many costs what it takes to make, one too few the profit on it. What one more costs is
 * taken over the next tenth of the run, so that a single price step does not decide.
 */
function extraOf(plan: CostPlan, quantities: Quantities, total: number): CostFigures['build']['extra'] {
  const laterUnits = plan.outlook?.laterUnits ?? 0
  const more = Math.max(5, Math.ceil(total / 10))
  const split = divide(total + more, Object.values(quantities))
  if (laterUnits === 0 || !split.ok) return null
  const larger = Object.fromEntries(Object.keys(quantities).map((offer, i) => [offer, split.value[i]!]))
  const [now, then] = [costRun(plan, quantities), costRun(plan, larger)]
  const leftOver = Math.max(1, Math.round((then.cost - now.cost) / more))
  const missed = Math.round((then.revenue - now.revenue) / more) - leftOver
  const later = newcomers({ rate: laterUnits, days: 1 })
  const quantity =
    missed <= 0 ? 0 : stockQuantity(later.pmf, { underage: missed, overage: leftOver }).quantity
  return { quantity, laterUnits, missed, leftOver }
}
