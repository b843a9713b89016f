import 'server-only'
import type { DemandCount, InterestBoard } from '@/lib/contracts/demand'
import { addDays, daysBetween, weekday } from '@/lib/core/time/day'
import type { InterestRow } from './read-interest'

const MOST_COUNTRIES = 12
/** So many days fit one by one, so many as weeks; longer stories are told by the month. */
const DAYS_AS_DAYS = 31
const DAYS_AS_WEEKS = 26 * 7

type Counted = Pick<
  InterestBoard,
  'people' | 'units' | 'overTime' | 'byOffer' | 'byCertainty' | 'byCountry' | 'byPrice'
>

/** What sign-ups say, counted by each answer. */
export function interestOf(rows: readonly InterestRow[]): Counted {
  const countries = countBy(rows, ({ country }) => country)
  const rest = countries.slice(MOST_COUNTRIES)
  const offers = countBy(rows, ({ offer }) => offer)
  return {
    people: sum(rows, 'people'),
    units: sum(rows, 'units'),
    overTime: overTime(rows),
    byOffer: offers,
    byCertainty: countBy(rows, ({ certainty }) => certainty),
    byCountry: [
      ...countries.slice(0, MOST_COUNTRIES),
      ...(rest.length > 0 ? [{ key: '', people: sum(rest, 'people'), units: sum(rest, 'units') }] : []),
    ],
    byPrice: offers.flatMap(({ key: offer }) => {
      const own = rows.filter((row) => row.offer === offer)
      if (own.every(({ topPrice }) => topPrice === null)) return []
      const prices = countBy(own, ({ topPrice }) => (topPrice === null ? '' : String(topPrice)))
      return [{ offer, prices: prices.sort((a, b) => Number(a.key || -1) - Number(b.key || -1)) }]
    }),
  }
}

const sum = (rows: readonly { people: number; units: number }[], of: 'people' | 'units') =>
  rows.reduce((total, row) => total + row[of], 0)

/** Most units first. */
function countBy(rows: readonly InterestRow[], keyOf: (row: InterestRow) => string): DemandCount[] {
  const counts = new Map<string, DemandCount>()
  for (const row of rows) {
    const key = keyOf(row)
    const before = counts.get(key) ?? { key, people: 0, units: 0 }
    counts.set(key, { key, people: before.people + row.people, units: before.units + row.units })
  }
  return [...counts.values()].sort((a, b) => b.units - a.units || (a.key < b.key ? -1 : 1))
}

function overTime(rows: readonly InterestRow[]): InterestBoard['overTime'] {
  const [first, last] = [rows[0]?.day, rows.at(-1)?.day]
  if (!first || !last) return { step: 'day', buckets: [] }
  const days = daysBetween(first, last) + 1
  const step = days <= DAYS_AS_DAYS ? 'day' : days <= DAYS_AS_WEEKS ? 'week' : 'month'
  // Monday is the first day of a week.
  const startOf = (day: string) =>
    step === 'day' ? day : step === 'week' ? addDays(day, -((weekday(day) + 6) % 7)) : `${day.slice(0, 7)}-01`
  const nextOf = (day: string) =>
    step === 'month' ? `${addDays(day, 31).slice(0, 7)}-01` : addDays(day, step === 'week' ? 7 : 1)
  const counted = countBy(rows, ({ day }) => startOf(day))
  const buckets = []
  for (let from = startOf(first); from <= last; from = nextOf(from)) {
    const found = counted.find(({ key }) => key === from)
    buckets.push({ from, people: found?.people ?? 0, units: found?.units ?? 0 })
  }
  return { step, buckets }
}
