import 'server-only'
import { CsvError, parse } from 'csv-parse/sync'
import { ok, refuse, type Result } from '@/lib/core/result'
import { postMistakes as words } from '@/lib/messages/post'

export type TrackingLine = {
  line: number
  order: string
  tracking: string
  state: string
  /** A line whose cells do not stand under their headings. */
  isShifted: boolean
}

const DELIMITERS = ['\t', ';', ',']
const HEADINGS = {
  order: /^(order|order[ _-]?(no|number|id)?|reference|ref)\.?$/i,
  tracking: /^(tracking|tracking[ _-]?(no|number|code|id)?|barcode|item[ _-]?(no|number|id)?)\.?$/i,
  state: /^(state|status)$/i,
}

/**
 * A carrier's list as lines of order, tracking number and state; which column is which is read from the headings, the
 * separator from how often it stands there.
 * Refuses: with a sentence: nothing below the headings, not a table, no column of orders, neither numbers nor states.
 */
export function readTrackingCsv(csv: string): Result<TrackingLine[], string> {
  const first = csv.trimStart().split('\n', 1)[0] ?? ''
  const delimiter = DELIMITERS.map((sign) => ({ sign, count: first.split(sign).length })).reduce(
    (most, each) => (each.count > most.count ? each : most),
  ).sign
  let table: string[][]
  try {
    table = parse(csv, {
      ...{ delimiter, bom: true, trim: true, skip_empty_lines: true },
      relax_column_count: true,
      relax_quotes: true,
    })
  } catch (error) {
    if (error instanceof CsvError) return refuse(words.unreadable(Number(error.lines ?? 1)))
    throw error
  }
  const [headings = [], ...rows] = table
  if (rows.length === 0) return refuse(words.empty)
  const at = (what: keyof typeof HEADINGS) => headings.findIndex((heading) => HEADINGS[what].test(heading))
  const [order, tracking, state] = [at('order'), at('tracking'), at('state')]
  if (order < 0) return refuse(words.noOrder)
  if (tracking < 0 && state < 0) return refuse(words.nothing)
  return ok(
    rows.map((cells, i) => ({
      line: i + 2,
      order: cells[order] ?? '',
      tracking: cells[tracking] ?? '',
      state: cells[state] ?? '',
      isShifted: cells.length !== headings.length,
    })),
  )
}
