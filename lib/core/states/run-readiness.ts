import type { Day } from '@/lib/core/brand'

/** The nine lines of the readiness list, in their order. */
export type ReadinessKey = (typeof READINESS_KEYS)[number]

/** Whether a readiness line is met, not met, without data, or waived with a reason. */
export type ReadinessState = 'ready' | 'missing' | 'unknown' | 'waived'

/** One line of the readiness list. */
export type ReadinessLine = { readonly key: ReadinessKey; readonly state: ReadinessState }

/** A readiness line that the owner lets pass, and why. */
export type Waiver = { readonly key: ReadinessKey; readonly reason: string }

/**
 * The keys of the readiness list, in the order in which a maker works through it.
 * Source: product.md, readiness list (1) to (9); http.md for the names.
 */
export const READINESS_KEYS = [
  'first_good_unit',
  'lessons',
  'quotes',
  'samples',
  'parts_list',
  'post_data',
  'promise',
  'page',
  'repay',
] as const

/** A quote may be this many days old at the lock, and stock may have been seen this many days ago (product.md, line 3). */
export const QUOTE_FRESH_DAYS = 30

/** Stock seen this many days ago still counts (product.md, line 3). */
export const STOCK_FRESH_DAYS = 7

/** What is known about one part at the planned quantity; null where nobody has looked. */
export type PartFacts = {
  /** Age in days of the youngest quote that covers the quantity; null when no quote does. */
  readonly quoteAgeDays: number | null
  /** How many days ago a supplier's stock was seen; null for never. */
  readonly stockSeenAgeDays: number | null
  readonly endOfLife: boolean
  readonly hasAlternate: boolean
}

/** What is known about posting one offer. */
export type PostFacts = {
  readonly hasWeight: boolean
  readonly hasCustomsCode: boolean
  readonly hasOrigin: boolean
  readonly hasDestinations: boolean
}

/** What is known for each line; a line left out, null or empty has no data and is unknown. */
export type ReadinessFacts = {
  /** Units of this revision that passed every step of its test plan; null without a test plan or a unit tried. */
  readonly goodUnits?: number | null
  /** Lessons of earlier revisions neither mended in this one nor waived. */
  readonly openLessons?: number | null
  readonly parts?: readonly PartFacts[] | null
  /** Parts marked "check a sample first", and how many of them have a recorded good check. */
  readonly samples?: { readonly marked: number; readonly checked: number } | null
  /** Errors of the parts list check; null while there is no parts list. */
  readonly partsListErrors?: number | null
  readonly post?: readonly PostFacts[] | null
  /** Per offer the promised date and the date reached with 80 % chance, null without a schedule. */
  readonly promises?: readonly { readonly postedBy: Day; readonly likelyBy: Day | null }[] | null
  readonly page?: {
    readonly terms: boolean
    readonly cautions: boolean
    readonly postalAddress: boolean
  } | null
  readonly canRepay?: boolean | null
  readonly waivers?: readonly Waiver[]
}

/** Ready, missing, or null for "no data". */
type Known = boolean | null

const all = <T>(items: readonly T[] | null | undefined, holds: (item: T) => boolean): Known =>
  items === null || items === undefined || items.length === 0 ? null : items.every(holds)

const when = <T>(fact: T | null | undefined, holds: (fact: T) => boolean): Known =>
  fact === null || fact === undefined ? null : holds(fact)

function quoted({ quoteAgeDays, stockSeenAgeDays, endOfLife, hasAlternate }: PartFacts): boolean {
  const fresh = quoteAgeDays !== null && quoteAgeDays < QUOTE_FRESH_DAYS
  const seen = stockSeenAgeDays !== null && stockSeenAgeDays <= STOCK_FRESH_DAYS
  return fresh && seen && (!endOfLife || hasAlternate)
}

function promised(promises: ReadinessFacts['promises']): Known {
  if (promises?.some(({ likelyBy }) => likelyBy === null)) return null
  return all(promises, ({ postedBy, likelyBy }) => likelyBy !== null && postedBy >= likelyBy)
}

const LINES: Readonly<Record<ReadinessKey, (facts: ReadinessFacts) => Known>> = {
  first_good_unit: ({ goodUnits }) => when(goodUnits, (count) => count >= 1),
  lessons: ({ openLessons }) => when(openLessons, (count) => count === 0),
  quotes: ({ parts }) => all(parts, quoted),
  samples: ({ samples }) => when(samples, ({ marked, checked }) => checked >= marked),
  parts_list: ({ partsListErrors }) => when(partsListErrors, (count) => count === 0),
  post_data: ({ post }) =>
    all(post, (offer) => offer.hasWeight && offer.hasCustomsCode && offer.hasOrigin && offer.hasDestinations),
  promise: ({ promises }) => promised(promises),
  page: ({ page }) => when(page, ({ terms, cautions, postalAddress }) => terms && cautions && postalAddress),
  repay: ({ canRepay }) => when(canRepay, (can) => can),
}

/**
 * The nine readiness lines with their state. A line without data is unknown and never ready; one that is not ready
 * but has a waiver with a reason is waived; a ready one needs none.
 * Source: product.md, readiness list.
 * @example readinessOf({})[0]  // → { key: 'first_good_unit', state: 'unknown' }
 * @example readinessOf({ openLessons: 0 })[1]  // → { key: 'lessons', state: 'ready' }
 */
export function readinessOf(facts: ReadinessFacts): ReadinessLine[] {
  return READINESS_KEYS.map((key) => {
    const known = LINES[key](facts)
    if (known === true) return { key, state: 'ready' }
    const waived = facts.waivers?.some((waiver) => waiver.key === key && waiver.reason.trim() !== '')
    if (waived) return { key, state: 'waived' }
    return { key, state: known === null ? 'unknown' : 'missing' }
  })
}
