import 'server-only'
import type { Transaction } from 'sequelize'
import type { FirstUnitInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { next, REVISION_MOVES, type RevisionEvent } from '@/lib/core/states/revision'
import { dayIn, startOfDay } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Membership, type Revision, Workshop } from '@/models'
import { lockModule, lockRevision } from '../_steps/find-module'
import { recordMove } from '../_steps/record-move'

/**
 * Records that a unit of a revision passed everything: on which day, who saw it, how it was established. With that the
 * revision is proven.
 * Refuses: not_found · forbidden · already_recorded · not_allowed (the revision was superseded) · invalid (unknown
 * revision, a day to come, somebody who does not work here). Locks: the module, the revision. Writes: revision, audit.
 * Repeat: refused as already_recorded.
 */
export function recordFirstUnit(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: FirstUnitInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'revision:prove', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!workshop || !module) return refuse('not_found')
    const revision = await lockRevision(tx, module.id, input.revision)
    if (!revision) return refuseFields({ revision: moduleMistakes.revisionUnknown })
    if (revision.firstGoodAt !== null) return refuse('already_recorded')
    if (input.on > dayIn(now, workshop.timeZone)) return refuseFields({ on: moduleMistakes.notYet })
    const by = input.by ?? actor.personId
    const works = { workshopId, personId: by, endedAt: null }
    if ((await Membership.count({ where: works, transaction: tx })) === 0)
      return refuseFields({ by: moduleMistakes.notAMember })

    const events: RevisionEvent[] = revision.state === 'draft' ? ['test', 'prove'] : ['prove']
    for (const event of events) {
      const moved = await moveRevision(tx, revision, event, actor.personId, now)
      if (!moved.ok) return moved
    }
    await revision.update(
      {
        firstGoodAt: startOfDay(input.on, workshop.timeZone),
        firstGoodByPersonId: by,
        firstGoodHow: input.how,
      },
      { transaction: tx },
    )
    return ok({ revision: revision.letter })
  })
}

async function moveRevision(
  tx: Transaction,
  revision: Revision,
  event: RevisionEvent,
  byPersonId: string,
  now: Date,
) {
  const from = revision.state
  const to = next(REVISION_MOVES, from, event)
  if (!to.ok) return to
  await revision.update({ state: to.value }, { transaction: tx })
  await recordMove(tx, {
    workshopId: revision.workshopId,
    subjectType: 'revision',
    subjectId: revision.id,
    from,
    event,
    to: to.value,
    byPersonId,
    at: now,
  })
  return to
}
