import { minor, type Minor } from '@/lib/core/brand'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { LineKind, Unpriced } from '@/lib/core/costs/run-line'
import { inPlanOrder, runSeries } from '@/lib/core/costs/run-series'

/** What a run of one size costs and brings. Minor units of the selling currency. */
export type RunCost = {
  /** Costs; they add up to `cost`. Lines of 0 are left out. */
  readonly lines: readonly { readonly kind: LineKind; readonly name: string; readonly amount: Minor }[]
  /** Assembled units to put into work, of all offers. */
  readonly starts: number
  /** Orders, everything buyers pay for them (postage and tax included), and the part of it that comes as deposits. */
  readonly orders: number
  readonly paid: Minor
  readonly deposits: Minor
  /** `paid` less the sales tax in it. */
  readonly revenue: Minor
  readonly cost: Minor
  readonly profit: Minor
  /** Costs that are *not* in the sum because nothing is quoted or a rate is missing; show them with it. */
  readonly unpriced: readonly Unpriced[]
}

/**
 * What a run of so many units of each offer costs and brings: boards in arrays, front panels, parts by the cheapest
 * purchase with attrition and stock, assembly, freight, duty and import tax, paid work, packaging, postage, the fees of two
 * payments, of refunds and disputes, and the sales tax taken out of what buyers pay.
 * Units:    quantities: whole units by offer (an offer left out counts 0); minor units of the selling currency out.
 * Domain:   offers of the plan, numbers as CostPlan says → otherwise RangeError naming the field.
 * Rounding: half-up, once per line: purchases exactly in their own currency, then exchanged with the margin. The cost is
 *           the sum of the lines.
 * Note:     a purchase is charged to this run in full, leftovers included; stock used is free, it is paid for. Parts placed by
 *           assembler or maker are bought for every unit put into work, those of a buyer's bag for every unit sold.
 * @example  costRun({ ...emptyPlan('EUR'), oneOff: [{ name: 'tooling', amount: 5000, currency: 'EUR' }] }, {}).profit  // → -5000
 */
export function costRun(plan: CostPlan, quantities: Readonly<Record<string, number>>): RunCost {
  const lines: { kind: LineKind; name: string; amount: Minor }[] = []
  const unpriced: Unpriced[] = []
  const [sums] = runSeries(plan, [inPlanOrder(plan, 'costRun: quantities', quantities)], {
    line: (kind, name, amount) => lines.push({ kind, name, amount: minor(amount) }),
    bought: () => {},
    unpriced: (found) => unpriced.push(found),
  })
  const { starts, orders, paid, deposits, revenue, cost } = sums!
  return {
    ...{ lines, unpriced, starts, orders },
    paid: minor(paid),
    deposits: minor(deposits),
    revenue: minor(revenue),
    cost: minor(cost),
    profit: minor(revenue - cost),
  }
}
