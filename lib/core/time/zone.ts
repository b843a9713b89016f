import type { Day } from '@/lib/core/brand'
import { isDay } from '@/lib/core/time/day'

/** Formatters are dear to make (0.1 ms); the same zone always gives the same one, so keeping it changes no answer. */
const formats = new Map<string, Intl.DateTimeFormat>()

function formatIn(zone: string): Intl.DateTimeFormat {
  const known = formats.get(zone)
  if (known) return known
  const made = new Intl.DateTimeFormat('en-US', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  })
  formats.set(zone, made)
  return made
}

/**
 * Whether the runtime knows a time zone by this IANA name.
 * @example isZone('Europe/Berlin')  // → true
 * @example isZone('Europe/Nowhere')  // → false
 */
export function isZone(name: string): boolean {
  try {
    return formatIn(name) !== undefined
  } catch {
    return false
  }
}

/** `Intl` counts by the Julian calendar before October 1582; nothing here is older than a workshop. */
const EARLIEST_MS = Date.UTC(1600, 0, 1)

/**
 * The calendar day that an instant falls on in a time zone.
 * Domain:  a valid instant of years 1600 to 9999 and an IANA zone name → otherwise RangeError.
 * Source:  IANA time zone database, by the runtime's `Intl`.
 * @example dayIn(new Date('2026-03-01T23:30:00Z'), 'Asia/Tokyo')  // → '2026-03-02'
 */
export function dayIn(instant: Date, zone: string): Day {
  const parts = formatIn(zone).formatToParts(checked(instant))
  const [year, month, day] = (['year', 'month', 'day'] as const).map(
    (type) => parts.find((part) => part.type === type)?.value,
  )
  return `${year}-${month}-${day}`
}

function checked(instant: Date): Date {
  const ms = instant.getTime()
  if (!(ms >= EARLIEST_MS && ms < Date.UTC(10_000, 0, 1))) {
    throw new RangeError(`dayIn: instant must lie in years 1600 to 9999, got ${instant}`)
  }
  return instant
}

/**
 * The first instant of a calendar day in a time zone: midnight, or when the clocks skip it the moment after.
 * A day that the zone left out altogether starts when the next one does.
 * Domain:  a valid day of years 1600 to 9999 and an IANA zone name → otherwise RangeError.
 * Accuracy: to the second, the resolution of the zone database.
 * Source:  IANA time zone database, by the runtime's `Intl`.
 * Cost:    some 18 look-ups.
 * @example startOfDay('2026-07-01', 'Europe/Berlin').toISOString()  // → '2026-06-30T22:00:00.000Z'
 */
export function startOfDay(day: Day, zone: string): Date {
  if (!isDay(day)) throw new RangeError(`startOfDay: day must be a day YYYY-MM-DD, got ${day}`)
  const midnightUtc = Date.parse(`${day}T00:00:00Z`) / 1000
  let before = midnightUtc - 27 * 3600
  let at = midnightUtc + 27 * 3600
  while (at - before > 1) {
    const middle = Math.floor((before + at) / 2)
    if (dayIn(new Date(middle * 1000), zone) >= day) at = middle
    else before = middle
  }
  return new Date(at * 1000)
}
