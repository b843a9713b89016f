import type { Day } from '@/lib/core/brand'

const SHAPE = /^(\d{4})-(\d{2})-(\d{2})$/
const DAY_MS = 86_400_000

/** Days since 1970-01-01, or NaN for a text that is no day of the calendar. */
function ordinal(text: string): number {
  const [match, year, month, date] = SHAPE.exec(text) ?? []
  if (match === undefined) return NaN
  const instant = new Date(0)
  instant.setUTCFullYear(Number(year), Number(month) - 1, Number(date))
  return instant.toISOString().slice(0, 10) === text ? instant.getTime() / DAY_MS : NaN
}

function ordinalOf(name: string, argument: string, day: Day): number {
  const count = ordinal(day)
  if (Number.isNaN(count)) throw new RangeError(`${name}: ${argument} must be a day YYYY-MM-DD, got ${day}`)
  return count
}

/**
 * Whether a text is a day of the calendar, written YYYY-MM-DD.
 * Source: ISO 8601, proleptic Gregorian calendar, years 0000 to 9999.
 * @example isDay('2028-02-29')  // → true
 * @example isDay('2027-02-29')  // → false
 */
export function isDay(text: string): text is Day {
  return !Number.isNaN(ordinal(text))
}

/**
 * The day a number of calendar days later, or earlier for a negative number.
 * Domain:  a valid day, a safe integer, a result between years 0000 and 9999 → otherwise RangeError.
 * @example addDays('2026-12-30', 3)  // → '2027-01-02'
 */
export function addDays(day: Day, days: number): Day {
  if (!Number.isSafeInteger(days)) throw new RangeError(`addDays: days must be a whole number, got ${days}`)
  const later = new Date((ordinalOf('addDays', 'day', day) + days) * DAY_MS)
  if (Number.isNaN(later.getTime()) || later.getUTCFullYear() < 0 || later.getUTCFullYear() > 9999) {
    throw new RangeError(`addDays: days must stay within years 0000 to 9999, got ${days}`)
  }
  return later.toISOString().slice(0, 10)
}

/**
 * How many calendar days lie from one day to another; negative when the second is earlier.
 * Domain:  two valid days → otherwise RangeError.
 * @example daysBetween('2026-02-27', '2026-03-02')  // → 3
 */
export function daysBetween(from: Day, to: Day): number {
  return ordinalOf('daysBetween', 'to', to) - ordinalOf('daysBetween', 'from', from)
}

/**
 * The day of the week, from 1 for Monday to 7 for Sunday.
 * Domain:  a valid day → otherwise RangeError.
 * Source:  ISO 8601; 1970-01-01 was a Thursday.
 * @example weekday('2026-03-01')  // → 7
 */
export function weekday(day: Day): 1 | 2 | 3 | 4 | 5 | 6 | 7 {
  const count = ordinalOf('weekday', 'day', day)
  return (((((count + 3) % 7) + 7) % 7) + 1) as 1 | 2 | 3 | 4 | 5 | 6 | 7
}
