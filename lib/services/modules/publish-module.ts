import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { MODULE_MOVES, next } from '@/lib/core/states/module'
import { inTransaction } from '@/lib/db/in-transaction'
import { pageChanged } from '@/lib/db/page-changed'
import { paths } from '@/lib/paths'
import { type Module, Offer, Workshop } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'
import { recordMove } from '../_steps/record-move'

type Missing =
  | 'workshop_pending'
  | 'workshop_suspended'
  | 'one_line_missing'
  | 'cautions_missing'
  | 'offers_missing'
  | 'postal_address_missing'

/**
 * Publishes a module, or an archived one again: its page can be read and interest registered.
 * Refuses: not_found · forbidden · not_allowed · workshop_pending · workshop_suspended · one_line_missing ·
 * cautions_missing · offers_missing · postal_address_missing. Locks: the module. Writes: state, audit; the module's,
 * the workshop's and the first page are made anew. Repeat: safe; published stays published.
 */
export function publishModule(cmd: { actor: Actor; workshopId: string; module: string; now: Date }) {
  const { actor, workshopId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'module:publish', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.SHARE })
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!workshop || !module) return refuse('not_found')
    const from = module.state
    if (from === 'published') return ok({ module: module.slug, state: from })
    const offers = await Offer.count({ where: { moduleId: module.id, withdrawnAt: null }, transaction: tx })
    const complete = mayPublish(workshop, module, offers)
    if (!complete.ok) return complete
    const to = next(MODULE_MOVES, from, 'publish')
    if (!to.ok) return to
    await module.update(
      { state: to.value, publishedAt: module.publishedAt ?? now, archivedAt: null },
      { transaction: tx },
    )
    await recordMove(tx, {
      workshopId,
      subjectType: 'module',
      subjectId: module.id,
      from,
      event: 'publish',
      to: to.value,
      byPersonId: actor.personId,
      at: now,
    })
    await modulePageChanged(tx, module.id)
    await pageChanged(tx, paths.home)
    return ok({ module: module.slug, state: to.value })
  })
}

/** What must stand on a page before anyone reads it. */
function mayPublish(workshop: Workshop, module: Module, offers: number): Result<true, Missing> {
  if (workshop.state === 'pending') return refuse('workshop_pending')
  if (workshop.state === 'suspended') return refuse('workshop_suspended')
  if (module.oneLine.trim() === '') return refuse('one_line_missing')
  if (module.cautions.trim() === '') return refuse('cautions_missing')
  if (offers === 0) return refuse('offers_missing')
  return workshop.postalAddress === null ? refuse('postal_address_missing') : ok(true)
}
