import 'server-only'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { setDue } from '@/lib/jobs/set-due'
import { recordRefund, REFUND_LOOK_UP_MS } from '@/lib/services/_steps/record-refund'
import { PaymentAttempt, Refund } from '@/models'

/**
 * Asks the provider what became of a refund it has and has not finished, in case the event that said so was lost.
 * Refuses: not_found · provider_unreachable (the due row asks again). Locks: the refund. Writes: what the provider says.
 * Repeat: safe.
 */
export async function lookUpRefund(cmd: { refundId: string; now: Date }) {
  const seen = await Refund.findByPk(cmd.refundId, { include: [{ model: PaymentAttempt, as: 'attempt' }] })
  if (!seen?.attempt || seen.providerId === null) return refuse('not_found')
  if (seen.state !== 'pending') return ok({ state: seen.state })
  const account = seen.attempt.providerAccountId
  const found = await payments().getRefund({ account, refund: seen.providerId })
  if (!found.ok) return refuse('provider_unreachable')
  return inTransaction(async (tx) => {
    const refund = await Refund.findByPk(cmd.refundId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const { id: subjectId, workshopId } = refund
    if (found.value.state !== 'pending') await recordRefund(tx, refund, found.value, cmd.now)
    else {
      const at = new Date(cmd.now.getTime() + REFUND_LOOK_UP_MS)
      await setDue(tx, { kind: 'refund_look_up', subjectId, workshopId, at })
    }
    return ok({ state: refund.state })
  })
}
