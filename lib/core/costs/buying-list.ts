import { minor, type Minor } from '@/lib/core/brand'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { Unpriced } from '@/lib/core/costs/run-line'
import { inPlanOrder, runSeries } from '@/lib/core/costs/run-series'

/** One proposed purchase: the cheapest order that covers what a run needs of one thing. */
export type Proposal = {
  readonly id: string
  readonly name: string
  readonly kind: 'part' | 'board' | 'front_panel'
  /** Pieces the run needs, and with attrition; stock is taken off before ordering. */
  readonly needed: number
  readonly wanted: number
  readonly supplier: string
  /** What to order, and what of it stays over: pieces of a part, arrays of boards. */
  readonly quantity: number
  readonly leftover: number
  /** Decimal string, minor units of `currency`. */
  readonly unitPrice: string
  readonly currency: string
  /** Set-up included: in `currency`, and in the selling currency. */
  readonly paid: Minor
  readonly amount: Minor
}

/**
 * What to buy for a run of so many units of each offer, in the order of the plan, boards and front panels first.
 * Units:    as `costRun`, whose part, board and front-panel lines these are.
 * Domain:   as `costRun`.
 * Note:     what stock covers is not listed; what nobody quotes stands in `unpriced`.
 * @example  buyingList(emptyPlan('EUR'), {})  // → { proposals: [], unpriced: [] }
 */
export function buyingList(
  plan: CostPlan,
  quantities: Readonly<Record<string, number>>,
): { readonly proposals: readonly Proposal[]; readonly unpriced: readonly Unpriced[] } {
  const proposals: Proposal[] = []
  const unpriced: Unpriced[] = []
  runSeries(plan, [inPlanOrder(plan, 'buyingList: quantities', quantities)], {
    line: () => {},
    unpriced: (found) => unpriced.push(found),
    bought: ({ id, name, kind }, { from: { quote, prices }, quantity, amount }, counts) =>
      proposals.push({
        ...{ id, name, kind, ...counts, quantity, unitPrice: prices.unitPriceOf(quantity) },
        ...{ supplier: quote.supplier, currency: quote.currency },
        ...{ paid: minor(prices.costOf(quantity)), amount: minor(amount) },
      }),
  })
  return { proposals, unpriced }
}
