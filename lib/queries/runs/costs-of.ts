import 'server-only'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { OfferKind } from '@/models/words'
import type { RunFacts } from './run-facts'
import type { unitsOf } from './units-of'

/** How the run's units fall on its offers today, and what that was taken from. */
export function mixOf(facts: RunFacts, units: ReturnType<typeof unitsOf>) {
  const kinds = facts.offers.map(({ kind }) => kind)
  const weights = (counts: { [K in OfferKind]?: number }) =>
    Object.fromEntries(kinds.map((kind) => [kind, counts[kind] ?? 0]))
  if (units.deposited > 0) return { mix: weights(units.depositedByOffer), mixOf: 'deposits' as const }
  const wanted: { [K in OfferKind]?: number } = {}
  for (const { offer, quantity } of facts.signUps.notOrdered) wanted[offer] = (wanted[offer] ?? 0) + quantity
  if (kinds.some((kind) => wanted[kind])) return { mix: weights(wanted), mixOf: 'signups' as const }
  return { mix: Object.fromEntries(kinds.map((kind) => [kind, 1])), mixOf: 'even' as const }
}

/**
 * The cost plan at the run's own prices and offers; null without a plan, or when it knows one of the offers not at all:
 * figures of half a plan would be wrong ones.
 */
export function planOfRun({ plan, offers }: RunFacts): CostPlan | null {
  if (!plan) return null
  const sold = new Map<string, RunFacts['offers'][number]>(offers.map((offer) => [offer.kind, offer]))
  const known = plan.costs.offers.flatMap((offer) => {
    const own = sold.get(offer.offer)
    return own ? [{ ...offer, price: own.priceMinor, deposit: own.depositMinor }] : []
  })
  if (known.length === 0 || known.length < offers.length) return null
  const isSold = ({ offer }: { offer: string }) => sold.has(offer)
  return {
    ...plan.costs,
    offers: known,
    choices: plan.costs.choices.filter(isSold),
    perUnit: plan.costs.perUnit.filter(isSold),
  }
}
