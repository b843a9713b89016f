import type { Day } from '@/lib/core/brand'
import { addDays, isDay, weekday } from '@/lib/core/time/day'

/**
 * Whether people are at work: neither Saturday nor Sunday nor one of the holidays.
 * Domain:  valid days → otherwise RangeError.
 * @example isWorkingDay('2026-05-01', ['2026-05-01'])  // → false
 */
export function isWorkingDay(day: Day, holidays: readonly Day[]): boolean {
  for (const holiday of holidays) {
    if (!isDay(holiday))
      throw new RangeError(`isWorkingDay: holidays must be days YYYY-MM-DD, got ${holiday}`)
  }
  return weekday(day) <= 5 && !holidays.includes(day)
}

/**
 * The day itself if it is a working day, otherwise the next one that is.
 * Domain:  valid days → otherwise RangeError.
 * @example toWorkingDay('2026-05-02', ['2026-05-04'])  // → '2026-05-05'
 */
export function toWorkingDay(day: Day, holidays: readonly Day[]): Day {
  return isWorkingDay(day, holidays) ? day : toWorkingDay(addDays(day, 1), holidays)
}

/**
 * The day a number of working days later; the day counted from is not one of them.
 * None later is the day itself, moved off weekends and holidays.
 * Units:   working days: Monday to Friday without the holidays given.
 * Domain:  valid days, n whole ≥ 0 → otherwise RangeError.
 * @example addWorkingDays('2026-04-30', 2, ['2026-05-01'])  // → '2026-05-05'
 */
export function addWorkingDays(day: Day, n: number, holidays: readonly Day[]): Day {
  if (!Number.isSafeInteger(n) || n < 0)
    throw new RangeError(`addWorkingDays: n must be a whole number ≥ 0, got ${n}`)
  let reached = n === 0 ? toWorkingDay(day, holidays) : day
  for (let left = n; left > 0; left--) reached = toWorkingDay(addDays(reached, 1), holidays)
  return reached
}
