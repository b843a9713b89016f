import 'server-only'
import type { Transaction } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { checkImport } from '@/lib/queries/part-imports/check-import'
import { listAnswers } from '@/lib/queries/part-imports/list-answers'
import { readImport, type ReadImport } from '@/lib/queries/part-imports/read-import'
import { Module, Part, PartImport, Revision } from '@/models'
import { inChunks } from '../_steps/in-chunks'
import { refreshPlanParts } from '../_steps/refresh-plan-parts'
import { writeParts } from '../_steps/write-parts'
import { writeQuotes } from '../_steps/write-quotes'

/**
 * Saves a file of parts or quotes as it was shown: the list of a revision is replaced, or quotes are added to parts.
 * Refuses: forbidden · not_found (confirmed already, or thrown away) · import_has_mistakes. Locks: the import, the module, the
 * revision. Writes: lines, parts, quotes, alternates, the base plan's parts; the import goes. Repeat: not_found.
 */
export function confirmImport(cmd: { actor: Actor; workshopId: string; importId: string; now: Date }) {
  const { actor, workshopId, importId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'part:import', { workshopId })) return refuse('forbidden')
    const held = { transaction: tx, lock: tx.LOCK.UPDATE }
    const row = await PartImport.findOne({ where: { id: importId, workshopId }, ...held })
    if (!row) return refuse('not_found')
    const revision = await Revision.findOne({ where: { id: row.revisionId }, ...held, rejectOnEmpty: true })
    const module = await Module.findOne({ where: { id: revision.moduleId }, ...held, rejectOnEmpty: true })
    const read = readImport(row)
    const checked = await checkImport({ workshopId, moduleId: module.id, read })
    if (read.problems.length + checked.problems.length > 0) return refuse('import_has_mistakes')
    const rows = read.parts.flatMap(({ row: each }) => (each ? [each] : []))
    if (row.kind === 'lines') {
      const answers = await listAnswers(module.id, tx)
      await writeParts(tx, { revision, rows, answers, now })
    } else await addQuotes(tx, workshopId, read)
    await refreshPlanParts(tx, { moduleId: module.id, byPersonId: actor.personId, now })
    await row.destroy({ transaction: tx })
    return ok({ module: module.slug, revision: revision.letter, lines: rows.length + read.quotes.length })
  })
}

async function addQuotes(tx: Transaction, workshopId: string, { quotes }: ReadImport): Promise<void> {
  const rows = quotes.flatMap(({ row }) => (row ? [row] : []))
  const ids = new Map<string, string>()
  for (const some of inChunks(rows)) {
    const found = await Part.findAll({
      where: { workshopId, code: some.map(({ code }) => code) },
      attributes: ['id', 'code'],
      transaction: tx,
    })
    for (const { id, code } of found) ids.set(code, id)
  }
  const known = rows.flatMap(({ code, quote }) => {
    const partId = ids.get(code)
    return partId ? [{ partId, quote }] : []
  })
  await writeQuotes(tx, workshopId, known)
}
