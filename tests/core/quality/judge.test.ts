import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { firstFailure, judgeReading, parseReading } from '@/lib/core/quality/judge'
import { firstPassYield, frequentFailures, rolledYield } from '@/lib/core/quality/yield'

describe('judgeReading', () => {
  test('limits are closed, as numbers or as stored decimals', () => {
    for (const step of [
      { low: 4.98, high: 5.02 },
      { low: '4.98', high: '5.02' },
    ] as const) {
      expect([4.979, 4.98, 5, 5.02, 5.0201].map((value) => judgeReading(step, value))).toEqual([
        'fail',
        'pass',
        'pass',
        'pass',
        'fail',
      ])
    }
  })
  test('a missing limit is open; over range passes only without an upper one', () => {
    expect([
      judgeReading({ low: 1e6 }, 2e6),
      judgeReading({ high: 10, low: null }, -5),
      judgeReading({}, 0),
    ]).toEqual(['pass', 'pass', 'pass'])
    expect([judgeReading({ low: 1e6 }, 'over_range'), judgeReading({ high: 10 }, 'over_range')]).toEqual([
      'pass',
      'fail',
    ])
  })
  test('yes or no, and words', () => {
    expect([true, 'yes', false, 'no'].map((value) => judgeReading({ kind: 'yes_no' }, value))).toEqual([
      'pass',
      'pass',
      'fail',
      'fail',
    ])
    expect(judgeReading({ kind: 'text' }, 'serial 12 etched')).toBe('pass')
    expect(judgeReading({ kind: 'text' }, '  ')).toBe('fail')
  })
  test('RangeErrors', () => {
    expect(() => judgeReading({ low: 5, high: 4 }, 4.5)).toThrow(/low must be at most high, got 5 > 4/)
    expect(() => judgeReading({ low: 'five' }, 4.5)).toThrow(/low must be a number, got five/)
    expect(() => judgeReading({ high: Number.NaN }, 4.5)).toThrow(/high must be a number, got NaN/)
    expect(() => judgeReading({ high: '' }, 4.5)).toThrow(/high must be a number/)
    expect(() => judgeReading({ low: 1 }, Number.NaN)).toThrow(
      /value must be a number or 'over_range', got NaN/,
    )
    expect(() => judgeReading({ low: 1 }, true)).toThrow(/value/)
    expect(() => judgeReading({ kind: 'yes_no' }, 3)).toThrow(/value must be yes or no, got 3/)
    expect(() => judgeReading({ kind: 'text' }, 3)).toThrow(/value must be text, got 3/)
  })
})

describe('parseReading', () => {
  test.each([
    ['4,98', 4.98],
    ['4.98', 4.98],
    [' -12.03 ', -12.03],
    ['−11,9', -11.9],
    ['+5', 5],
    ['.5', 0.5],
    ['5.', 5],
    ['1,234', 1.234],
    ['1e-3', 0.001],
    ['2,2E3', 2200],
    ['-0.00', 0],
    ['007', 7],
  ])('%s is %d', (text, value) => expect(parseReading(text)).toEqual({ ok: true, value }))
  test.each(['OL', 'ol', '0L', 'O.L', '.OL', '0.L', '-OL', ' OL '])('%s is over range', (text) => {
    expect(parseReading(text)).toEqual({ ok: true, value: 'over_range' })
  })
  test.each([
    '',
    ' ',
    '1.234,5',
    '1,234.5',
    '1.2.3',
    '1 234',
    '4.98V',
    '5k',
    'NaN',
    'Infinity',
    '--5',
    '0x10',
    '.',
    ',',
    '1e999',
    'OLL',
  ])('%s is unreadable', (text) => expect(parseReading(text)).toEqual({ ok: false, reason: 'unreadable' }))
  test('every number as printed comes back, with a point or a comma', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        const expected = { ok: true, value: x === 0 ? 0 : x }
        expect(parseReading(String(x))).toEqual(expected)
        expect(parseReading(String(x).replace('.', ','))).toEqual(expected)
      }),
    )
  })
})

describe('firstFailure', () => {
  const plan = [
    { key: 'rail', low: '11.5', high: '12.5' },
    { key: 'output', high: 0.01 },
    { key: 'lamp', kind: 'yes_no' as const },
  ]
  test('is the first in the order of the plan, not of the readings', () => {
    const readings = [
      { stepKey: 'lamp', value: 'no' },
      { stepKey: 'output', value: 3 },
      { stepKey: 'rail', value: 12 },
    ]
    expect(firstFailure(plan, readings)).toBe(plan[1])
  })
  test('a later reading of the same step replaces the earlier; steps not reached have not failed', () => {
    const readings = [
      { stepKey: 'rail', value: 3 },
      { stepKey: 'rail', value: 12.1 },
    ]
    expect(firstFailure(plan, readings)).toBeNull()
    expect(firstFailure(plan, readings.slice(0, 1))).toBe(plan[0])
    expect(firstFailure(plan, [])).toBeNull()
  })
})

describe('yields', () => {
  test('.995 · .985 · .999 · .99995 = .979: 1,022 starts for 1,000 (Pyzdek, Six Sigma Project Planner)', () => {
    const yields = [0.995, 0.985, 0.999, 0.99995]
    expect(rolledYield(yields)).toBeCloseTo(0.979, 3)
    expect(Math.ceil(1000 / rolledYield(yields))).toBe(1022)
    expect(rolledYield([])).toBe(1)
    expect(() => rolledYield([0.9, 1.1])).toThrow(/stepYields must be from 0 to 1, got 1.1/)
  })
  test('first-pass yield leaves out rework and what was never tested', () => {
    const units = [
      { results: ['pass'] },
      { results: ['fail', 'pass'] },
      { results: ['pass', 'fail'] },
      { results: [] },
    ] as const
    expect(firstPassYield(units)).toBeCloseTo(2 / 3, 15)
    expect(() => firstPassYield([{ results: [] }])).toThrow(/at least one tested unit, got 1 untested/)
    expect(() => firstPassYield([])).toThrow(RangeError)
  })
  test('the most frequent failures come first, ties in order of appearance', () => {
    const of = (step: string, ...results: ('pass' | 'fail')[]) => results.map((result) => ({ step, result }))
    const results = [
      ...of('power', 'pass', 'fail'),
      ...of('tuning', 'fail', 'fail', 'fail', 'pass'),
      ...of('lamp', 'pass'),
      ...of('jack', 'fail'),
    ]
    expect(frequentFailures(results)).toEqual([
      { step: 'tuning', failed: 3, tested: 4, share: 0.75, cumulative: 0.6 },
      { step: 'power', failed: 1, tested: 2, share: 0.5, cumulative: 0.8 },
      { step: 'jack', failed: 1, tested: 1, share: 1, cumulative: 1 },
    ])
    expect(frequentFailures(of('lamp', 'pass'))).toEqual([])
  })
})
