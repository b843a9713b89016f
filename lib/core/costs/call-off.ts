import { minor, type Minor } from '@/lib/core/brand'
import { exchange } from '@/lib/core/costs/exchange'
import type { CostPlan } from '@/lib/core/costs/plan'
import { repaymentFees } from '@/lib/core/costs/run-fees'
import { orderCount } from '@/lib/core/costs/run-revenue'
import { splitter } from '@/lib/core/costs/run-split'

/**
 * Prepares what calling a run off costs with so many units under deposit: everything bound before the lock, and the fees
 * of deposits taken and paid back.
 * Units:    mix as in `costCurve`; units whole ≥ 0; minor units of the selling currency, ≥ 0.
 * Domain:   as `costCurve`.
 * Note:     one-off costs of the plan are counted: they are spent by then. A sum whose currency has no rate is left out, as in
 *           `costRun`.
 * Rounding: half-up once per sum exchanged and per kind of fee.
 * @example  callOffCost({ ...emptyPlan('EUR'), atRisk: [{ name: 'reel', amount: 900, currency: 'EUR' }] }, {})(0)  // → 900
 */
export function callOffCost(plan: CostPlan, mix: Readonly<Record<string, number>>): (units: number) => Minor {
  const spent = [...plan.oneOff, ...plan.atRisk].reduce(
    (sum, { amount, currency }) => sum + (exchange(currency, plan.currency, plan.rates)?.(amount) ?? 0),
    0,
  )
  const split = splitter(plan.offers.map(({ offer }) => mix[offer] ?? 0))
  const feesOf = repaymentFees(plan)
  const ordersOf = orderCount(plan)
  return (units) => {
    const deposits = split(units).reduce((sum, count, i) => sum + count * plan.offers[i]!.deposit, 0)
    return minor(spent + feesOf(ordersOf(units), deposits))
  }
}
