import { scaleLinear } from 'd3-scale'
import { LOCALE } from '@/lib/messages/ui'

export type RunStep = {
  key: string
  name: string
  /** First and last day. */
  from: string
  to: string
  state: 'done' | 'now' | 'to_come'
}

export type RunLineFacts = {
  steps: readonly RunStep[]
  today: string
  /** The promised day, flagged. */
  postedBy?: string
  /** Chance that the promise is kept, 0 to 1. */
  chance?: number
}

const DAY_MS = 86_400_000

/** Whole days since 1970-01-01. */
export function dayNumber(day: string): number {
  const at = Date.parse(`${day}T00:00:00Z`)
  if (Number.isNaN(at)) throw new RangeError(`dayNumber: day must be YYYY-MM-DD, got ${day}`)
  return Math.round(at / DAY_MS)
}

/** From days to pixels in true proportion; a step lasts until the end of its last day. */
export function dayScale({ steps, today, postedBy }: RunLineFacts, [start, end]: [number, number]) {
  const days = [...steps.flatMap((step) => [dayNumber(step.from), dayNumber(step.to) + 1])]
  if (postedBy) days.push(dayNumber(postedBy) + 1)
  // Today may lie long before or after; it stretches the line only while that keeps most of it for the steps.
  const [first, last] = [Math.min(...days), Math.max(...days)]
  const reach = (last - first) * 0.25
  const now = dayNumber(today)
  const from = now < first && first - now <= reach ? now : first
  const to = now > last && now - last <= reach ? now : last
  const scale = scaleLinear([from, Math.max(to, from + 1)], [start, end])
  return {
    at: (day: string, dayEnd = false) => scale(dayNumber(day) + (dayEnd ? 1 : 0)),
    hasToday: now >= from && now <= to,
  }
}

/** "3 Mar", for the crowded ruler; the table has the dates in full. */
export function shortDay(day: string): string {
  const format = new Intl.DateTimeFormat(LOCALE, { day: 'numeric', month: 'short', timeZone: 'UTC' })
  return format.format(new Date(`${day}T12:00:00Z`))
}
