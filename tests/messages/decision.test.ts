import { describe, expect, test } from 'vitest'
import { decision } from '@/lib/messages/decision'
import { readinessOfPage } from '@/lib/messages/readiness'
import { readinessFigures } from '@/lib/core/states/readiness-figures'
import { READINESS_KEYS, readinessOf, type ReadinessFacts } from '@/lib/core/states/run-readiness'

const facts = {
  state: 'taking_deposits' as const,
  currency: 'EUR',
  locale: 'en-GB',
  minimum: 60,
  maximum: 120,
  notReady: 0,
  figures: {
    deposited: 70,
    forecast: { chance: 1 },
    breakEven: 52,
    expectedProfitMinor: 123_400,
    chanceOfLoss: 0.04,
  },
  weighed: {
    likelyToPay: 66.5,
    worstInTenMinor: -18_000,
    tenthFails: { units: 63, profitMinor: 54_000 },
    cashLow: { units: 70, lowMinor: -210_000, on: '2027-06-01' },
  },
}
const verdictOf = (over: Partial<typeof facts>, figures: object = {}) =>
  decision.verdict({ ...facts, ...over, figures: { ...facts.figures, ...figures } })

describe('the verdict', () => {
  test.each([
    ['It can go', {}, {}],
    ['Not enough yet', {}, { deposited: 59 }],
    ['It would probably lose money', {}, { chanceOfLoss: 0.51 }],
    ['Enough deposits, not ready', { notReady: 2 }, {}],
    ['It can go', {}, { expectedProfitMinor: null, chanceOfLoss: null, breakEven: null }],
    ['Not open yet', { state: 'draft' as never }, {}],
    ['Locked', { state: 'locked' as never }, {}],
    ['Called off', { state: 'called_off' as never }, {}],
  ])('%s', (title, over, figures) => {
    expect(verdictOf(over, figures).title).toBe(title)
  })

  test('says how many are missing and how likely they come', () => {
    expect(verdictOf({}, { deposited: 59, forecast: { chance: 0.834 } }).words).toBe(
      '1 unit under deposit missing to the minimum; 83 % likely to be reached.',
    )
  })

  test('is carried by a sentence of three figures', () => {
    expect(decision.carried(facts)).toBe(
      '67 of 70 under deposit are likely to pay; break-even at this mix is 52; the worst in ten loses €180.00.',
    )
    const good = { ...facts.weighed, worstInTenMinor: 1_000 }
    expect(decision.carried({ ...facts, weighed: good })).toMatch(/even the worst in ten leaves €10\.00\.$/)
    const none = { ...facts.weighed, worstInTenMinor: null }
    expect(decision.carried({ ...facts, weighed: none })).toMatch(/without a cost plan nothing is known/)
  })

  test('weighs what happens when a tenth does not pay, and how low the money gets', () => {
    expect(decision.weighedFacts(facts).map(({ value }) => value)).toEqual([
      '-€180.00',
      'you still make €540.00 at 63 units',
      '-€2,100.00 on 1 June 2027',
    ])
    const lost = { ...facts.weighed, tenthFails: { units: 3, profitMinor: -5_000 }, cashLow: null }
    expect(decision.weighedFacts({ ...facts, weighed: lost })[1]?.value).toBe('you lose €50.00 at 3 units')
  })

  test('rests on three figures, and claims none it does not have', () => {
    expect(decision.figures(facts).map(({ value }) => value)).toEqual([
      '70 of 60, at most 120',
      '52 units',
      '€1,234.00; 4 % likely to lose',
    ])
    const unknown = { expectedProfitMinor: null, chanceOfLoss: null, breakEven: null }
    const figures = decision.figures({ ...facts, figures: { ...facts.figures, ...unknown } })
    expect(figures.slice(1).map(({ value }) => value)).toEqual([
      'not known without a cost plan',
      'not known without a cost plan',
    ])
    expect(decision.figures({ ...facts, figures: { ...facts.figures, breakEven: null } })[1]?.value).toBe(
      'no quantity up to 120',
    )
  })
})

describe('the readiness list in words', () => {
  const linesOf = (known: ReadinessFacts, shortByMinor?: number) =>
    readinessOfPage({
      revision: 'B',
      currency: 'EUR',
      workshop: { locale: 'en-GB' },
      readiness: readinessOf(known).map((line) => ({
        ...line,
        waivedFor: line.state === 'waived' ? 'Why not.' : null,
      })),
      readinessFigures: readinessFigures(known),
      repay: shortByMinor === undefined ? { state: 'unknown' } : { state: 'short', shortByMinor },
    })
  const part = { quoteAgeDays: 1, stockSeenAgeDays: 1, endOfLife: false, hasAlternate: false }

  test('has a sentence for every line without data', () => {
    const lines = linesOf({})
    expect(lines.map(({ key }) => key)).toEqual(READINESS_KEYS)
    for (const { words, state } of lines) {
      expect(state).toBe('unknown')
      expect(words).toMatch(/^[A-Z].*\.$/)
      expect(words).not.toMatch(/undefined|null|NaN/)
    }
  })

  test('says what is missing, counted', () => {
    const missing = linesOf(
      {
        goodUnits: 0,
        openLessons: 2,
        parts: [
          { ...part, quoteAgeDays: null },
          { ...part, quoteAgeDays: 30 },
          { ...part, stockSeenAgeDays: 8, endOfLife: true },
        ],
        samples: { marked: 3, checked: 1 },
        partsListErrors: 1,
        post: [{ hasWeight: true, hasCustomsCode: false, hasOrigin: true, hasDestinations: true }],
        promises: [{ postedBy: '2027-08-31', likelyBy: '2027-09-14' }],
        page: { terms: true, cautions: false, postalAddress: false },
        canRepay: false,
      },
      1234,
    )
    expect(missing.map(({ words }) => words)).toEqual([
      'No unit of revision B has passed every step of its test plan yet.',
      '2 lessons of earlier revisions not mended in revision B.',
      '1 part without a quote that covers the quantity, 1 part with a quote of 30 days or more, 1 part without enough stock seen in the last 7 days and 1 part at the end of their life without an alternate.',
      '2 parts marked to be checked first, without a good check on record.',
      'The parts list check finds 1 error.',
      '1 offer without weight, customs code, origin or an open destination.',
      'Promised by 31 August 2027, but in 8 of 10 cases it takes until 14 September 2027.',
      'On the page is still missing: cautions and your postal address.',
      'The balance at the payment provider is short by €12.34. Pay that in, or let this pass with a reason.',
    ])
  })

  test('gives the reason of a line let pass', () => {
    const [first] = linesOf({ waivers: [{ key: 'first_good_unit', reason: 'Why not.' }] })
    expect(first?.words).toBe('Let pass, because: Why not.')
  })
})
