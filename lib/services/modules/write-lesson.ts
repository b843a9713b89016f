import 'server-only'
import type { LessonInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Lesson } from '@/models'
import { lockModule, lockRevision } from '../_steps/find-module'

/**
 * Writes down a fault or improvement learned on a revision.
 * Refuses: not_found · forbidden · invalid (unknown revision). Locks: the module. Writes: lesson. Repeat: a second lesson.
 */
export function writeLesson(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: LessonInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'lesson:write', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const { revision: letter, ...words } = input
    const revision = await lockRevision(tx, module.id, letter)
    if (!revision) return refuseFields({ revision: moduleMistakes.revisionUnknown })
    const lesson = await Lesson.create(
      {
        workshopId,
        moduleId: module.id,
        foundOnRevisionId: revision.id,
        ...words,
        createdAt: now,
        createdByPersonId: actor.personId,
        mendedInRevisionId: null,
        waivedAt: null,
        waivedByPersonId: null,
        waivedReason: null,
      },
      { transaction: tx },
    )
    return ok({ lesson: lesson.id })
  })
}
