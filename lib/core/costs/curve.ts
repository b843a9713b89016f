import { minor, type Minor } from '@/lib/core/brand'
import type { CostPlan } from '@/lib/core/costs/plan'
import { inPlanOrder, runSeries } from '@/lib/core/costs/run-series'
import { divide } from '@/lib/core/money/allocate'
import { roundHalfUp } from '@/lib/core/money/round'
import { wholeFrom } from '@/lib/core/stats/argument'

/** The money of a run of one size, in the selling currency's minor units; `unitCost` is cost ÷ units, rounded half-up. */
export type CurvePoint = {
  readonly revenue: number
  readonly cost: number
  readonly profit: number
  readonly unitCost: number
}

/** curve[n − 1] is the run of n units. */
export type Curve = readonly CurvePoint[]

/**
 * What a run costs and brings at every quantity, for the mix of offers as it is.
 * Units:    mix: relative whole weights by offer (units under deposit, or the forecast); minor units out.
 * Domain:   an offer of the plan for every weight, a weight above 0 among them, upTo whole ≥ 0 → otherwise RangeError.
 * Rounding: n units fall on the offers by `divide`, so that no offer shrinks as the run grows; else as `costRun`.
 * Accuracy: point n equals `costRun` of that split, to the minor unit.
 * Cost:     linear in upTo × parts; 300 parts × 1,000 quantities in some 50 ms.
 * @example  costCurve(emptyPlan('EUR'), { kit: 1 }, 0)  // → []
 */
export function costCurve(
  plan: CostPlan,
  mix: Readonly<Record<string, number>>,
  upTo: number,
): CurvePointMinor[] {
  wholeFrom(0, 'costCurve: upTo', upTo)
  if (upTo === 0) return []
  const weights = inPlanOrder(plan, 'costCurve: mix', mix)
  const runs = Array.from({ length: upTo }, (_, i) => {
    const split = divide(i + 1, weights)
    if (!split.ok)
      throw new RangeError(`costCurve: mix must have a weight above 0, got ${JSON.stringify(mix)}`)
    return split.value
  })
  return runSeries(plan, runs).map(({ revenue, cost }, i) => ({
    revenue: minor(revenue),
    cost: minor(cost),
    profit: minor(revenue - cost),
    unitCost: minor(roundHalfUp(cost, i + 1)),
  }))
}

type CurvePointMinor = { readonly [K in keyof CurvePoint]: Minor }
