import 'server-only'
import type { Transaction } from 'sequelize'
import type { PartRow } from '@/lib/contracts/parts-list'
import { Part, PartAlternate, type Revision, RevisionLine } from '@/models'
import { inChunks } from './in-chunks'
import { writeQuotes } from './write-quotes'

const SAID = ['description', 'value', 'lifecycle', 'needsSample', 'polarityNote'] as const

/**
 * Replaces a revision's parts list by the lines given. Parts are the workshop's and found by their code: what the list says
 * of them is taken over. `answers` names the answers of choices by their label in small letters.
 * Locks: nothing; the caller holds the revision. Writes: lines, parts, quotes, alternates. Repeat: safe.
 * A bounded number of statements per 500 lines.
 */
export async function writeParts(
  tx: Transaction,
  given: {
    revision: Revision
    rows: readonly PartRow[]
    answers: ReadonlyMap<string, string>
    now: Date
  },
): Promise<void> {
  const { revision, rows, answers, now } = given
  const { workshopId, id: revisionId } = revision
  await RevisionLine.destroy({ where: { revisionId }, transaction: tx })
  const ids = await writeThem(tx, workshopId, rows, now)
  const idOf = (code: string) => ids.get(code)!
  const lines = rows.map((row, position) => ({
    ...{ workshopId, revisionId, partId: idOf(row.code), position },
    ...{ designators: row.designators, perUnit: row.perUnit, placedBy: row.placedBy },
    choiceAnswerId: row.choice === '' ? null : (answers.get(row.choice.toLowerCase()) ?? null),
    ...{ attritionBasisPoints: row.attritionBasisPoints, attritionAtLeast: row.attritionAtLeast },
    supplyPins: row.supplyPins,
  }))
  for (const some of inChunks(lines)) await RevisionLine.bulkCreate(some, { transaction: tx })
  await writeQuotes(
    tx,
    workshopId,
    rows.flatMap(({ code, quote }) => (quote ? [{ partId: idOf(code), quote }] : [])),
  )
  await writeAlternates(tx, workshopId, rows, ids)
}

async function writeThem(
  tx: Transaction,
  workshopId: string,
  rows: readonly PartRow[],
  now: Date,
): Promise<Map<string, string>> {
  const distinct = [...new Map(rows.map((row) => [row.code, row])).values()]
  const ids = new Map<string, string>()
  for (const some of inChunks(distinct)) {
    await Part.bulkCreate(
      some.map(({ code, description, value, lifecycle, needsSample, polarityNote }) => ({
        ...{ workshopId, code, description, value, lifecycle, needsSample, polarityNote },
        ...{ sampleCheckedOn: null, sampleFits: null, sampleNote: null, sampleByPersonId: null },
        createdAt: now,
      })),
      { updateOnDuplicate: [...SAID], conflictAttributes: ['workshopId', 'code'], transaction: tx },
    )
    const found = await Part.findAll({
      where: { workshopId, code: some.map(({ code }) => code) },
      attributes: ['id', 'code'],
      transaction: tx,
    })
    for (const { id, code } of found) ids.set(code, id)
  }
  return ids
}

/** Alternates that are named and known; one that is neither in the list nor among the workshop's parts is left out. */
async function writeAlternates(
  tx: Transaction,
  workshopId: string,
  rows: readonly PartRow[],
  ids: ReadonlyMap<string, string>,
): Promise<void> {
  const named = rows.flatMap(({ code, alternates }) => alternates.map((alternate) => ({ code, alternate })))
  if (named.length === 0) return
  const others = await Part.findAll({
    where: { workshopId, code: named.map(({ alternate }) => alternate) },
    attributes: ['id', 'code'],
    transaction: tx,
  })
  const idOf = new Map(others.map(({ id, code }) => [code, id]))
  const pairs = named.flatMap(({ code, alternate }) => {
    const [partId, alternateId] = [ids.get(code)!, idOf.get(alternate)]
    return alternateId && alternateId !== partId ? [{ workshopId, partId, alternateId }] : []
  })
  for (const some of inChunks(pairs))
    await PartAlternate.bulkCreate(some, { ignoreDuplicates: true, transaction: tx })
}
