import 'server-only'
import { CsvError, parse } from 'csv-parse/sync'
import type { Delimiter, Encoding } from '@/lib/contracts/part-import'
import { ok, refuse, type Result } from '@/lib/core/result'

/** A text table: its headings and lines, each with the line it begins on in the file. */
export type TextTable = {
  encoding: Encoding
  delimiter: Delimiter
  headings: string[]
  lines: { line: number; cells: string[] }[]
}

/** Where a file stops being a table. */
export type BrokenTable = {
  ok: false
  reason: 'not_text' | 'empty' | 'broken'
  line: number
  column: number
}

const SIGNS: Readonly<Record<Delimiter, string>> = { comma: ',', semicolon: ';', tab: '\t', pipe: '|' }
/** Lines looked at to find out what separates the cells. */
const LOOKED_AT = 20

/**
 * Bytes as text: by the mark at their beginning, else as UTF-8 where they are that, else as Windows-1252.
 * Refuses: not_text, where more than one sign in a hundred is none that is ever typed.
 */
export function decodeText(
  content: Buffer,
  asked: Encoding | null,
): Result<{ text: string; encoding: Encoding }, 'not_text'> {
  const encoding = asked ?? encodingOf(content)
  const text = new TextDecoder(encoding).decode(content).replace(/^\uFEFF/, '')
  const odd = text.match(/[\u0000-\u0008\u000E-\u001F\uFFFD]/g)?.length ?? 0
  return odd * 100 > text.length ? refuse('not_text') : ok({ text, encoding })
}

function encodingOf(content: Buffer): Encoding {
  if (content[0] === 0xff && content[1] === 0xfe) return 'utf-16le'
  if (content[0] === 0xfe && content[1] === 0xff) return 'utf-16be'
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(content)
    return 'utf-8'
  } catch {
    return 'windows-1252'
  }
}

/** What separates the cells: the sign that gives the most columns to most lines. */
export function delimiterOf(text: string): Delimiter {
  const first = text.split(/\r?\n/, LOOKED_AT).join('\n')
  const scored = (Object.keys(SIGNS) as Delimiter[]).map((delimiter) => {
    const widths = widthsOf(first, SIGNS[delimiter])
    const [heading = 0] = widths
    const alike = widths.filter((width) => width === heading).length
    return { delimiter, score: heading < 2 ? 0 : heading * (alike / widths.length) }
  })
  return scored.reduce((best, each) => (each.score > best.score ? each : best)).delimiter
}

function widthsOf(text: string, sign: string): number[] {
  try {
    const rows = parse(text, { delimiter: sign, relax_column_count: true, relax_quotes: true })
    return rows.map((row) => row.length)
  } catch {
    // A quoted cell cut off by the end of what is looked at; the headings still tell the signs apart.
    return [(text.split('\n', 1)[0] ?? '').split(sign).length]
  }
}

/**
 * A file as a table, its first line being the headings. What is asked for is taken, the rest found out.
 * Refuses: not_text · empty (no line beneath the headings) · broken, with line and column.
 */
export function readTable(
  content: Buffer,
  asked: { encoding: Encoding | null; delimiter: Delimiter | null },
): { ok: true; value: TextTable } | BrokenTable {
  const decoded = decodeText(content, asked.encoding)
  if (!decoded.ok) return { ok: false, reason: 'not_text', line: 1, column: 1 }
  const { text, encoding } = decoded.value
  const delimiter = asked.delimiter ?? delimiterOf(text)
  try {
    const rows = parse(text, {
      delimiter: SIGNS[delimiter],
      trim: true,
      info: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      relax_column_count: true,
    }) as unknown as { record: string[]; info: { lines: number } }[]
    const [head, ...lines] = rows
    if (!head || lines.length === 0) return { ok: false, reason: 'empty', line: 1, column: 1 }
    return {
      ok: true,
      value: {
        encoding,
        delimiter,
        headings: head.record,
        lines: lines.map(({ record, info }) => ({ line: info.lines, cells: record })),
      },
    }
  } catch (error) {
    if (!(error instanceof CsvError)) throw error
    const { lines = 1, column = 0 } = error as unknown as { lines?: number; column?: number | string }
    return { ok: false, reason: 'broken', line: lines, column: typeof column === 'number' ? column + 1 : 1 }
  }
}
