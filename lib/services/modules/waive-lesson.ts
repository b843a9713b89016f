import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Lesson } from '@/models'
import { lockModule } from '../_steps/find-module'

/**
 * Decides to live with a lesson, with the reason.
 * Refuses: not_found · forbidden · already_mended (or waived). Locks: the module, the lesson. Writes: lesson.
 * Repeat: refused.
 */
export function waiveLesson(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: { lesson: string; reason: string }
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'lesson:waive', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    const lesson =
      module &&
      (await Lesson.findOne({
        where: { id: input.lesson, moduleId: module.id },
        transaction: tx,
        lock: tx.LOCK.UPDATE,
      }))
    if (!lesson) return refuse('not_found')
    if (lesson.mendedInRevisionId !== null || lesson.waivedAt !== null) return refuse('already_mended')
    await lesson.update(
      { waivedAt: now, waivedByPersonId: actor.personId, waivedReason: input.reason },
      { transaction: tx },
    )
    return ok({ lesson: lesson.id })
  })
}
