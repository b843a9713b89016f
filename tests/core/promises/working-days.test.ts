import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { addWorkingDays, isWorkingDay, toWorkingDay } from '@/lib/core/promises/working-days'
import { addDays, weekday } from '@/lib/core/time/day'

const days = fc.integer({ min: 0, max: 4000 }).map((n) => addDays('2024-01-01', n))
const holidays = fc.array(
  fc.integer({ min: 0, max: 4100 }).map((n) => addDays('2024-01-01', n)),
  { maxLength: 40 },
)

describe('addWorkingDays', () => {
  // Counted on a calendar: 1 May 2026 is a Friday, 3 April 2026 Good Friday, 6 April Easter Monday.
  test.each([
    ['2026-05-01', 7, [], '2026-05-12'],
    ['2026-04-30', 1, ['2026-05-01'], '2026-05-04'],
    ['2026-04-02', 1, ['2026-04-03', '2026-04-06'], '2026-04-07'],
    ['2026-05-02', 1, [], '2026-05-04'],
    ['2026-05-04', 5, [], '2026-05-11'],
    ['2026-05-04', 0, [], '2026-05-04'],
    ['2026-05-02', 0, ['2026-05-04'], '2026-05-05'],
  ])('%s and %i, off %j: %s', (day, n, off, reached) => {
    expect(addWorkingDays(day, n, off)).toBe(reached)
  })

  test('counts exactly n working days after the start', () => {
    fc.assert(
      fc.property(days, fc.integer({ min: 1, max: 30 }), holidays, (day, n, off) => {
        const reached = addWorkingDays(day, n, off)
        let counted = 0
        for (let each = addDays(day, 1); each <= reached; each = addDays(each, 1)) {
          if (weekday(each) < 6 && !off.includes(each)) counted++
        }
        expect(counted).toBe(n)
        expect(isWorkingDay(reached, off)).toBe(true)
      }),
    )
  })

  test('more holidays never come earlier', () => {
    fc.assert(
      fc.property(days, fc.nat({ max: 20 }), holidays, holidays, (day, n, off, more) => {
        expect(addWorkingDays(day, n, [...off, ...more]) >= addWorkingDays(day, n, off)).toBe(true)
      }),
    )
  })

  test.each([
    ['n', () => addWorkingDays('2026-05-01', -1, [])],
    ['n', () => addWorkingDays('2026-05-01', 1.5, [])],
    ['n', () => addWorkingDays('2026-05-01', NaN, [])],
    ['day', () => addWorkingDays('2026-05-32', 1, [])],
    ['holidays', () => addWorkingDays('2026-05-01', 1, ['1 May'])],
    ['holidays', () => toWorkingDay('2026-05-01', ['2026-5-1'])],
  ])('throws and names %s', (argument, call) => {
    expect(call).toThrow(RangeError)
    expect(call).toThrow(argument)
  })
})
