import type { Minor } from '@/lib/core/brand'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { PlanQuote } from '@/lib/core/costs/plan-buying'
import { costRun } from '@/lib/core/costs/run-cost'
import { scaled, type Scaled } from '@/lib/core/costs/scaled'
import { divide } from '@/lib/core/money/allocate'

/** An input of a plan that may turn out differently than written. */
export type MoverKey =
  | 'price'
  | 'quantity'
  | 'parts'
  | 'boards'
  | 'assembly'
  | 'labour'
  | 'yield'
  | 'rate'
  | 'fees'
  | 'postage'
  | 'packaging'
  | 'one_off'
  | 'freight'

/** The profit when one input is less or more than planned and everything else stays. */
export type Mover = {
  readonly key: MoverKey
  /** The currency of a rate; empty for the others. */
  readonly name: string
  readonly less: Minor
  readonly more: Minor
  /** How far apart the two are. */
  readonly swing: number
}

type Case = { readonly plan: CostPlan; readonly quantities: Readonly<Record<string, number>> }

/** Points of yield lost or won; a tenth of a yield near 100 % could not be won. */
const YIELD_POINTS = 500

const [LESS, MORE] = [scaled(90), scaled(110)]

const quotesTimes = (quotes: readonly PlanQuote[], by: Scaled): PlanQuote[] =>
  quotes.map((quote) => ({
    ...quote,
    setup: by.whole(quote.setup),
    breaks: quote.breaks.map(({ from, unitPrice }) => ({ from, unitPrice: by.exact(unitPrice) })),
  }))

const CHANGES: Readonly<Record<Exclude<MoverKey, 'rate' | 'yield'>, (from: Case, by: Scaled) => Case>> = {
  price: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      offers: plan.offers.map((offer) => ({
        ...offer,
        price: by.whole(offer.price),
        deposit: Math.min(offer.deposit, by.whole(offer.price)),
      })),
    },
    quantities,
  }),
  quantity: ({ plan, quantities }, by) => {
    const weights = Object.values(quantities)
    const split = divide(by.whole(weights.reduce((sum, units) => sum + units, 0)), weights)
    const parts = split.ok ? split.value : weights
    return {
      plan,
      quantities: Object.fromEntries(Object.keys(quantities).map((offer, i) => [offer, parts[i]!])),
    }
  },
  parts: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      parts: plan.parts.map((part) => ({ ...part, quotes: quotesTimes(part.quotes, by) })),
    },
    quantities,
  }),
  boards: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      boards: plan.boards.map((board) => ({
        ...board,
        stencil: by.whole(board.stencil),
        quotes: quotesTimes(board.quotes, by),
      })),
    },
    quantities,
  }),
  assembly: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      assembly: plan.assembly && {
        ...plan.assembly,
        setup: by.whole(plan.assembly.setup),
        perDistinctPart: by.whole(plan.assembly.perDistinctPart),
        perJoint: by.exact(plan.assembly.perJoint),
        perHandJoint: by.exact(plan.assembly.perHandJoint),
        perStart: by.exact(plan.assembly.perStart),
      },
    },
    quantities,
  }),
  labour: ({ plan, quantities }, by) => ({
    plan: { ...plan, labour: { ...plan.labour, perHour: by.whole(plan.labour.perHour) } },
    quantities,
  }),
  fees: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      fees: {
        ...plan.fees,
        home: {
          basisPoints: by.whole(plan.fees.home.basisPoints),
          fixed: by.whole(plan.fees.home.fixed),
        },
        foreignCard: { ...plan.fees.foreignCard, basisPoints: by.whole(plan.fees.foreignCard.basisPoints) },
      },
    },
    quantities,
  }),
  postage: ({ plan, quantities }, by) => ({
    plan: { ...plan, orders: { ...plan.orders, postagePaid: by.whole(plan.orders.postagePaid) } },
    quantities,
  }),
  packaging: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      offers: plan.offers.map((offer) => ({ ...offer, packaging: by.exact(offer.packaging) })),
    },
    quantities,
  }),
  one_off: ({ plan, quantities }, by) => ({
    plan: { ...plan, oneOff: plan.oneOff.map((sum) => ({ ...sum, amount: by.whole(sum.amount) })) },
    quantities,
  }),
  freight: ({ plan, quantities }, by) => ({
    plan: {
      ...plan,
      suppliers: plan.suppliers.map((each) => ({ ...each, freight: by.whole(each.freight) })),
    },
    quantities,
  }),
}

const withRate = (plan: CostPlan, currency: string, by: Scaled): CostPlan => ({
  ...plan,
  rates: plan.rates.map((each) =>
    each.currency === currency ? { ...each, rate: by.exact(each.rate) } : each,
  ),
})

const withYield = (plan: CostPlan, points: number): CostPlan => ({
  ...plan,
  yield: {
    ...plan.yield,
    basisPoints: Math.min(10_000, Math.max(1, plan.yield.basisPoints + points)),
  },
})

/**
 * Which inputs move the profit of a run most: each is taken a tenth less and a tenth more than planned, the yield five
 * points, everything else left as it is; the widest swing first. Inputs that move nothing are left out.
 * Units:    quantities as `costRun`; minor units out.
 * Domain:   as `costRun`.
 * Rounding: amounts changed are rounded half-up to minor units, prices of single pieces stay exact; units fall on the
 *           offers by `divide`.
 * Note:     one at a time: two inputs that move together are not seen.
 * Cost:     some 26 times `costRun`.
 * @example  movers({ ...emptyPlan('EUR'), oneOff: [{ name: 'tooling', amount: 5000, currency: 'EUR' }] }, {})  // → [{ key: 'one_off', name: '', less: -4500, more: -5500, swing: 1000 }]
 */
export function movers(plan: CostPlan, quantities: Readonly<Record<string, number>>): Mover[] {
  const given: Case = { plan, quantities }
  const profit = (one: Case) => costRun(one.plan, one.quantities).profit
  const mover = (key: MoverKey, name: string, less: Case, more: Case): Mover => {
    const [low, high] = [profit(less), profit(more)]
    return { key, name, less: low, more: high, swing: Math.abs(high - low) }
  }
  const keys = Object.keys(CHANGES) as (keyof typeof CHANGES)[]
  const found = [
    ...keys.map((key) => mover(key, '', CHANGES[key](given, LESS), CHANGES[key](given, MORE))),
    mover(
      'yield',
      '',
      { ...given, plan: withYield(plan, -YIELD_POINTS) },
      { ...given, plan: withYield(plan, YIELD_POINTS) },
    ),
    ...plan.rates.map(({ currency }) =>
      mover(
        'rate',
        currency,
        { ...given, plan: withRate(plan, currency, LESS) },
        { ...given, plan: withRate(plan, currency, MORE) },
      ),
    ),
  ]
  return found.filter(({ swing }) => swing > 0).sort((a, b) => b.swing - a.swing)
}
