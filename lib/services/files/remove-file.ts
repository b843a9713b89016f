import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { StoredFile } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'

/**
 * Takes a file away; its bytes stay for the papers and mails that name them.
 * Refuses: forbidden · not_found (removed already). Locks: the module. Writes: the file; the module's page is made anew.
 * Repeat: not_found.
 */
export function removeFile(cmd: {
  actor: Actor
  workshopId: string
  module: string
  file: string
  now: Date
}) {
  const { actor, workshopId, file, now } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'file:remove', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const [gone] = await StoredFile.update(
      { erasedAt: now },
      { where: { id: file, workshopId, erasedAt: null }, transaction: tx },
    )
    if (gone === 0) return refuse('not_found')
    await modulePageChanged(tx, module.id)
    return ok({ file })
  })
}
