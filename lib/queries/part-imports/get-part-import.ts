import 'server-only'
import type { ImportPreview } from '@/lib/contracts/part-import'
import { PART_HEADINGS, QUOTE_HEADINGS } from '@/lib/contracts/parts-list'
import { can, type Actor } from '@/lib/core/policy/can'
import { Module, PartImport, Revision } from '@/models'
import { changesOf } from './changes-of'
import { checkImport } from './check-import'
import { readImport } from './read-import'
import { decodeText } from './read-table'

/** Lines shown from the top; those with something wrong are shown wherever they stand, up to the second number. */
const SHOWN = 30
const SHOWN_WRONG = 200

/** Longer texts are mended in the program they come from. */
const MOST_MENDED = 300_000

type Asked = { actor: Actor; workshopId: string; module: string; id: string }

/**
 * A file of parts or quotes as it would be saved: how it is read, what is wrong at which line, what the check finds, and
 * what would change. Null when there is none to see. A bounded number of queries, whatever its length.
 */
export async function getPartImport({ actor, workshopId, module, id }: Asked): Promise<ImportPreview | null> {
  if (!can(actor, 'part:import', { workshopId })) return null
  const row = await PartImport.findOne({ where: { id, workshopId } })
  const revision = row && (await Revision.findOne({ where: { id: row.revisionId, workshopId } }))
  const owner = revision && (await Module.findOne({ where: { id: revision.moduleId, slug: module } }))
  if (!row || !revision || !owner) return null
  const read = readImport(row)
  const checked = await checkImport({ workshopId, moduleId: owner.id, read })
  const { changes, unchanged } =
    row.kind === 'lines' ? await changesOf(revision.id, read.parts) : { changes: [], unchanged: 0 }
  const lines = row.kind === 'lines' ? read.parts : read.quotes
  const problems = [...read.problems, ...checked.problems]
  const wrong = new Map<number, string[]>()
  for (const { line, column, words } of problems)
    if (line !== null)
      wrong.set(line, [...(wrong.get(line) ?? []), column === '' ? words : `${column}: ${words}`])
  const noted = new Set(checked.findings.map(({ line }) => line))
  const shownHeadings = read.columns.filter((column) => column !== '')
  return {
    id,
    kind: row.kind,
    revision: revision.letter,
    text: textOf(row.content, read.encoding),
    fileName: row.fileName,
    encoding: read.encoding,
    delimiter: read.delimiter,
    columns: read.headings.map((heading, i) => ({
      heading,
      as: read.columns[i] ?? '',
      example: lines[0]?.cells[read.columns[i] ?? ''] ?? '',
    })),
    headings: row.kind === 'lines' ? PART_HEADINGS : QUOTE_HEADINGS,
    placedBy: row.placedBy,
    lines: lines.length,
    shownHeadings,
    shown: lines
      .filter(({ line }, i) => i < SHOWN || wrong.has(line) || noted.has(line))
      .slice(0, SHOWN_WRONG)
      .map(({ line, cells }) => ({
        line,
        cells: shownHeadings.map((heading) => cells[heading] ?? ''),
        words: wrong.get(line) ?? [],
      })),
    problems,
    findings: checked.findings,
    changes,
    unchanged,
  }
}

function textOf(content: Buffer, encoding: ImportPreview['encoding']): string {
  const decoded = decodeText(content, encoding)
  return decoded.ok && decoded.value.text.length <= MOST_MENDED ? decoded.value.text : ''
}
