import type { Day } from '@/lib/core/brand'
import {
  QUOTE_FRESH_DAYS,
  STOCK_FRESH_DAYS,
  type PartFacts,
  type ReadinessFacts,
} from '@/lib/core/states/run-readiness'

/** What stands behind the nine readiness lines, counted, so that each can say what is missing. */
export type ReadinessFigures = {
  readonly goodUnits: number | null
  readonly openLessons: number | null
  readonly parts: number
  /** Parts no quote of which covers the quantity. */
  readonly partsUnquoted: number
  /** Parts whose youngest covering quote is too old. */
  readonly quotesOld: number
  /** Parts whose stock nobody has looked at lately. */
  readonly stockUnseen: number
  /** Parts at the end of their life without an alternate. */
  readonly partsEnding: number
  readonly samplesMarked: number
  readonly samplesChecked: number
  readonly partsListErrors: number
  /** Offers, and how many of them lack weight, customs code, origin or destinations. */
  readonly offers: number
  readonly offersUnready: number
  /** The earliest promised day, and the latest day reached with 80 % chance; null without a schedule. */
  readonly promisedBy: Day | null
  readonly likelyBy: Day | null
  readonly pageLacks: readonly ('terms' | 'cautions' | 'postalAddress')[]
}

const count = <T>(items: readonly T[] | null | undefined, holds: (item: T) => boolean) =>
  (items ?? []).filter(holds).length

const isOld = ({ quoteAgeDays }: PartFacts) => quoteAgeDays !== null && quoteAgeDays >= QUOTE_FRESH_DAYS
const isUnseen = ({ stockSeenAgeDays }: PartFacts) =>
  stockSeenAgeDays === null || stockSeenAgeDays > STOCK_FRESH_DAYS

/**
 * Counts what the readiness lines were judged by: how many parts lack a quote, which offers lack data for the post, which
 * promise is the tightest. The states themselves are `readinessOf`'s.
 * Units:   whole counts; days 'YYYY-MM-DD'.
 * Domain:  as `readinessOf`; what is not known counts 0, or null where 0 would be a statement.
 * Source:  product.md, readiness list.
 * @example readinessFigures({ samples: { marked: 3, checked: 1 } }).samplesChecked  // → 1
 * @example readinessFigures({ page: { terms: true, cautions: false, postalAddress: true } }).pageLacks  // → ['cautions']
 */
export function readinessFigures(facts: ReadinessFacts): ReadinessFigures {
  const { parts, samples, post, promises, page } = facts
  const promised = (promises ?? []).map(({ postedBy }) => postedBy).sort()
  const likely = (promises ?? []).flatMap(({ likelyBy }) => (likelyBy === null ? [] : [likelyBy])).sort()
  return {
    goodUnits: facts.goodUnits ?? null,
    openLessons: facts.openLessons ?? null,
    parts: parts?.length ?? 0,
    partsUnquoted: count(parts, ({ quoteAgeDays }) => quoteAgeDays === null),
    quotesOld: count(parts, isOld),
    stockUnseen: count(parts, isUnseen),
    partsEnding: count(parts, ({ endOfLife, hasAlternate }) => endOfLife && !hasAlternate),
    samplesMarked: samples?.marked ?? 0,
    samplesChecked: samples?.checked ?? 0,
    partsListErrors: facts.partsListErrors ?? 0,
    offers: post?.length ?? 0,
    offersUnready: count(
      post,
      (offer) => !(offer.hasWeight && offer.hasCustomsCode && offer.hasOrigin && offer.hasDestinations),
    ),
    promisedBy: promised[0] ?? null,
    likelyBy: likely.at(-1) ?? null,
    pageLacks: page ? (['terms', 'cautions', 'postalAddress'] as const).filter((part) => !page[part]) : [],
  }
}
