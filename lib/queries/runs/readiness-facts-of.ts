import 'server-only'
import { withAttrition } from '@/lib/core/costs/attrition'
import { canRepay } from '@/lib/core/costs/cash'
import { cheapestPurchase } from '@/lib/core/costs/purchase'
import { lintParts } from '@/lib/core/parts/lint'
import type { PartFacts, ReadinessFacts } from '@/lib/core/states/run-readiness'
import { daysBetween } from '@/lib/core/time/day'
import type { OfferKind } from '@/models/words'
import { finishOf, likelyBy } from './promise-of'
import type { PartLine, RunFacts } from './run-facts'
import { unitsOf } from './units-of'

/** What each readiness line is judged by. `balanceMinor` is what lies at the provider; null when it does not answer. */
export function readinessFactsOf(facts: RunFacts, balanceMinor: number | null): ReadinessFacts {
  const { firstUnits, lines, offers, page } = facts
  const marked = [...new Map(lines.map((line) => [line.partId, line])).values()].filter(
    ({ needsSample }) => needsSample,
  )
  return {
    goodUnits: firstUnits.tried === 0 ? null : firstUnits.good,
    openLessons: facts.openLessons,
    parts: lines.length === 0 ? null : partsOf(facts),
    samples:
      lines.length === 0
        ? null
        : { marked: marked.length, checked: marked.filter(({ sampleFits }) => sampleFits).length },
    partsListErrors:
      lines.length === 0 ? null : lintParts(lines).filter(({ severity }) => severity === 'error').length,
    post: offers.map((offer) => ({ ...offer, hasDestinations: offer.openDestinations > 0 })),
    promises: offers.map(({ kind, postedByOn }) => {
      const finish = finishOf(facts, kind)
      return { postedBy: postedByOn, likelyBy: finish && likelyBy(facts, finish) }
    }),
    page,
    canRepay: repayOf(facts, balanceMinor)?.yes ?? null,
    waivers: facts.waivers,
  }
}

/** Whether everyone could be paid back today; what paying back costs is already missing from the balance. */
export function repayOf({ money }: RunFacts, balanceMinor: number | null) {
  if (balanceMinor === null) return null
  return canRepay({ balance: balanceMinor, deposits: money.owedMinor, refundFees: 0 })
}

/** Each distinct part at the quantity the run would need today: what is ordered, at least the minimum. */
function partsOf(facts: RunFacts): PartFacts[] {
  const needs = new Map<string, { line: PartLine; needed: number }>()
  for (const line of facts.lines) {
    const pieces = unitsNeeding(facts, line.neededFor) * line.perUnit
    const needed = pieces === 0 ? 0 : withAttrition(pieces, line.attrition)
    const before = needs.get(line.partId)?.needed ?? 0
    needs.set(line.partId, { line, needed: before + needed })
  }
  return [...needs.values()].map(({ line, needed }) => partFacts(facts, line, needed - line.onHand))
}

function unitsNeeding(facts: RunFacts, neededFor: readonly string[]): number {
  const { toBuildByOffer } = unitsOf(facts)
  const ordered = Object.values(toBuildByOffer).reduce((sum, units) => sum + units, 0)
  const own = facts.offers.filter(({ kind }) => neededFor.includes(kind)).map(({ kind }) => kind)
  const { minimum } = facts.run
  // Before the first order nobody knows the mix: the whole minimum may fall on any offer.
  if (ordered === 0) return own.length === 0 ? 0 : minimum
  const units = own.reduce((sum, kind: OfferKind) => sum + (toBuildByOffer[kind] ?? 0), 0)
  return ordered >= minimum ? units : Math.ceil((units * minimum) / ordered)
}

function partFacts(facts: RunFacts, line: PartLine, missing: number): PartFacts {
  const lives = {
    endOfLife: line.lifecycle === 'gone' || line.lifecycle === 'last_buy',
    hasAlternate: line.alternates > 0,
  }
  // What lies in the drawer needs no supplier.
  if (missing <= 0) return { quoteAgeDays: 0, stockSeenAgeDays: 0, ...lives, hasAlternate: true }
  const quotes = facts.quotes.filter(({ partId }) => partId === line.partId)
  const age = (day: string) => Math.max(0, daysBetween(day, facts.today))
  const covering = quotes.filter(
    ({ breaks, moq, multiple }) => cheapestPurchase({ needed: missing, breaks, moq, multiple, setup: 0 }).ok,
  )
  const seen = quotes.flatMap(({ stockSeen, stockSeenOn }) =>
    stockSeenOn !== null && stockSeen !== null && stockSeen >= missing ? [age(stockSeenOn)] : [],
  )
  const youngest = (ages: readonly number[]) => (ages.length === 0 ? null : Math.min(...ages))
  return {
    quoteAgeDays: youngest(covering.map(({ quotedOn }) => age(quotedOn))),
    stockSeenAgeDays: youngest(seen),
    ...lives,
  }
}
