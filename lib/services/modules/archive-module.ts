import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { MODULE_MOVES, next } from '@/lib/core/states/module'
import { inTransaction } from '@/lib/db/in-transaction'
import { pageChanged } from '@/lib/db/page-changed'
import { paths } from '@/lib/paths'
import { Run } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'
import { recordMove } from '../_steps/record-move'

/**
 * Takes a published module off the public pages. Buyers keep their own pages.
 * Refuses: not_found · forbidden · not_allowed · run_in_progress (taking deposits or locked). Locks: the module.
 * Writes: state, audit; public pages are made anew. Repeat: refused as not_allowed.
 */
export function archiveModule(cmd: { actor: Actor; workshopId: string; module: string; now: Date }) {
  const { actor, workshopId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'module:archive', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const from = module.state
    const to = next(MODULE_MOVES, from, 'archive')
    if (!to.ok) return to
    const going = { moduleId: module.id, state: ['taking_deposits', 'locked'] }
    if ((await Run.count({ where: going, transaction: tx })) > 0) return refuse('run_in_progress')
    await module.update({ state: to.value, archivedAt: now }, { transaction: tx })
    await recordMove(tx, {
      workshopId,
      subjectType: 'module',
      subjectId: module.id,
      from,
      event: 'archive',
      to: to.value,
      byPersonId: actor.personId,
      at: now,
    })
    await modulePageChanged(tx, module.id)
    await pageChanged(tx, paths.home)
    return ok({ module: module.slug, state: to.value })
  })
}
