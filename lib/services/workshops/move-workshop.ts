import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { next, WORKSHOP_MOVES } from '@/lib/core/states/workshop'
import { inTransaction } from '@/lib/db/in-transaction'
import { pageChanged } from '@/lib/db/page-changed'
import { paths } from '@/lib/paths'
import { Module, Workshop } from '@/models'
import { recordMove } from '../_steps/record-move'

/**
 * The host opens, suspends or reopens a workshop. Suspending stops new money only: refunds, cancellations, notices and
 * buyers' pages go on.
 * Refuses: not_found · forbidden · not_allowed. Locks: the workshop. Writes: its state, audit; its public pages are
 * made anew. Repeat: refused as not_allowed.
 */
export function moveWorkshop(cmd: {
  actor: Actor
  slug: string
  event: 'open' | 'suspend' | 'reopen'
  now: Date
}) {
  const { actor, slug, event, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, `workshop:${event}`)) return refuse('forbidden')
    const workshop = await Workshop.findOne({ where: { slug }, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    const from = workshop.state
    const to = next(WORKSHOP_MOVES, from, event)
    if (!to.ok) return to
    await workshop.update(
      {
        state: to.value,
        ...(event === 'open' && { openedAt: now }),
        suspendedAt: event === 'suspend' ? now : null,
      },
      { transaction: tx },
    )
    await recordMove(tx, {
      workshopId: workshop.id,
      subjectType: 'workshop',
      subjectId: workshop.id,
      from,
      event,
      to: to.value,
      byPersonId: actor.personId,
      at: now,
    })
    const modules = await Module.findAll({
      where: { workshopId: workshop.id },
      attributes: ['slug'],
      transaction: tx,
    })
    for (const module of modules) await pageChanged(tx, paths.module(slug, module.slug))
    await pageChanged(tx, paths.workshop(slug))
    await pageChanged(tx, paths.home)
    return ok({ workshop: slug, state: to.value })
  })
}
