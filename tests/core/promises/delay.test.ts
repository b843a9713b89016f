import { describe, expect, test } from 'vitest'
import { delayOutcome, delayRule, refundDue, type DelayNotice } from '@/lib/core/promises/delay'

// Friday 1 May 2026 was promised; the notice goes out on Monday 20 April. 25 May is Memorial Day in the US.
const base = { promisedBy: '2026-05-01', sentOn: '2026-04-20', holidays: ['2026-05-25'] }
const NOTICES = {
  first: { ...base, revisedBy: '2026-05-31', noticeNumber: 1 },
  'first, long': { ...base, revisedBy: '2026-06-01', noticeNumber: 1 },
  second: { ...base, revisedBy: '2026-05-20', noticeNumber: 2 },
  indefinite: { ...base, revisedBy: null, noticeNumber: 1 },
} as const
type Case = [
  country: string,
  notice: keyof typeof NOTICES,
  silence: 'wait' | 'cancel',
  answerBy: string,
  refundBy: string,
]

// United States: 16 CFR 435.2(b)(1): a first delay of at most 30 days stands; longer or unknown, silence cancels 30 days after
// the first date; 435.2(b)(2): a further delay needs consent before the date missed again; 435.1(b): 7 working days.
// DE, GB, JP: own rule; 14 days as in Directive 2011/83/EU Art. 13 and CCR 2013 reg. 34. Dates counted on a calendar.
const RULES: Case[] = [
  ['US', 'first', 'wait', '2026-05-31', '2026-06-09'],
  ['US', 'first, long', 'cancel', '2026-05-31', '2026-06-09'],
  ['US', 'second', 'cancel', '2026-05-01', '2026-05-12'],
  ['US', 'indefinite', 'cancel', '2026-05-31', '2026-06-09'],
  ...(['DE', 'GB', 'JP'] as const).flatMap((country): Case[] => [
    [country, 'first', 'wait', '2026-05-31', '2026-06-14'],
    [country, 'first, long', 'wait', '2026-06-01', '2026-06-15'],
    [country, 'second', 'wait', '2026-05-20', '2026-06-03'],
    [country, 'indefinite', 'wait', '2026-05-31', '2026-06-14'],
  ]),
]

describe.each(RULES)('%s, %s', (country, kind, silenceMeans, answerBy, refundBy) => {
  const notice: DelayNotice = { country, ...NOTICES[kind] }

  test(`the rule: silence means ${silenceMeans}, answer by ${answerBy}`, () => {
    expect(delayRule(notice)).toEqual({ silenceMeans, answerBy, refundBy })
  })

  test('silence', () => {
    const outcome = silenceMeans === 'wait' ? { order: 'waits' } : { order: 'ends', refundBy }
    expect(delayOutcome(notice, { kind: 'silence' })).toEqual(outcome)
  })

  test('consent waits', () => {
    expect(delayOutcome(notice, { kind: 'consent' })).toEqual({ order: 'waits' })
  })

  test('refusal is paid back, counted from its own day', () => {
    // Wednesday 22 April and 7 working days is Friday 1 May; and 14 days is 6 May.
    const refundBy = country === 'US' ? '2026-05-01' : '2026-05-06'
    expect(delayOutcome(notice, { kind: 'refusal', on: '2026-04-22' })).toEqual({ order: 'ends', refundBy })
  })
})

describe('dates', () => {
  test('a holiday moves the American refund and no other', () => {
    expect(refundDue('US', '2026-05-20', ['2026-05-25'])).toBe('2026-06-01')
    expect(refundDue('US', '2026-05-20', [])).toBe('2026-05-29')
    expect(refundDue('DE', '2026-05-20', ['2026-05-25'])).toBe('2026-06-03')
  })

  test('a notice sent late never asks for an answer before it was sent', () => {
    const late = { ...NOTICES.second, country: 'US', sentOn: '2026-05-06', revisedBy: '2026-06-20' }
    expect(delayRule(late).answerBy).toBe('2026-05-06')
  })

  test('a buyer in Puerto Rico is under the American rule', () => {
    for (const notice of Object.values(NOTICES)) {
      expect(delayRule({ country: 'PR', ...notice })).toEqual(delayRule({ country: 'US', ...notice }))
    }
  })

  test('a third notice is as a second', () => {
    const third = { ...NOTICES.second, country: 'US', noticeNumber: 3 }
    expect(delayRule(third)).toEqual(delayRule({ ...third, noticeNumber: 2 }))
  })
})

test.each<[string, Partial<DelayNotice>]>([
  ['country', { country: 'XX' }],
  ['country', { country: 'us' }],
  ['promisedBy', { promisedBy: 'May' }],
  ['revisedBy', { revisedBy: '2026-05-01' }],
  ['revisedBy', { revisedBy: '2026-04-30' }],
  ['revisedBy', { revisedBy: 'June' }],
  ['sentOn', { sentOn: '' }],
  ['noticeNumber', { noticeNumber: 0 }],
  ['noticeNumber', { noticeNumber: 1.5 }],
  ['holidays', { holidays: ['Whitsun'] }],
])('throws and names %s %#', (argument, change) => {
  const notice = { country: 'US', ...NOTICES.first, ...change }
  expect(() => delayRule(notice)).toThrow(RangeError)
  expect(() => delayRule(notice)).toThrow(argument)
})
