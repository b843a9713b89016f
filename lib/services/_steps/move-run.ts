import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, type Result } from '@/lib/core/result'
import { next, RUN_MOVES, type RunEvent } from '@/lib/core/states/run'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { recordMove } from '@/lib/services/_steps/record-move'
import type { Run } from '@/models'

type RunColumns = Partial<
  Pick<
    Run,
    | 'openedAt'
    | 'opensToAllAt'
    | 'termsVersionId'
    | 'lockedAt'
    | 'lockReason'
    | 'plannedStarts'
    | 'balancesAskedAt'
    | 'calledOffAt'
    | 'callOffReason'
    | 'callOffCause'
    | 'closedAt'
  >
>

/**
 * Moves a run the caller has locked, by the table of its states; its public page is made anew.
 * Refuses: not_allowed. Writes: the run and its audit entry. Repeat: refused, the state has changed.
 */
export async function moveRun(
  tx: Transaction,
  run: Run,
  event: RunEvent,
  by: { now: Date; byPersonId: string | null; change: RunColumns },
): Promise<Result<Run, 'not_allowed'>> {
  const from = run.state
  const to = next(RUN_MOVES, from, event)
  if (!to.ok) return to
  await run.update({ ...by.change, state: to.value }, { transaction: tx })
  await recordMove(tx, {
    workshopId: run.workshopId,
    subjectType: 'run',
    subjectId: run.id,
    from,
    event,
    to: to.value,
    byPersonId: by.byPersonId,
    at: by.now,
  })
  await modulePageChanged(tx, run.moduleId)
  return ok(run)
}
