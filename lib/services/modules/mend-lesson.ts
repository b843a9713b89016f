import 'server-only'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Lesson, Revision } from '@/models'
import { lockModule, lockRevision } from '../_steps/find-module'

/**
 * Says which later revision mends a lesson. A waived lesson may still be mended; that counts more.
 * Refuses: not_found · forbidden · already_mended · invalid (unknown revision, or not a later one). Locks: the module,
 * the lesson. Writes: lesson. Repeat: safe for the same revision.
 */
export function mendLesson(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: { lesson: string; revision: string }
}) {
  const { actor, workshopId, input } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'lesson:mend', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    const lesson =
      module &&
      (await Lesson.findOne({
        where: { id: input.lesson, moduleId: module.id },
        transaction: tx,
        lock: tx.LOCK.UPDATE,
      }))
    if (!module || !lesson) return refuse('not_found')
    const mends = await lockRevision(tx, module.id, input.revision)
    if (!mends) return refuseFields({ revision: moduleMistakes.revisionUnknown })
    if (lesson.mendedInRevisionId === mends.id) return ok({ lesson: lesson.id })
    if (lesson.mendedInRevisionId !== null) return refuse('already_mended')
    const found = await Revision.findByPk(lesson.foundOnRevisionId, { transaction: tx, rejectOnEmpty: true })
    if (!isLater(mends.letter, found.letter)) return refuseFields({ revision: moduleMistakes.mendedBefore })
    await lesson.update({ mendedInRevisionId: mends.id }, { transaction: tx })
    return ok({ lesson: lesson.id })
  })
}

/** B after A, AA after Z. */
const isLater = (letter: string, than: string) =>
  letter.length === than.length ? letter > than : letter.length > than.length
