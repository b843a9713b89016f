import 'server-only'
import { readClosedDays } from '@/lib/contracts/closed-days'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { scheduleWords } from '@/lib/messages/schedule'
import { Workshop } from '@/models'

/**
 * Says on which days the workshop does not work; every schedule steps over them.
 * Refuses: forbidden · not_found · invalid (a line that is no day and no range). Locks: the workshop. Writes: its closed
 * days. Repeat: safe.
 */
export function saveClosedDays(cmd: { actor: Actor; workshopId: string; days: string }) {
  const { actor, workshopId } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'schedule:write', { workshopId })) return refuse('forbidden')
    const days = readClosedDays(cmd.days)
    if (!days.ok) return refuseFields({ days: scheduleWords.closedUnreadable })
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    await workshop.update({ closedDays: days.value }, { transaction: tx })
    return ok({ days: days.value.length })
  })
}
