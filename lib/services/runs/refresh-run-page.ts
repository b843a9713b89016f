import 'server-only'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { setDue } from '@/lib/jobs/set-due'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { pageTurnsAt } from '@/lib/services/_steps/set-run-dues'
import { Run, Workshop } from '@/models'

/**
 * Has the public page of a run made anew because time has passed: everyone may order now, or a day has ended. Goes on each
 * day until the run is over.
 * Locks: nothing. Writes: a notification, the next due row. Repeat: safe.
 */
export function refreshRunPage(cmd: { runId: string; now: Date }) {
  return inTransaction(async (tx) => {
    const run = await Run.findByPk(cmd.runId, { transaction: tx })
    if (!run || (run.state !== 'taking_deposits' && run.state !== 'locked')) return ok({ isOver: true })
    const workshop = await Workshop.findByPk(run.workshopId, { transaction: tx, rejectOnEmpty: true })
    await modulePageChanged(tx, run.moduleId)
    await setDue(tx, {
      kind: 'run_page',
      subjectId: run.id,
      workshopId: run.workshopId,
      at: pageTurnsAt(run, workshop.timeZone, cmd.now),
    })
    return ok({ isOver: false })
  })
}
