import 'server-only'
import { UniqueConstraintError } from 'sequelize'
import type { ModuleNewInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { modulesAdminWords } from '@/lib/messages/modules-admin'
import { Module } from '@/models'
import { recordMove } from '../_steps/record-move'

/**
 * Begins a module as a draft, with the cautions every module of its kind needs, to be changed.
 * Refuses: forbidden · invalid (slug taken in this workshop). Locks: nothing; two at once meet in the unique index.
 * Writes: module, audit. Repeat: refused by the slug.
 */
export async function createModule(cmd: {
  actor: Actor
  workshopId: string
  input: ModuleNewInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'module:create', { workshopId })) return refuse('forbidden')
  try {
    return await inTransaction(async (tx) => {
      const module = await Module.create(
        {
          ...input,
          workshopId,
          cautions: modulesAdminWords.cautionsBeginning,
          videoUrl: null,
          createdAt: now,
          publishedAt: null,
          archivedAt: null,
        },
        { transaction: tx },
      )
      await recordMove(tx, {
        workshopId,
        subjectType: 'module',
        subjectId: module.id,
        from: null,
        event: 'create',
        to: 'draft',
        byPersonId: actor.personId,
        at: now,
      })
      return ok({ module: module.slug })
    })
  } catch (error) {
    if (error instanceof UniqueConstraintError) return refuseFields({ slug: moduleMistakes.slugTaken })
    throw error
  }
}
