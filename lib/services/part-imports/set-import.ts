import 'server-only'
import type { ImportSettings } from '@/lib/contracts/part-import'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { readTable } from '@/lib/queries/part-imports/read-table'
import { PartImport } from '@/models'

/**
 * Says how a file is to be read. With another encoding or separator its columns are others, so they are found out anew.
 * Refuses: forbidden · not_found. Locks: the import. Writes: the import. Repeat: safe.
 */
export function setImport(cmd: { actor: Actor; workshopId: string; input: ImportSettings }) {
  const { actor, workshopId, input } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'part:import', { workshopId })) return refuse('forbidden')
    const row = await PartImport.findOne({
      where: { id: input.import, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!row) return refuse('not_found')
    const { encoding, delimiter } = input
    const before = readTable(row.content, row)
    const isSame = before.ok && before.value.encoding === encoding && before.value.delimiter === delimiter
    await row.update(
      { encoding, delimiter, columns: isSame ? input.columns : null, placedBy: input.placedBy },
      { transaction: tx },
    )
    return ok({ import: row.id })
  })
}
