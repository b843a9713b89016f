import 'server-only'
import type { ActualsInput } from '@/lib/contracts/run-outcome'
import { minor } from '@/lib/core/brand'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Run, RunActuals } from '@/models'

/**
 * Keeps what a run really cost and how many boards came out good, as its owner types it; typing it again corrects it.
 * Refuses: forbidden · not_found · nothing_built. Locks: the run. Writes: its actuals. Repeat: safe.
 */
export function saveActuals(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  input: ActualsInput
  now: Date
}) {
  const { actor, workshopId, runId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'outcome:write', { workshopId })) return refuse('forbidden')
    const where = { id: runId, workshopId }
    const run = await Run.findOne({ where, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!run) return refuse('not_found')
    if (run.state !== 'locked' && run.state !== 'closed') return refuse('nothing_built')
    const { costMinor, started, good } = input
    const typed = { costMinor: minor(costMinor), started, good, writtenAt: now, byPersonId: actor.personId }
    const before = await RunActuals.findOne({ where: { runId }, transaction: tx })
    if (before) await before.update(typed, { transaction: tx })
    else await RunActuals.create({ workshopId, runId, ...typed }, { transaction: tx })
    return ok({ saved: true })
  })
}
