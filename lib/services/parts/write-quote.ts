import 'server-only'
import type { QuoteInput } from '@/lib/contracts/part-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Part, Workshop } from '@/models'
import { refreshPlansOfPart } from '../_steps/refresh-plans-of-part'
import { writeQuotes } from '../_steps/write-quotes'

/**
 * Writes down a quote of a part; one of the same supplier, currency and day is corrected.
 * Refuses: forbidden · not_found · invalid (a day to come). Locks: the part. Writes: the quote, base plans. Repeat: safe.
 */
export function writeQuote(cmd: { actor: Actor; workshopId: string; input: QuoteInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'quote:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx })
    const part = await Part.findOne({
      where: { workshopId, id: input.part },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!workshop || !part) return refuse('not_found')
    if (input.quote.quotedOn > dayIn(now, workshop.timeZone))
      return refuseFields({ quotedOn: moduleMistakes.notYet })
    await writeQuotes(tx, workshopId, [{ partId: part.id, quote: input.quote }])
    await refreshPlansOfPart(tx, { partId: part.id, byPersonId: actor.personId, now })
    return ok({ part: part.id })
  })
}
