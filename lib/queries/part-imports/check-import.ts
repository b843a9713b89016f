import 'server-only'
import { QueryTypes } from 'sequelize'
import type { ImportPreview, ImportProblem } from '@/lib/contracts/part-import'
import { lintParts } from '@/lib/core/parts/lint'
import { sequelize } from '@/lib/db/sequelize'
import { listAnswers } from './list-answers'
import type { ReadImport } from './read-import'

/** Sentences for what only the workshop's own parts and choices can say. */
const WORDS = {
  noPart: 'You have no part of this code. Import the parts list first.',
  noAnswer: 'No choice of this module has such an answer.',
}

type Known = { code: string; quotes: number; alternates: number }

/**
 * What can be said of a file against the workshop's own parts and choices, and what the parts list check finds, each at its
 * line. Two queries.
 */
export async function checkImport({
  workshopId,
  moduleId,
  read,
}: {
  workshopId: string
  moduleId: string
  read: ReadImport
}): Promise<{ problems: ImportProblem[]; findings: ImportPreview['findings'] }> {
  const codes = [...read.parts, ...read.quotes].flatMap(({ row }) => (row ? [row.code] : []))
  const known = new Map((await knownParts(workshopId, codes)).map((part) => [part.code, part]))
  const answers = await listAnswers(moduleId)
  const problems = [
    ...read.quotes
      .filter(({ row }) => row && !known.has(row.code))
      .map(({ line }) => ({ line, column: 'code', words: WORDS.noPart })),
    ...read.parts
      .filter(({ row }) => row && row.choice !== '' && !answers.has(row.choice.toLowerCase()))
      .map(({ line }) => ({ line, column: 'choice', words: WORDS.noAnswer })),
  ]
  return { problems, findings: findingsOf(read, known) }
}

function findingsOf({ parts }: ReadImport, known: ReadonlyMap<string, Known>): ImportPreview['findings'] {
  const readable = parts.flatMap(({ line, row }) => (row ? [{ line, row }] : []))
  const codeAt = new Map(readable.map(({ line, row }) => [String(line), row.code]))
  return lintParts(
    readable.map(({ line, row }) => ({
      id: String(line),
      designators: row.designators,
      quantity: row.perUnit,
      value: row.value,
      description: row.description,
      neededFor: Object.keys(row.placedBy),
      quotes: row.quote ? 1 : (known.get(row.code)?.quotes ?? 0),
      alternates: row.alternates.length + (known.get(row.code)?.alternates ?? 0),
      lifecycle: row.lifecycle,
      supplyPins: row.supplyPins,
      polarityNote: row.polarityNote,
    })),
  ).map(({ line, ...rest }) => ({
    line: line === null ? null : Number(line),
    code: line === null ? null : (codeAt.get(line) ?? null),
    ...rest,
  }))
}

async function knownParts(workshopId: string, codes: string[]): Promise<Known[]> {
  return sequelize.query<Known>(
    `select p.code, (select count(*)::int from quotes q where q.part_id = p.id) as quotes,
            (select count(*)::int from part_alternates a where a.part_id = p.id) as alternates
     from parts p where p.workshop_id = $workshopId
       and p.code in (select jsonb_array_elements_text($codes::jsonb))`,
    { bind: { workshopId, codes: JSON.stringify(codes) }, type: QueryTypes.SELECT },
  )
}
