import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { canRepay, cashLow } from '@/lib/core/costs/cash'

describe('cashLow', () => {
  test('the balance day by day, and its lowest point', () =>
    expect(
      cashLow([
        { day: '2026-06-10', amount: 5000 },
        { day: '2026-05-01', amount: -1200 },
        { day: '2026-05-20', amount: -900 },
        { day: '2026-05-20', amount: 100 },
      ]),
    ).toEqual({
      low: -2000,
      day: '2026-05-20',
      series: [
        { day: '2026-05-01', balance: -1200 },
        { day: '2026-05-20', balance: -2000 },
        { day: '2026-06-10', balance: 3000 },
      ],
    }))

  test('the first day of several equally low ones; nothing without events', () => {
    expect(
      cashLow([
        { day: '2026-05-01', amount: -5 },
        { day: '2026-05-02', amount: 0 },
      ]).day,
    ).toBe('2026-05-01')
    expect(cashLow([])).toEqual({ low: 0, day: null, series: [] })
  })

  test('the order of the events does not matter and the series ends with their sum', () => {
    const event = fc.record({
      day: fc.constantFrom('2026-01-01', '2026-02-28', '2026-02-03'),
      amount: fc.integer({ min: -999, max: 999 }),
    })
    fc.assert(
      fc.property(fc.array(event, { minLength: 1 }), (events) => {
        const { series, low } = cashLow(events)
        expect(cashLow([...events].reverse())).toEqual({ ...cashLow(events) })
        const sum = events.reduce((total, { amount }) => total + amount, 0)
        return series.at(-1)!.balance === sum && low === Math.min(...series.map(({ balance }) => balance))
      }),
    )
  })

  test.each(['2026-02-30', '2026-1-1', '', '2026-05-01T00:00'])('throws on the day %j', (day) =>
    expect(() => cashLow([{ day, amount: 1 }])).toThrow(RangeError),
  )
  test('throws on half a cent', () =>
    expect(() => cashLow([{ day: '2026-05-01', amount: 0.5 }])).toThrow(RangeError))
})

describe('canRepay', () => {
  test.each([
    [10_250, { yes: true, shortBy: 0 }],
    [10_249, { yes: false, shortBy: 1 }],
    [-100, { yes: false, shortBy: 10_350 }],
    [20_000, { yes: true, shortBy: 0 }],
  ])('a balance of %i against 10,000 and fees of 250', (balance, answer) =>
    expect(canRepay({ balance, deposits: 10_000, refundFees: 250 })).toEqual(answer),
  )
  test.each([
    { balance: 1.5, deposits: 0, refundFees: 0 },
    { balance: 0, deposits: -1, refundFees: 0 },
    { balance: 0, deposits: 0, refundFees: NaN },
  ])('throws on %o', (sums) => expect(() => canRepay(sums)).toThrow(RangeError))
})
