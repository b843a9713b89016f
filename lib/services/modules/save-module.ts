import 'server-only'
import type { ModuleFactsInput } from '@/lib/contracts/module-forms'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'

/**
 * Saves what a module's page says and what its front-panel drawing is made from.
 * Refuses: not_found · forbidden. Locks: the module. Writes: the module; its public page is made anew. Repeat: safe.
 */
export function saveModule(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: ModuleFactsInput
}) {
  const { actor, workshopId, input } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'module:write', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    await module.update({ ...input, videoUrl: input.videoUrl ?? null }, { transaction: tx })
    await modulePageChanged(tx, module.id)
    return ok({ module: module.slug })
  })
}
