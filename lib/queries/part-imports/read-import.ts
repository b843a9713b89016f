import 'server-only'
import type { z } from 'zod'
import {
  MOST_IMPORT_LINES,
  type Delimiter,
  type Encoding,
  type ImportKind,
  type ImportProblem,
} from '@/lib/contracts/part-import'
import type { OfferKind } from '@/lib/contracts/fields'
import { NEEDED_HEADINGS, PART_HEADINGS, PartRow, QUOTE_HEADINGS, QuoteRow } from '@/lib/contracts/parts-list'
import { matchColumns } from './match-columns'
import { readTable, type TextTable } from './read-table'

export type ReadLine<Row> = { line: number; cells: Record<string, string>; row: Row | null }

/** A file of an import as far as it can be read without the database. */
export type ReadImport = {
  encoding: Encoding
  delimiter: Delimiter
  headings: string[]
  columns: string[]
  parts: ReadLine<PartRow>[]
  quotes: ReadLine<QuoteRow>[]
  problems: ImportProblem[]
}

type Asked = {
  kind: ImportKind
  content: Buffer
  encoding: Encoding | null
  delimiter: Delimiter | null
  columns: string[] | null
  placedBy: Placers
}
type Placers = { readonly [K in OfferKind]?: string }

/** Sentences for what the file itself is, not what a cell says. */
const IMPORT_WORDS = {
  not_text: 'This file is not text. Save the list as CSV in your spreadsheet, then choose that file.',
  empty: 'There are headings at most, but no lines.',
  broken: (line: number, column: number) =>
    `Line ${line}, sign ${column}: a quotation mark does not end where the cell does.`,
  missing: (heading: string) => `No column is read as “${heading}”. Choose one.`,
  formula: 'This is a formula. Write what it comes to.',
  twice: 'This part stands in the list twice. One line per distinct part.',
  ragged: (has: number, wants: number) => `This line has ${has} cells, the headings ${wants}.`,
  tooMany: `At most ${MOST_IMPORT_LINES} lines.`,
}

/** Signs a spreadsheet begins a formula with; numbers and rails such as "-12V" are none. */
const FORMULA = /^(?:[=@]|[+-](?=[A-Za-z(]))/

const NOTHING = { headings: [], columns: [], parts: [], quotes: [] }

/** Reads a file of parts or quotes: every line that can be read, and a sentence for everything that cannot. */
export function readImport(asked: Asked): ReadImport {
  const read = readTable(asked.content, asked)
  if (!read.ok) {
    const words =
      read.reason === 'broken' ? IMPORT_WORDS.broken(read.line, read.column) : IMPORT_WORDS[read.reason]
    const problem = { line: read.reason === 'broken' ? read.line : null, column: '', words }
    const ways = { encoding: asked.encoding ?? 'utf-8', delimiter: asked.delimiter ?? 'comma' } as const
    return { ...NOTHING, ...ways, problems: [problem] }
  }
  const table = read.value
  const ours = asked.kind === 'lines' ? PART_HEADINGS : QUOTE_HEADINGS
  const columns = table.headings.map((_, i) => (asked.columns ?? matchColumns(table.headings, ours))[i] ?? '')
  const needed = asked.kind === 'lines' ? NEEDED_HEADINGS : ['code', 'supplier', 'breaks']
  const problems: ImportProblem[] = needed
    .filter((heading) => !columns.includes(heading))
    .map((heading) => ({ line: null, column: heading, words: IMPORT_WORDS.missing(heading) }))
  if (table.lines.length > MOST_IMPORT_LINES)
    problems.push({ line: null, column: '', words: IMPORT_WORDS.tooMany })
  const common = {
    encoding: table.encoding,
    delimiter: table.delimiter,
    headings: table.headings,
    columns,
    problems,
  }
  if (problems.length > 0) return { ...NOTHING, ...common }
  const cells = table.lines.map((line) => cellsOf(table, columns, line, problems))
  if (asked.kind === 'quotes')
    return { ...common, parts: [], quotes: cells.map((each) => parsed(QuoteRow, each, problems)) }
  const placed = cells.map(({ line, cells: own }) => ({ line, cells: withPlacer(own, asked.placedBy) }))
  const parts = placed.map((each) => parsed(PartRow, each, problems))
  addTwice(parts, problems)
  return { ...common, parts, quotes: [] }
}

type Cells = { line: number; cells: Record<string, string> }

function cellsOf(
  { headings }: TextTable,
  columns: readonly string[],
  { line, cells }: TextTable['lines'][number],
  problems: ImportProblem[],
): Cells {
  // Cells missing at the end are empty ones; cells too many have slipped out of their columns.
  const tooMany = cells.slice(headings.length).some((cell) => cell !== '')
  if (tooMany) problems.push({ line, column: '', words: IMPORT_WORDS.ragged(cells.length, headings.length) })
  const own: Record<string, string> = {}
  columns.forEach((column, i) => {
    if (column === '') return
    const cell = cells[i] ?? ''
    own[column] = cell
    if (FORMULA.test(cell)) problems.push({ line, column, words: IMPORT_WORDS.formula })
  })
  return { line, cells: own }
}

/** Where no offer is said at a line, the answer given for the whole file counts. */
function withPlacer(cells: Record<string, string>, placedBy: Placers): Record<string, string> {
  const says = ['boards', 'kit', 'built'].some((offer) => (cells[offer] ?? '') !== '')
  if (says) return cells
  return { ...cells, boards: placedBy.boards ?? '', kit: placedBy.kit ?? '', built: placedBy.built ?? '' }
}

function parsed<T extends z.ZodType>(
  schema: T,
  { line, cells }: Cells,
  problems: ImportProblem[],
): ReadLine<z.infer<T>> {
  const read = schema.safeParse(cells)
  if (read.success) return { line, cells, row: read.data }
  const seen = new Set<string>()
  for (const { path, message } of read.error.issues) {
    const column = path.map(String).join('.')
    if (seen.has(column)) continue
    seen.add(column)
    problems.push({ line, column, words: message })
  }
  return { line, cells, row: null }
}

function addTwice(parts: readonly ReadLine<PartRow>[], problems: ImportProblem[]): void {
  const seen = new Set<string>()
  for (const { line, row } of parts) {
    if (!row) continue
    const key = `${row.code}\n${row.choice}`
    if (seen.has(key)) problems.push({ line, column: 'code', words: IMPORT_WORDS.twice })
    seen.add(key)
  }
}
