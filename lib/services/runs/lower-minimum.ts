import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { mayLowerMinimum } from '@/lib/core/states/run-changes'
import { inTransaction } from '@/lib/db/in-transaction'
import { countDeposited } from '@/lib/services/_steps/count-deposited'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { recordDecision } from '@/lib/services/_steps/record-decision'
import { recordMove } from '@/lib/services/_steps/record-move'
import { tellEveryone } from '@/lib/services/_steps/tell-changed'
import { Run } from '@/models'

/**
 * Lowers a run's minimum; it never rises, since buyers counted on it. Everyone who has ordered is told.
 * Refuses: forbidden · not_found · not_taking_deposits · minimum_out_of_range · not_lower. Locks: the run. Writes: the run,
 * a decision, a bulk job, audit; its public page is made anew. Repeat: refused as not_lower.
 */
export function lowerMinimum(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  minimum: number
  now: Date
}) {
  const { actor, workshopId, runId, minimum, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'run:lower_minimum', { workshopId }))
      return refuse('forbidden')
    const run = await Run.findOne({
      where: { id: runId, workshopId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    })
    if (!run) return refuse('not_found')
    const may = mayLowerMinimum({ state: run.state, minimum: run.minimum, proposed: minimum })
    if (!may.ok) return may
    const before = run.minimum
    await run.update({ minimum }, { transaction: tx })
    await recordMove(tx, {
      workshopId,
      subjectType: 'run',
      subjectId: run.id,
      from: run.state,
      event: 'lower_minimum',
      to: run.state,
      byPersonId: actor.personId,
      at: now,
      note: `${before} to ${minimum}`,
    })
    await recordDecision(tx, {
      run,
      kind: 'lower_minimum',
      reason: null,
      inputs: { before },
      figures: { minimum },
      byPersonId: actor.personId,
      now,
    })
    const change = { minimum: { from: before, to: minimum }, decideBy: null }
    const deposited = await countDeposited(tx, run.id)
    const told = { run, change: { ...change, deposited }, byPersonId: actor.personId, now }
    const bulk = await tellEveryone(tx, told)
    await modulePageChanged(tx, run.moduleId)
    return ok({ minimum, bulk: bulk.id })
  })
}
