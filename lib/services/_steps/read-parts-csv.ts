import 'server-only'
import { CsvError, parse } from 'csv-parse/sync'
import { NEEDED_HEADINGS, PartRow } from '@/lib/contracts/parts-list'
import { ok, refuse, type Result } from '@/lib/core/result'
import { moduleMistakes } from '@/lib/messages/module-mistakes'

const words = moduleMistakes.csv
const DELIMITERS = ['\t', ';', ',']

type Line = { record: Record<string, string>; info: { lines: number } }

/**
 * A pasted parts list as lines, or the first sentence about what is wrong with it. The separator is whichever stands
 * most often in the headings.
 * Refuses: with a sentence that names line and heading. Writes: nothing.
 */
export function readPartsCsv(csv: string): Result<PartRow[], string> {
  const read = recordsOf(csv)
  if (!read.ok) return read
  const [first] = read.value
  if (!first) return refuse(words.empty)
  const missing = NEEDED_HEADINGS.filter((name) => !Object.hasOwn(first.record, name))
  if (missing.length > 0) return refuse(words.heading(missing.join(', ')))
  const rows: PartRow[] = []
  for (const { record, info } of read.value) {
    const row = PartRow.safeParse(record)
    if (!row.success) {
      const issue = row.error.issues[0]
      return refuse(words.line(info.lines, issue?.path.join('.') ?? '', issue?.message ?? ''))
    }
    if (rows.some(({ code }) => code === row.data.code))
      return refuse(words.line(info.lines, 'code', words.twice))
    rows.push(row.data)
  }
  return ok(rows)
}

function recordsOf(csv: string): Result<Line[], string> {
  const headings = csv.trimStart().split('\n', 1)[0] ?? ''
  const counted = DELIMITERS.map((sign) => ({ sign, count: headings.split(sign).length }))
  const delimiter = counted.reduce((most, each) => (each.count > most.count ? each : most)).sign
  try {
    const lines = parse(csv, {
      delimiter,
      bom: true,
      trim: true,
      info: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      relax_column_count: true,
      columns: (names: string[]) =>
        names.map((name) =>
          name
            .trim()
            .toLowerCase()
            .replaceAll(/[\s-]+/g, '_'),
        ),
    })
    return ok(lines as unknown as Line[])
  } catch (error) {
    if (error instanceof CsvError) return refuse(words.unreadable)
    throw error
  }
}
