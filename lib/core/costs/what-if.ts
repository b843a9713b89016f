import type { CostPlan } from '@/lib/core/costs/plan'
import type { PlanQuote } from '@/lib/core/costs/plan-buying'
import { scaled, type Scaled } from '@/lib/core/costs/scaled'

/** What is different in a what-if; what is left out stays as planned. */
export type WhatIf = {
  /** Prices by offer, in minor units. */
  readonly prices?: Readonly<Record<string, number>>
  readonly yieldBasisPoints?: number
  /** A supplier nobody buys from any more (null), or whose prices are at so many hundredths. */
  readonly supplier?: { readonly name: string; readonly hundredths: number | null }
}

/**
 * A plan with some things different: prices, the yield, a supplier left out or at other prices.
 * Domain:   prices safe integers ≥ 0, 1 to 10,000 basis points, whole hundredths ≥ 0 → otherwise RangeError where the plan is
 *           used. A deposit never stays above its price.
 * Note:     what nobody else quotes is unpriced once its supplier is left out; `costRun` says so.
 * @example  applyWhatIf(emptyPlan('EUR'), { yieldBasisPoints: 9000 }).yield.basisPoints  // → 9000
 */
export function applyWhatIf(plan: CostPlan, change: WhatIf): CostPlan {
  const { prices = {}, yieldBasisPoints, supplier } = change
  const offers = plan.offers.map((offer) => {
    const price = prices[offer.offer] ?? offer.price
    return { ...offer, price, deposit: Math.min(offer.deposit, price) }
  })
  const priced = {
    ...plan,
    offers,
    yield: { ...plan.yield, basisPoints: yieldBasisPoints ?? plan.yield.basisPoints },
  }
  return supplier ? withSupplier(priced, supplier) : priced
}

function withSupplier(plan: CostPlan, { name, hundredths }: NonNullable<WhatIf['supplier']>): CostPlan {
  const by = hundredths === null ? null : scaled(hundredths)
  const quotes = (list: readonly PlanQuote[]) =>
    list.flatMap((quote) => {
      if (quote.supplier !== name) return [quote]
      return by ? [atPrices(quote, by)] : []
    })
  const assembles = plan.assembly?.supplier === name
  return {
    ...plan,
    parts: plan.parts.map((part) => ({ ...part, quotes: quotes(part.quotes) })),
    boards: plan.boards.map((board) => ({ ...board, quotes: quotes(board.quotes) })),
    assembly:
      plan.assembly && assembles && by
        ? {
            ...plan.assembly,
            setup: by.whole(plan.assembly.setup),
            perDistinctPart: by.whole(plan.assembly.perDistinctPart),
            perStart: by.exact(plan.assembly.perStart),
            perJoint: by.exact(plan.assembly.perJoint),
            perHandJoint: by.exact(plan.assembly.perHandJoint),
          }
        : assembles
          ? null
          : plan.assembly,
  }
}

const atPrices = (quote: PlanQuote, by: Scaled): PlanQuote => ({
  ...quote,
  setup: by.whole(quote.setup),
  breaks: quote.breaks.map(({ from, unitPrice }) => ({ from, unitPrice: by.exact(unitPrice) })),
})
