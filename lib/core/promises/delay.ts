import type { Day } from '@/lib/core/brand'
import { isCountry } from '@/lib/core/data/country'
import { addWorkingDays } from '@/lib/core/promises/working-days'
import { addDays, daysBetween, isDay } from '@/lib/core/time/day'

/** A notice that a promised date cannot be kept, as it is sent to one buyer. */
export type DelayNotice = {
  /** The buyer's country, ISO 3166-1 alpha-2. */
  readonly country: string
  /** The date that cannot be kept: the first promise, or the revised one of the notice before. */
  readonly promisedBy: Day
  /** The new date, null when none can be given. */
  readonly revisedBy: Day | null
  readonly sentOn: Day
  /** 1 for the first notice about this order, then 2, 3 … */
  readonly noticeNumber: number
  /** The days, besides weekends, on which the workshop's bank does not work. */
  readonly holidays: readonly Day[]
}

/** What a buyer's silence means, the last day to answer, and the last day to pay back who is out by then. */
export type DelayRule = {
  readonly silenceMeans: 'wait' | 'cancel'
  readonly answerBy: Day
  readonly refundBy: Day
}

/** The United States and its territories with a country code of their own (15 U.S.C. 44, "commerce"; from memory). */
const UNDER_US_RULE: readonly string[] = ['US', 'AS', 'GU', 'MP', 'PR', 'UM', 'VI']

/** The longest first delay to which silence agrees in the United States, and how long silence may last there. */
const US_DELAY_DAYS = 30

function assertNotice(notice: DelayNotice): void {
  const { country, promisedBy, revisedBy, sentOn, noticeNumber } = notice
  if (!isCountry(country))
    throw new RangeError(`delayRule: country must be an ISO 3166-1 alpha-2 code, got ${country}`)
  if (!isDay(promisedBy))
    throw new RangeError(`delayRule: promisedBy must be a day YYYY-MM-DD, got ${promisedBy}`)
  if (!isDay(sentOn)) throw new RangeError(`delayRule: sentOn must be a day YYYY-MM-DD, got ${sentOn}`)
  if (revisedBy !== null && !(isDay(revisedBy) && revisedBy > promisedBy)) {
    throw new RangeError(`delayRule: revisedBy must be a day after promisedBy, got ${revisedBy}`)
  }
  if (!Number.isSafeInteger(noticeNumber) || noticeNumber < 1) {
    throw new RangeError(`delayRule: noticeNumber must be a whole number ≥ 1, got ${noticeNumber}`)
  }
}

const later = (a: Day, b: Day): Day => (a > b ? a : b)

/**
 * What silence after a delay notice means, and the dates that go into the notice.
 * United States and territories: a first delay of at most 30 days stands unless the buyer cancels before the new date; a longer, unknown
 * or further delay cancels the order unless the buyer agrees: within 30 days of the first date (first notice), or before
 * the date that is missed again (further notices). Elsewhere our own rule: silence waits and cancelling stays free;
 * the answer is asked for by the new date, or without one within 30 days of the missed one.
 * Refund:  US 7 working days, elsewhere 14 days, after answerBy; who cancels earlier is paid that long after cancelling.
 * Units:   days in the workshop's zone; answerBy is never before sentOn. Data with a date (2026), not legal advice.
 * Domain:  a known country, valid days, revisedBy after promisedBy, noticeNumber whole ≥ 1 → otherwise RangeError.
 * Source:  16 CFR 435.2(b)(1), (b)(2), 435.1(b); own rule elsewhere, 14 days as in Directive 2011/83/EU Art. 13
 *          and CCR 2013 reg. 34.
 * @example delayRule({ country: 'US', promisedBy: '2026-05-01', revisedBy: '2026-05-20', sentOn: '2026-04-20', noticeNumber: 1, holidays: [] })  // → { silenceMeans: 'wait', answerBy: '2026-05-20', refundBy: '2026-05-29' }
 */
export function delayRule(notice: DelayNotice): DelayRule {
  assertNotice(notice)
  const { country, promisedBy, revisedBy, sentOn, noticeNumber, holidays } = notice
  const within30 = addDays(promisedBy, US_DELAY_DAYS)
  if (!UNDER_US_RULE.includes(country)) {
    const answerBy = later(revisedBy ?? within30, sentOn)
    return { silenceMeans: 'wait', answerBy, refundBy: refundDue(country, answerBy, holidays) }
  }
  const short = revisedBy !== null && daysBetween(promisedBy, revisedBy) <= US_DELAY_DAYS
  const waits = noticeNumber === 1 && short
  const lawful = waits ? revisedBy : noticeNumber === 1 ? within30 : promisedBy
  const answerBy = later(lawful, sentOn)
  return {
    silenceMeans: waits ? 'wait' : 'cancel',
    answerBy,
    refundBy: refundDue(country, answerBy, holidays),
  }
}

/**
 * The last day to pay a buyer back, counted from the day on which the order ended.
 * Domain:  a known country, valid days → otherwise RangeError.
 * Source:  16 CFR 435.1(b): 7 working days (US); Directive 2011/83/EU Art. 13, CCR 2013 reg. 34: 14 days; own rule elsewhere: 14.
 * @example refundDue('US', '2026-05-01', [])  // → '2026-05-12'
 * @example refundDue('DE', '2026-05-01', [])  // → '2026-05-15'
 */
export function refundDue(country: string, endedOn: Day, holidays: readonly Day[]): Day {
  if (!isCountry(country))
    throw new RangeError(`refundDue: country must be an ISO 3166-1 alpha-2 code, got ${country}`)
  return UNDER_US_RULE.includes(country) ? addWorkingDays(endedOn, 7, holidays) : addDays(endedOn, 14)
}

/** What a buyer did with a delay notice by the end of its answer-by day. */
export type DelayAnswer =
  { readonly kind: 'silence' } | { readonly kind: 'consent' } | { readonly kind: 'refusal'; readonly on: Day }

/** What becomes of the order: it waits for the new date, or it has ended and is paid back by a day. */
export type DelayOutcome = { readonly order: 'waits' } | { readonly order: 'ends'; readonly refundBy: Day }

/**
 * What becomes of an order after a delay notice: who agrees waits, who refuses is paid back, silence is as the rule says.
 * Domain:  as for `delayRule`; a refusal on a valid day → otherwise RangeError.
 * Source:  as for `delayRule`.
 * @example delayOutcome({ country: 'JP', promisedBy: '2026-05-01', revisedBy: null, sentOn: '2026-04-20', noticeNumber: 1, holidays: [] }, { kind: 'silence' })  // → { order: 'waits' }
 */
export function delayOutcome(notice: DelayNotice, answer: DelayAnswer): DelayOutcome {
  const rule = delayRule(notice)
  if (answer.kind === 'consent') return { order: 'waits' }
  if (answer.kind === 'refusal')
    return { order: 'ends', refundBy: refundDue(notice.country, answer.on, notice.holidays) }
  return rule.silenceMeans === 'wait' ? { order: 'waits' } : { order: 'ends', refundBy: rule.refundBy }
}
