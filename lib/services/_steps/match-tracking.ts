import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import type { TrackingRow } from '@/lib/contracts/tracking'
import { readTracking } from '@/lib/core/post/tracking'
import { sequelize } from '@/lib/db/sequelize'
import { postMistakes as words } from '@/lib/messages/post'
import type { TrackingLine } from '@/lib/services/_steps/read-tracking-csv'

type Found = { order: string; parcel: string; number: number; state: string; tracking: string | null }

const STATES = ['delivered', 'lost', 'returned'] as const
const FORMULA = /^[=+@\t]|^-[^0-9]/

/**
 * What each line of a carrier's list would do to which parcel, or why it is left out. Two statements, however long the list.
 * Locks: nothing. Writes: nothing.
 */
export async function matchTracking(
  tx: Transaction | null,
  workshopId: string,
  lines: readonly TrackingLine[],
): Promise<TrackingRow[]> {
  const numbers = lines
    .map(({ tracking }) => readTracking(tracking))
    .map((read) => (read.ok ? read.value.number : ''))
  const orders = lines.map(({ order }) => Number(order)).filter((number) => number > 0 && number < 2 ** 31)
  const options = { type: QueryTypes.SELECT as const, transaction: tx ?? undefined }
  const found = await sequelize.query<Found>(
    `select distinct o.number::text as "order", p.id as parcel, p.number, p.state, p.tracking
     from orders o join order_lines ol on ol.order_id = o.id join parcel_lines pl on pl.order_line_id = ol.id
     join parcels p on p.id = pl.parcel_id
     where o.workshop_id = $workshopId and o.number = any ($orders::int[]) and p.state <> 'discarded'`,
    { bind: { workshopId, orders: orders.filter(Number.isInteger) }, ...options },
  )
  const taken = await sequelize.query<{ tracking: string; number: number; parcel: string }>(
    `select tracking, number, id as parcel from parcels where workshop_id = $workshopId and tracking = any ($numbers::text[])`,
    { bind: { workshopId, numbers }, ...options },
  )
  const seen = new Set<string>()
  return lines.map((line) => {
    const row = rowOf(line, found, taken)
    if (row.mistake === null && row.tracking !== null) {
      if (seen.has(row.tracking)) return { ...row, mistake: words.twice }
      seen.add(row.tracking)
    }
    return row
  })
}

function rowOf(
  line: TrackingLine,
  found: readonly Found[],
  taken: readonly { tracking: string; number: number; parcel: string }[],
): TrackingRow {
  const empty = { line: line.line, order: line.order, tracking: null, kind: null, state: null, parcel: null }
  const left = (mistake: string): TrackingRow => ({ ...empty, mistake })
  if (line.isShifted) return left(words.shifted)
  if ([line.order, line.tracking, line.state].some((cell) => FORMULA.test(cell))) return left(words.formula)
  const own = found.filter(({ order }) => order === line.order)
  if (own.length === 0) return left(words.orderUnknown)
  const state = line.state === '' ? null : STATES.find((each) => each === line.state.toLowerCase())
  if (state === undefined) return left(words.stateUnknown(line.state))
  const read = line.tracking === '' ? null : readTracking(line.tracking)
  if (read && !read.ok) return left(words.tracking[read.reason])
  const number = read?.value.number ?? null
  const chosen = parcelFor(own, number, state)
  if (typeof chosen === 'string') return left(chosen)
  const other = taken.find((each) => each.tracking === number && each.parcel !== chosen.parcel)
  if (other) return left(words.taken(other.number))
  if (number !== null && chosen.tracking !== null && chosen.tracking !== number)
    return left(words.has(chosen.tracking))
  return {
    ...empty,
    tracking: number,
    kind: read?.value.kind ?? null,
    state,
    parcel: chosen.parcel,
    mistake: null,
  }
}

/** The parcel that has the number, else the one that could take it. */
function parcelFor(own: readonly Found[], number: string | null, state: string | null): Found | string {
  const same = number === null ? undefined : own.find(({ tracking }) => tracking === number)
  const fits = own.filter((each) => each.state === 'packed' || each.state === 'handed_over')
  const open = number === null ? fits : fits.filter(({ tracking }) => tracking === null)
  const chosen = same ?? (open.length > 0 ? open : fits)[0]
  if (!chosen) return words.noParcel
  if (!same && open.length > 1) return words.several
  if (state !== null && chosen.state === 'packed') return words.notPosted
  return chosen
}
