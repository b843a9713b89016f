import { minor, type Minor } from '@/lib/core/brand'
import type { RunCost } from '@/lib/core/costs/run-cost'
import type { LineKind } from '@/lib/core/costs/run-line'
import { allocate } from '@/lib/core/money/allocate'
import { roundHalfUp } from '@/lib/core/money/round'
import { wholeFrom } from '@/lib/core/stats/argument'

/** What one unit brings and costs, on average over the run. Each sum is the sum of those it is made of, to the last minor unit. */
export type UnitBreakdown = {
  /** What its buyer pays, postage and tax included. */
  readonly paid: Minor
  /** The sales tax in it: `paid` − `revenue`. */
  readonly tax: Minor
  readonly revenue: Minor
  /** What it costs, by kind of cost, in the order of the run's lines; kinds that cost nothing are left out. */
  readonly costs: readonly { readonly kind: LineKind; readonly amount: Minor }[]
  readonly cost: Minor
  readonly profit: Minor
}

/**
 * One unit of a run, taken apart: what its buyer pays, the tax in it, every kind of cost, what is left.
 * Units:    minor units; units = all units of the run.
 * Domain:   whole units ≥ 1, lines that add up to the cost → otherwise RangeError.
 * Rounding: payment, revenue and cost per unit half-up; the kinds share the cost by largest remainder, so that they add up
 *           to it; tax and profit are differences.
 * @example  unitBreakdown({ ...costRun({ ...emptyPlan('EUR'), oneOff: [{ name: 'tooling', amount: 5000, currency: 'EUR' }] }, {}) }, 3).cost  // → 1667
 */
export function unitBreakdown(run: RunCost, units: number): UnitBreakdown {
  wholeFrom(1, 'unitBreakdown: units', units)
  const sums = new Map<LineKind, number>()
  for (const { kind, amount } of run.lines) sums.set(kind, (sums.get(kind) ?? 0) + amount)
  const each = (sum: number) => minor(roundHalfUp(sum, units))
  const [paid, revenue, cost] = [each(run.paid), each(run.revenue), each(run.cost)]
  const shares = allocate(cost, [...sums.values()])
  return {
    paid,
    tax: minor(paid - revenue),
    revenue,
    costs: [...sums.keys()].map((kind, i) => ({ kind, amount: shares.ok ? shares.value[i]! : minor(0) })),
    cost,
    profit: minor(revenue - cost),
  }
}
