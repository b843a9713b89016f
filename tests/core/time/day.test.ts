import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { addDays, daysBetween, isDay, weekday } from '@/lib/core/time/day'

const days = fc
  .date({ min: new Date('0001-01-01'), max: new Date('9998-12-31'), noInvalidDate: true })
  .map((date) => date.toISOString().slice(0, 10))

/** The day number by the civil-calendar formula (H. Hinnant, chrono-compatible low-level date algorithms, 2013). */
function civil(day: string): number {
  const [y0 = 0, m = 0, d = 0] = day.split('-').map(Number)
  const y = m <= 2 ? y0 - 1 : y0
  const era = Math.floor(y / 400)
  const yearOfEra = y - era * 400
  const dayOfYear = Math.floor((153 * (m + (m > 2 ? -3 : 9)) + 2) / 5) + d - 1
  return (
    era * 146097 +
    yearOfEra * 365 +
    Math.floor(yearOfEra / 4) -
    Math.floor(yearOfEra / 100) +
    dayOfYear -
    719468
  )
}

describe('isDay', () => {
  test.each(['2026-03-01', '2024-02-29', '2000-02-29', '9999-12-31', '0001-01-01'])('%s', (day) => {
    expect(isDay(day)).toBe(true)
  })
  test.each([
    ...['2026-02-29', '1900-02-29', '2026-13-01', '2026-00-10', '2026-04-31', '2026-1-1', '26-01-01', ''],
    ...['2026-01-01T00:00', ' 2026-01-01', '2026-01-01\n', '2026/01/01', '12026-01-01'],
  ])('not %j', (text) => {
    expect(isDay(text)).toBe(false)
  })
})

describe('counting days', () => {
  // Calendar facts.
  test.each([
    ['2026-02-28', 1, '2026-03-01'],
    ['2024-02-28', 1, '2024-02-29'],
    ['2026-01-01', -1, '2025-12-31'],
    ['2026-03-29', 1, '2026-03-30'],
    ['2000-01-01', 366, '2001-01-01'],
    ['0099-12-31', 1, '0100-01-01'],
  ])('%s %i → %s', (day, n, later) => {
    expect(addDays(day, n)).toBe(later)
    expect(daysBetween(day, later)).toBe(n)
  })

  test('agrees with the civil-calendar formula', () => {
    fc.assert(
      fc.property(days, days, (a, b) => {
        expect(daysBetween(a, b)).toBe(civil(b) - civil(a))
        expect(addDays(a, civil(b) - civil(a))).toBe(b)
      }),
    )
  })

  // 1 January 2000 was a Saturday, 20 July 1969 a Sunday, 9 November 1989 a Thursday.
  test.each([
    ['2000-01-01', 6],
    ['1969-07-20', 7],
    ['1989-11-09', 4],
    ['2026-03-02', 1],
  ])('%s is weekday %i', (day, number) => {
    expect(weekday(day)).toBe(number)
  })

  test('the weekday comes back after 7 days and moves on by one each day', () => {
    fc.assert(
      fc.property(days, (day) => {
        expect(weekday(addDays(day, 7))).toBe(weekday(day))
        expect(weekday(addDays(day, 1))).toBe((weekday(day) % 7) + 1)
      }),
    )
  })

  test.each([
    ['day', () => addDays('2026-02-30', 1)],
    ['days', () => addDays('2026-02-01', 0.5)],
    ['days', () => addDays('2026-02-01', NaN)],
    ['days', () => addDays('9999-12-31', 1)],
    ['days', () => addDays('2026-02-01', 1e15)],
    ['from', () => daysBetween('yesterday', '2026-01-01')],
    ['to', () => daysBetween('2026-01-01', 'tomorrow')],
    ['day', () => weekday('')],
  ])('throws and names %s', (argument, call) => {
    expect(call).toThrow(RangeError)
    expect(call).toThrow(argument)
  })
})
