import 'server-only'
import { QueryTypes } from 'sequelize'
import type { ImportChange } from '@/lib/contracts/part-import'
import type { PartRow } from '@/lib/contracts/parts-list'
import { writeShare } from '@/lib/core/plain/share'
import { sequelize } from '@/lib/db/sequelize'
import type { ReadLine } from './read-import'

type Row = {
  code: string
  choice: string
  perUnit: number
  designators: string
  value: string
  description: string
  placedBy: Record<string, string>
  lifecycle: string
  needsSample: boolean
  basisPoints: number
  atLeast: number
}
type Fields = Record<string, string>

const placed = (by: Record<string, string | undefined>) =>
  Object.entries(by)
    .map(([offer, who]) => `${offer}: ${who ?? ''}`)
    .sort()
    .join(', ')

/** What a new list would add to a revision's list, take from it and change in it, in the order of the new one. One query. */
export async function changesOf(
  revisionId: string,
  parts: readonly ReadLine<PartRow>[],
): Promise<{ changes: ImportChange[]; unchanged: number }> {
  const now = await sequelize.query<Row>(
    `select p.code, coalesce(a.label, '') as choice, l.per_unit as "perUnit", l.designators, p.value,
            p.description, l.placed_by as "placedBy", p.lifecycle, p.needs_sample as "needsSample",
            l.attrition_basis_points as "basisPoints", l.attrition_at_least as "atLeast"
     from revision_lines l join parts p on p.id = l.part_id left join choice_answers a on a.id = l.choice_answer_id
     where l.revision_id = $revisionId order by l.position`,
    { bind: { revisionId }, type: QueryTypes.SELECT },
  )
  const before = new Map(now.map((row) => [keyOf(row), fieldsOfLine(row)]))
  const after = new Map(parts.flatMap(({ row }) => (row ? [[keyOf(row), fieldsOfRow(row)] as const] : [])))
  const changes: ImportChange[] = []
  let unchanged = 0
  for (const [key, fields] of after) {
    const old = before.get(key)
    const differing = old ? differences(old, fields) : []
    if (old && differing.length === 0) unchanged += 1
    else changes.push({ code: codeOf(key), what: old ? 'changed' : 'added', fields: differing })
  }
  for (const key of before.keys())
    if (!after.has(key)) changes.push({ code: codeOf(key), what: 'removed', fields: [] })
  return { changes, unchanged }
}

const keyOf = ({ code, choice }: { code: string; choice: string }) => `${code}\n${choice.toLowerCase()}`
const codeOf = (key: string) => key.split('\n')[0]!

const fieldsOfLine = (row: Row): Fields => ({
  ...{ per_unit: String(row.perUnit), designators: row.designators, value: row.value },
  ...{ description: row.description, placed: placed(row.placedBy), lifecycle: row.lifecycle },
  needs_sample: row.needsSample ? 'yes' : 'no',
  attrition: `${writeShare(row.basisPoints)} %, ${row.atLeast}`,
})

const fieldsOfRow = (row: PartRow): Fields => ({
  ...{ per_unit: String(row.perUnit), designators: row.designators, value: row.value },
  ...{ description: row.description, placed: placed(row.placedBy), lifecycle: row.lifecycle },
  needs_sample: row.needsSample ? 'yes' : 'no',
  attrition: `${writeShare(row.attritionBasisPoints)} %, ${row.attritionAtLeast}`,
})

const differences = (before: Fields, after: Fields) =>
  Object.keys(after)
    .filter((name) => before[name] !== after[name])
    .map((name) => ({ name, before: before[name] ?? '', after: after[name] ?? '' }))
