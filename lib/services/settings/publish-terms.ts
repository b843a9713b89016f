import 'server-only'
import type { TermsInput } from '@/lib/contracts/settings'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { TermsVersion, Workshop } from '@/models'
import { workshopPagesChanged } from '../_steps/workshop-pages-changed'

/**
 * Publishes a next version of the terms. Orders keep the version they were placed under, and a run that takes deposits the
 * one it was opened with.
 * Refuses: not_found · forbidden. Locks: the workshop. Writes: one version; public pages are made anew. Repeat: safe;
 * the same text again makes no new version.
 */
export function publishTerms(cmd: { actor: Actor; workshopId: string; input: TermsInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'terms:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    const last = await TermsVersion.findOne({
      where: { workshopId },
      order: [['number', 'DESC']],
      transaction: tx,
    })
    const isSame = last?.body === input.body && last.lapseKeepsDeposit === input.lapseKeepsDeposit
    if (last && isSame) return ok({ number: last.number })
    const version = await TermsVersion.create(
      {
        workshopId,
        number: (last?.number ?? 0) + 1,
        ...input,
        publishedAt: now,
        publishedByPersonId: actor.personId,
      },
      { transaction: tx },
    )
    await workshop.update({ lapseKeepsDeposit: input.lapseKeepsDeposit }, { transaction: tx })
    await workshopPagesChanged(tx, workshop)
    return ok({ number: version.number })
  })
}
