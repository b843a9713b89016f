import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'

/** An instant so many days before or after another, at a quarter past some hour of the day (UTC). */
export function daysAfter(instant: Date, days: number, hour = 10): Date {
  const moved = new Date(instant.getTime() + days * 86_400_000)
  moved.setUTCHours(hour, 15, 0, 0)
  return moved
}

/** The day so many days from an instant, as a form wants it. */
export const dayAfter = (instant: Date, days: number) => addDays(dayIn(instant, 'Europe/Berlin'), days)
