import { formatMoney } from '@/lib/core/money/format'
import type { ReadinessFigures } from '@/lib/core/states/readiness-figures'
import type { ReadinessKey, ReadinessState } from '@/lib/core/states/run-readiness'
import { plural } from './plural'
import { writtenDay } from './written'

/** What each line of the readiness list is about. */
export const readinessTitles: Readonly<Record<ReadinessKey, string>> = {
  first_good_unit: 'A first good unit',
  lessons: 'Lessons mended',
  quotes: 'Quotes and stock',
  samples: 'Samples checked',
  parts_list: 'Parts list',
  post_data: 'Data for the post',
  promise: 'The promise',
  page: 'The public page',
  repay: 'Paying everyone back',
}

export const readinessStates: Readonly<Record<ReadinessState, string>> = {
  ready: 'ready',
  missing: 'missing',
  unknown: 'not known',
  waived: 'let pass',
}

type Facts = ReadinessFigures & { revision: string; shortBy: string | null }
type Words = { ready: string; missing: string; unknown: string }

const parts = (count: number) => plural(count, { one: '# part', other: '# parts' })
const offers = (count: number) => plural(count, { one: '# offer', other: '# offers' })
const listed = (words: readonly string[]) =>
  new Intl.ListFormat('en-GB', { style: 'long', type: 'conjunction' }).format(words)
const lacks = { terms: 'terms', cautions: 'cautions', postalAddress: 'your postal address' }

const WORDS: Readonly<Record<ReadinessKey, (facts: Facts) => Words>> = {
  first_good_unit: ({ revision }) => ({
    ready: `A unit of revision ${revision} has passed every step of its test plan.`,
    missing: `No unit of revision ${revision} has passed every step of its test plan yet.`,
    unknown: `No unit of revision ${revision} has been recorded. Record the first good one.`,
  }),
  lessons: ({ openLessons, revision }) => ({
    ready: 'Every lesson of earlier revisions is mended or waived.',
    missing: `${plural(openLessons ?? 0, { one: '# lesson', other: '# lessons' })} of earlier revisions not mended in revision ${revision}.`,
    unknown: 'Nothing is known about earlier revisions.',
  }),
  quotes: (facts) => ({
    ready: `${parts(facts.parts)}, each with a quote younger than 30 days that covers the quantity, and stock seen within 7 days.`,
    missing: quotesMissing(facts),
    unknown: 'There is no parts list yet, so nothing can be bought.',
  }),
  samples: ({ samplesMarked, samplesChecked }) => ({
    ready:
      samplesMarked === 0
        ? 'No part is marked to be checked first.'
        : plural(samplesMarked, {
            one: 'The one part marked to be checked first has been.',
            other: 'All # parts marked to be checked first have been.',
          }),
    missing: `${parts(samplesMarked - samplesChecked)} marked to be checked first, without a good check on record.`,
    unknown: 'There is no parts list yet.',
  }),
  parts_list: ({ partsListErrors }) => ({
    ready: 'The parts list check finds no errors.',
    missing: `The parts list check finds ${plural(partsListErrors, { one: '# error', other: '# errors' })}.`,
    unknown: 'There is no parts list yet.',
  }),
  post_data: ({ offersUnready }) => ({
    ready: 'Weights, customs code, origin and destinations are set for every offer.',
    missing: `${offers(offersUnready)} without weight, customs code, origin or an open destination.`,
    unknown: 'The run has no offers.',
  }),
  promise: ({ promisedBy, likelyBy }) => ({
    ready: `Promised by ${dayOr(promisedBy)}; in 8 of 10 cases all is posted by ${dayOr(likelyBy)}.`,
    missing: `Promised by ${dayOr(promisedBy)}, but in 8 of 10 cases it takes until ${dayOr(likelyBy)}.`,
    unknown: 'There is no schedule yet: enter the steps with their best, likely and worst days.',
  }),
  page: ({ pageLacks }) => ({
    ready: 'Terms, cautions and your postal address stand on the page.',
    missing: `On the page is still missing: ${listed(pageLacks.map((part) => lacks[part]))}.`,
    unknown: 'Nothing is known about the page.',
  }),
  repay: ({ shortBy }) => ({
    ready: 'Everyone could be paid back today.',
    missing: `The balance at the payment provider is short by ${shortBy ?? ''}. Pay that in, or let this pass with a reason.`,
    unknown: 'The payment provider did not say what lies on your account. Load the page again.',
  }),
}

const dayOr = (day: string | null) => (day === null ? 'an open date' : writtenDay(day))

function quotesMissing({ partsUnquoted, quotesOld, stockUnseen, partsEnding }: Facts): string {
  const found = [
    partsUnquoted > 0 ? `${parts(partsUnquoted)} without a quote that covers the quantity` : '',
    quotesOld > 0 ? `${parts(quotesOld)} with a quote of 30 days or more` : '',
    stockUnseen > 0 ? `${parts(stockUnseen)} without enough stock seen in the last 7 days` : '',
    partsEnding > 0 ? `${parts(partsEnding)} at the end of their life without an alternate` : '',
  ].filter(Boolean)
  return found.length > 0 ? `${listed(found)}.` : 'Something about the quotes is missing.'
}

/** One line of the readiness list in a sentence that says what is so, or what to do. */
export function readinessWords(
  line: { key: ReadinessKey; state: ReadinessState; waivedFor: string | null },
  facts: Facts,
): string {
  const words = WORDS[line.key](facts)
  if (line.state === 'waived') return `Let pass, because: ${line.waivedFor ?? ''}`
  return words[line.state]
}

type PageFacts = {
  revision: string
  currency: string
  workshop: { locale: string }
  readiness: readonly { key: ReadinessKey; state: ReadinessState; waivedFor: string | null }[]
  readinessFigures: ReadinessFigures
  repay: { state: 'yes' | 'unknown' } | { state: 'short'; shortByMinor: number }
}

/** The readiness list of a run in words. */
export function readinessOfPage(page: PageFacts) {
  const { repay, currency, workshop } = page
  const shortBy = repay.state === 'short' ? formatMoney(repay.shortByMinor, currency, workshop.locale) : null
  const facts = { ...page.readinessFigures, revision: page.revision, shortBy }
  return page.readiness.map((line) => ({
    key: line.key,
    state: line.state,
    title: readinessTitles[line.key],
    words: readinessWords(line, facts),
  }))
}
