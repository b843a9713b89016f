import 'server-only'
import { Op } from 'sequelize'
import type { ImportStart } from '@/lib/contracts/part-import'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { importWords } from '@/lib/messages/part-imports'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { PartImport } from '@/models'
import { lockModule, lockRevision } from '../_steps/find-module'

const KEPT_MS = 24 * 3_600_000
/** A built unit is assembled by the maker and a kit by its buyer unless the file or the owner says otherwise. */
const USUAL = { boards: '', kit: 'buyer', built: 'maker' }

/**
 * Takes in a file of parts or quotes, or a pasted text, to be looked at; nothing of it is saved yet. Files of the workshop
 * older than a day are thrown away.
 * Refuses: forbidden · not_found · invalid (nothing sent, unknown revision). Locks: the module, the revision. Writes: the
 * import. Repeat: another import.
 */
export function startImport(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: ImportStart
  file: { name: string; content: Buffer } | null
  now: Date
}) {
  const { actor, workshopId, input, file, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'part:import', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const revision = await lockRevision(tx, module.id, input.revision)
    if (!revision) return refuseFields({ revision: moduleMistakes.revisionUnknown })
    const content = file && file.content.length > 0 ? file.content : Buffer.from(input.text, 'utf8')
    if (content.length === 0) return refuseFields({ text: importWords.nothing })
    await PartImport.destroy({
      where: { workshopId, createdAt: { [Op.lt]: new Date(now.getTime() - KEPT_MS) } },
      transaction: tx,
    })
    const row = await PartImport.create(
      {
        workshopId,
        revisionId: revision.id,
        kind: input.kind,
        fileName: (file && file.content.length > 0 ? file.name : '').slice(0, 200),
        content,
        encoding: null,
        delimiter: null,
        columns: null,
        placedBy: input.kind === 'lines' ? USUAL : {},
        createdAt: now,
        createdByPersonId: actor.personId,
      },
      { transaction: tx },
    )
    return ok({ import: row.id, revision: revision.letter })
  })
}
