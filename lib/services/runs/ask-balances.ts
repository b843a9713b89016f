import 'server-only'
import { isConfirmedBy } from '@/lib/contracts/bulk'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { runWords } from '@/lib/messages/runs'
import { recordMove } from '@/lib/services/_steps/record-move'
import { startAsking } from '@/lib/services/_steps/start-asking'
import { Module, Run } from '@/models'

/**
 * Announces the balances of a locked run. Each buyer is told sum, day and card; seven days later the saved cards are
 * charged. Orders that come under deposit afterwards are announced by pressing again.
 * Refuses: forbidden · not_found · invalid (other words typed) · run_not_locked · nothing_to_ask. Locks: the run. Writes: run,
 * audit, bulk job. Repeat: safe; an order is announced once.
 */
export function askBalances(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  typed?: string | undefined
  now: Date
}) {
  const { actor, workshopId, runId, typed, now } = cmd
  return inTransaction(async (tx): Promise<Result<{ bulk: string }, string> | FieldRefusal> => {
    if (actor.kind !== 'person' || !can(actor, 'run:ask_balances', { workshopId })) return refuse('forbidden')
    const run = await Run.findOne({
      where: { id: runId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!run) return refuse('not_found')
    if (run.state !== 'locked') return refuse('run_not_locked')
    const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
    if (typed !== undefined && !isConfirmedBy(typed, runWords.confirmAsk(module.slug)))
      return refuseFields({ typed: runWords.typedDiffers })
    const { bulk, orders } = await startAsking(tx, run, { byPersonId: actor.personId, now })
    if (orders === 0) return refuse('nothing_to_ask')
    await recordMove(tx, {
      workshopId,
      subjectType: 'run',
      subjectId: run.id,
      from: run.state,
      event: 'ask_balances',
      to: run.state,
      byPersonId: actor.personId,
      at: now,
      note: `${orders} orders`,
    })
    return ok({ bulk: bulk.id })
  })
}
