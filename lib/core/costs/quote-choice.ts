import { exchange } from '@/lib/core/costs/exchange'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { PlanQuote, PlanSupplier } from '@/lib/core/costs/plan-buying'
import { priceSteps, type PriceSteps } from '@/lib/core/costs/purchase'

/** A quote that can be used: its prices, and how its currency and its supplier enter the plan. */
export type UsableQuote = {
  readonly quote: PlanQuote
  readonly prices: PriceSteps
  readonly convert: (amount: number) => number
  /** Position in the plan's suppliers; −1 for one without freight and duty. */
  readonly supplierAt: number
}

/** A purchase of one quote: how many pieces or arrays, and the cost in the selling currency, set-up included. */
export type Chosen = { readonly from: UsableQuote; readonly quantity: number; readonly amount: number }

/**
 * Prepares the choice among quotes for many needs; null when none can be used (nothing quoted, or no rate).
 * Compared in the selling currency with duty and lasting import tax; freight is left out, since it is shared by
 * everything bought from that supplier. Ties go to the earlier quote.
 */
export function quoteChooser(
  plan: CostPlan,
  quotes: readonly PlanQuote[],
): ((needed: number) => Chosen) | null {
  const usable = quotes.flatMap((quote) => {
    const prices = priceSteps(quote)
    const convert = exchange(quote.currency, plan.currency, plan.rates)
    const supplierAt = plan.suppliers.findIndex(({ supplier }) => supplier === quote.supplier)
    return prices === null || convert === null ? [] : [{ quote, prices, convert, supplierAt }]
  })
  if (usable.length === 0) return null
  const landed = usable.map(({ supplierAt }) => landedFactor(plan.suppliers[supplierAt]))
  let last: Chosen | null = null
  let lastNeed = 0
  return (needed) => {
    // What is cheapest for a smaller need stays so for every need it still covers.
    if (last !== null && needed >= lastNeed && needed <= last.quantity) return last
    let chosen = 0
    let amount = 0
    let least = Infinity
    for (let i = 0; i < usable.length; i++) {
      const { prices, convert } = usable[i]!
      const cost = convert(prices.costFor(needed))
      if (cost * landed[i]! >= least) continue
      chosen = i
      amount = cost
      least = cost * landed[i]!
    }
    const from = usable[chosen]!
    lastNeed = needed
    last = { from, quantity: from.prices.quantityFor(needed), amount }
    return last
  }
}

function landedFactor(supplier: PlanSupplier | undefined): number {
  if (supplier === undefined) return 1
  const tax = supplier.isImportTaxReclaimable ? 0 : supplier.importTaxBasisPoints
  return (1 + supplier.dutyBasisPoints / 10_000) * (1 + tax / 10_000)
}
