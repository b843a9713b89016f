import 'server-only'
import { UniqueConstraintError } from 'sequelize'
import { refuseFields } from '@/lib/contracts/problem'
import type { WorkshopInput } from '@/lib/contracts/workshops'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { workshopWords } from '@/lib/messages/workshops'
import { Membership, Workshop } from '@/models'
import { recordMove } from '../_steps/record-move'

/**
 * Starts a workshop as pending, with whoever starts it as its owner; the host opens it.
 * Refuses: forbidden · invalid (slug taken). Locks: nothing; two at once meet in the unique index.
 * Writes: workshop, membership, audit. Repeat: refused by the slug.
 */
export async function startWorkshop(cmd: { actor: Actor; input: WorkshopInput; now: Date }) {
  const { actor, input, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'workshop:start')) return refuse('forbidden')
  try {
    return await inTransaction(async (tx) => {
      const workshop = await Workshop.create(
        {
          ...input,
          taxNote: null,
          taxNumber: null,
          postalAddress: null,
          phone: null,
          providerAccountId: null,
          chargesEnabledAt: null,
          payoutsManualAt: null,
          createdAt: now,
          createdByPersonId: actor.personId,
          openedAt: null,
          suspendedAt: null,
        },
        { transaction: tx },
      )
      await Membership.create(
        {
          workshopId: workshop.id,
          personId: actor.personId,
          role: 'owner',
          createdAt: now,
          createdByPersonId: null,
          endedAt: null,
        },
        { transaction: tx },
      )
      await recordMove(tx, {
        workshopId: workshop.id,
        subjectType: 'workshop',
        subjectId: workshop.id,
        from: null,
        event: 'start',
        to: 'pending',
        byPersonId: actor.personId,
        at: now,
      })
      return ok({ workshop: workshop.slug })
    })
  } catch (error) {
    if (error instanceof UniqueConstraintError) return refuseFields({ slug: workshopWords.slugTaken })
    throw error
  }
}
