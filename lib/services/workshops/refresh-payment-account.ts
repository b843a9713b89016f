import 'server-only'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { setDue } from '@/lib/jobs/set-due'
import { DueItem, Workshop } from '@/models'

/**
 * Asks the provider what the workshop's account may do and writes it down; sets payouts to manual once cards may be
 * charged, so that deposits stay where they can be paid back from.
 * Refuses: not_found · provider_unreachable. Locks: the workshop. Writes: when charges were enabled and
 * payouts set. Repeat: safe.
 */
export async function refreshPaymentAccount(cmd: { account: string; now: Date }) {
  const facts = await payments().getAccount({ account: cmd.account })
  if (!facts.ok) return refuse('provider_unreachable')
  const isManual =
    facts.value.payoutSchedule === 'manual' ||
    (facts.value.chargesEnabled &&
      (
        await payments().setManualPayouts({
          account: cmd.account,
          key: `payouts-manual:${cmd.account}:${cmd.now.getTime()}`,
        })
      ).ok)
  return inTransaction(async (tx) => {
    const workshop = await Workshop.findOne({
      where: { providerAccountId: cmd.account },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!workshop) return refuse('not_found')
    await workshop.update(
      {
        chargesEnabledAt: facts.value.chargesEnabled ? (workshop.chargesEnabledAt ?? cmd.now) : null,
        payoutsManualAt: isManual ? (workshop.payoutsManualAt ?? cmd.now) : null,
      },
      { transaction: tx },
    )
    const { id: workshopId } = workshop
    const known = { kind: 'compare_books', subjectId: workshopId, doneAt: null }
    if (facts.value.chargesEnabled && (await DueItem.count({ where: known, transaction: tx })) === 0) {
      const at = new Date(cmd.now.getTime() + 86_400_000)
      await setDue(tx, { kind: 'compare_books', subjectId: workshopId, workshopId, at })
    }
    return ok({ chargesEnabled: facts.value.chargesEnabled, payoutsManual: isManual })
  })
}
