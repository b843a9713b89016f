import 'server-only'
import type { DemandBoard } from '@/lib/contracts/demand'
import { callOffCost } from '@/lib/core/costs/call-off'
import { costCurve } from '@/lib/core/costs/curve'
import type { CostPlan } from '@/lib/core/costs/plan'
import { bestPrice, demandByPrice, type PricedGroup } from '@/lib/core/demand/price'
import type { Minor } from '@/lib/core/brand'
import { mixOf, planOfRun } from '@/lib/queries/runs/costs-of'
import { conversionOf, SIGN_UP_CLASSES } from '@/lib/queries/runs/forecast-of'
import type { RunFacts } from '@/lib/queries/runs/run-facts'
import { unitsOf } from '@/lib/queries/runs/units-of'
import type { OfferKind } from '@/models/words'

/** A sign-up with the highest price it stated; null: not asked. */
export type PricedSignUp = {
  offer: OfferKind
  certainty: (typeof SIGN_UP_CLASSES)[number]
  quantity: number
  topPrice: number | null
}

/**
 * Demand and expected profit along the prices stated for each offer of a run that is still a draft, the other offers at
 * their own price. Nothing above the highest price stated is claimed.
 */
export function pricePointsOf(facts: RunFacts, signUps: readonly PricedSignUp[]): DemandBoard['prices'] {
  if (facts.run.state !== 'draft') return []
  const plan = planOfRun(facts)
  return facts.offers.flatMap(({ kind, priceMinor }) => {
    const stated = signUps.flatMap(({ offer, topPrice }) => (offer === kind ? (topPrice ?? []) : []))
    const highest = Math.max(0, ...stated)
    const ladder = [...new Set([...stated, ...(priceMinor <= highest ? [priceMinor] : [])])].sort(
      (a, b) => a - b,
    )
    return ladder.length === 0 ? [] : [pointsAt(facts, plan, kind, ladder, signUps)]
  })
}

function pointsAt(
  facts: RunFacts,
  plan: CostPlan | null,
  offer: OfferKind,
  ladder: readonly number[],
  signUps: readonly PricedSignUp[],
): DemandBoard['prices'][number] {
  const highest = ladder.at(-1)!
  const groups: PricedGroup[] = SIGN_UP_CLASSES.map((name) => ({
    ...conversionOf(facts, name),
    members: signUps
      .filter(({ certainty }) => certainty === name)
      // Who wants another offer joins at every price of this one.
      .map((each) => ({ quantity: each.quantity, topPrice: each.offer === offer ? each.topPrice : highest })),
  }))
  const others = signUps.filter((each) => each.offer !== offer).length
  const { minimum, maximum } = facts.run
  const demand = demandByPrice(ladder, groups)
  const profit = plan && bestAt(facts, plan, offer, ladder, groups)
  return {
    offer,
    best: profit?.best ?? null,
    points: demand.map(({ price, members, forecast }, index) => ({
      priceMinor: price,
      members: members - others,
      expectedUnits: forecast.mean,
      chanceToGo: forecast.atLeast(Math.min(minimum, maximum)),
      expectedProfitMinor: profit ? Math.round(profit.frontier[index]!.expectedProfit) : null,
    })),
  }
}

function bestAt(
  facts: RunFacts,
  plan: CostPlan,
  offer: OfferKind,
  ladder: readonly number[],
  groups: readonly PricedGroup[],
) {
  const { minimum, maximum } = facts.run
  const { mix } = mixOf(facts, unitsOf(facts))
  const at = (price: Minor): CostPlan => ({
    ...plan,
    offers: plan.offers.map((each) =>
      each.offer === offer ? { ...each, price, deposit: Math.min(each.deposit, price) } : each,
    ),
  })
  return bestPrice({
    ...{ ladder, groups, minimum, maximum },
    callOffCost: callOffCost(plan, mix),
    curveAt: (price) => costCurve(at(price), mix, maximum),
  })
}
