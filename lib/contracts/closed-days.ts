import { ok, refuse, type Result } from '@/lib/core/result'
import { addDays, isDay } from '@/lib/core/time/day'

/** A longer closure is a mistake of the year. */
const MOST_DAYS = 120

/**
 * Closed days as typed, one or a range a line: "2027-12-24", "2027-12-24 to 2028-01-02". Sorted, each once.
 * Refuses: 'unreadable' where a line is neither, or ends before it begins, or is longer than 120 days.
 * @example readClosedDays('2027-12-24 to 2027-12-25')  // → ok(['2027-12-24', '2027-12-25'])
 */
export function readClosedDays(text: string): Result<string[], 'unreadable'> {
  const days = new Set<string>()
  for (const line of text.split('\n').map((each) => each.trim())) {
    if (line === '') continue
    const found = /^(\d{4}-\d{2}-\d{2})(?:\s*(?:to|–|-)\s*(\d{4}-\d{2}-\d{2}))?$/.exec(line)
    const [from, to] = [found?.[1] ?? '', found?.[2] ?? found?.[1] ?? '']
    if (!isDay(from) || !isDay(to) || to < from || to > addDays(from, MOST_DAYS)) return refuse('unreadable')
    for (let day = from; day <= to; day = addDays(day, 1)) days.add(day)
  }
  return ok([...days].sort())
}

/** The other way round: days in a row as one line. */
export function writeClosedDays(days: readonly string[]): string {
  const ranges: { from: string; to: string }[] = []
  for (const day of days) {
    const last = ranges.at(-1)
    if (last && addDays(last.to, 1) === day) last.to = day
    else ranges.push({ from: day, to: day })
  }
  return ranges.map(({ from, to }) => (from === to ? from : `${from} to ${to}`)).join('\n')
}
