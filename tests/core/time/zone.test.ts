import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { addDays } from '@/lib/core/time/day'
import { dayIn, isZone, startOfDay } from '@/lib/core/time/zone'

// Midnights by the offsets of the IANA zone database, worked out by hand.
const MIDNIGHTS: readonly [string, string, string][] = [
  ['2026-01-15', 'Europe/Berlin', '2026-01-14T23:00:00.000Z'],
  ['2026-07-15', 'Europe/Berlin', '2026-07-14T22:00:00.000Z'],
  ['2026-03-29', 'Europe/Berlin', '2026-03-28T23:00:00.000Z'],
  ['2026-03-30', 'Europe/Berlin', '2026-03-29T22:00:00.000Z'],
  ['2026-10-25', 'Europe/London', '2026-10-24T23:00:00.000Z'],
  ['2026-10-26', 'Europe/London', '2026-10-26T00:00:00.000Z'],
  ['2026-07-04', 'America/Los_Angeles', '2026-07-04T07:00:00.000Z'],
  ['2026-03-01', 'Asia/Tokyo', '2026-02-28T15:00:00.000Z'],
  ['2026-03-01', 'Asia/Kathmandu', '2026-02-28T18:15:00.000Z'],
  ['2026-03-01', 'Pacific/Kiritimati', '2026-02-28T10:00:00.000Z'],
  ['2026-03-01', 'Pacific/Pago_Pago', '2026-03-01T11:00:00.000Z'],
  ['2026-03-01', 'UTC', '2026-03-01T00:00:00.000Z'],
]

describe('startOfDay', () => {
  test.each(MIDNIGHTS)('%s in %s', (day, zone, instant) => {
    expect(startOfDay(day, zone).toISOString()).toBe(instant)
  })

  test('a midnight that the clocks skip starts an hour later (São Paulo, 4 November 2018)', () => {
    expect(startOfDay('2018-11-04', 'America/Sao_Paulo').toISOString()).toBe('2018-11-04T03:00:00.000Z')
  })

  test('a day that was left out starts with the next (Apia, 30 December 2011)', () => {
    expect(startOfDay('2011-12-30', 'Pacific/Apia')).toEqual(startOfDay('2011-12-31', 'Pacific/Apia'))
  })

  test('is the first instant of the day: a second before is still the day before', () => {
    const zones = fc.constantFrom(
      'Europe/Berlin',
      'America/New_York',
      'Asia/Kolkata',
      'Australia/Lord_Howe',
      'Asia/Beirut',
    )
    const days = fc.integer({ min: -7000, max: 7000 }).map((n) => addDays('2020-01-01', n))
    fc.assert(
      fc.property(days, zones, (day, zone) => {
        const start = startOfDay(day, zone)
        expect(dayIn(start, zone)).toBe(day)
        expect(dayIn(new Date(start.getTime() - 1000), zone)).toBe(addDays(day, -1))
      }),
      { numRuns: 60 },
    )
  })
})

describe('dayIn', () => {
  test.each([
    ['2026-03-01T23:30:00Z', 'Asia/Tokyo', '2026-03-02'],
    ['2026-03-01T00:30:00Z', 'America/New_York', '2026-02-28'],
    ['2026-12-31T23:00:00Z', 'Europe/Berlin', '2027-01-01'],
    ['2026-12-31T22:59:59Z', 'Europe/Berlin', '2026-12-31'],
    ['1700-06-01T12:00:00Z', 'UTC', '1700-06-01'],
  ])('%s in %s', (instant, zone, day) => {
    expect(dayIn(new Date(instant), zone)).toBe(day)
  })
})

test('zones known and unknown', () => {
  expect(['Europe/Berlin', 'UTC', 'Asia/Tokyo'].every(isZone)).toBe(true)
  expect(['Europe/Nowhere', '', 'Berlin time'].some(isZone)).toBe(false)
})

test.each([
  ['a day that is none', () => startOfDay('2026-02-30', 'UTC')],
  ['a zone that is none', () => startOfDay('2026-02-01', 'Europe/Nowhere')],
  ['a zone that is none', () => dayIn(new Date(0), 'Europe/Nowhere')],
  ['an invalid date', () => dayIn(new Date(NaN), 'UTC')],
  ['a date of the Julian calendar', () => dayIn(new Date('1582-01-01'), 'UTC')],
])('throws for %s', (_, call) => {
  expect(call).toThrow(RangeError)
})
