import 'server-only'
import { type Transaction } from 'sequelize'
import { isDay } from '@/lib/core/time/day'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { callOffDueOn, mayMoveDecideBy } from '@/lib/core/states/run-changes'
import { addDays, daysBetween } from '@/lib/core/time/day'
import { dayIn, startOfDay } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { countDeposited } from '@/lib/services/_steps/count-deposited'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { recordDecision } from '@/lib/services/_steps/record-decision'
import { recordMove } from '@/lib/services/_steps/record-move'
import { setRunDues } from '@/lib/services/_steps/set-run-dues'
import { tellEveryone } from '@/lib/services/_steps/tell-changed'
import { Run, RunOffer, Workshop } from '@/models'

/**
 * Moves a run's decide-by day, once and by at most 30 days; everyone who has ordered is told, and the clock calls it off
 * correspondingly later.
 * Refuses: forbidden · not_found · beyond_holding_limit (the provider keeps deposits no longer, and no plan is stated) · every
 * reason of `mayMoveDecideBy`. Locks: the run. Writes: the run, a decision, due rows, a bulk job, audit; its public page is
 * made anew. Repeat: refused as already_moved.
 */
export function moveDecideBy(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  decideBy: string
  now: Date
}) {
  const { actor, workshopId, runId, decideBy, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'run:move_decide_by', { workshopId }))
      return refuse('forbidden')
    const where = { id: runId, workshopId }
    const run = await Run.findOne({ where, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!run || !isDay(decideBy)) return refuse('not_found')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, rejectOnEmpty: true })
    const may = await judge(tx, run, workshop, decideBy, now)
    if (!may.ok) return may
    const before = run.decideByOn
    const decideByAt = startOfDay(addDays(decideBy, 1), workshop.timeZone)
    await run.update({ decideByOn: decideBy, decideByAt, decideByMovedAt: now }, { transaction: tx })
    await setRunDues(tx, run, workshop.timeZone, now)
    const by = { byPersonId: actor.personId }
    await recordMove(tx, {
      ...{ workshopId, subjectType: 'run', subjectId: run.id, from: run.state, to: run.state },
      ...{ event: 'move_decide_by', at: now, note: `${before} to ${decideBy}`, ...by },
    })
    await recordDecision(tx, {
      ...{ run, kind: 'move_decide_by', reason: null, now, ...by },
      inputs: { before },
      figures: { decideBy },
    })
    const moved = { from: before, to: decideBy, callsOffOn: callOffDueOn(decideBy) }
    const change = { minimum: null, decideBy: moved, deposited: await countDeposited(tx, run.id) }
    const bulk = await tellEveryone(tx, { run, change, now, ...by })
    await modulePageChanged(tx, run.moduleId)
    return ok({ decideBy, bulk: bulk.id })
  })
}

async function judge(
  tx: Transaction,
  run: Run,
  workshop: Workshop,
  proposed: string,
  now: Date,
): Promise<Result<true, string>> {
  const offers = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
  const may = mayMoveDecideBy({
    state: run.state,
    decideBy: run.decideByOn,
    proposed,
    movedBefore: run.decideByMovedAt !== null,
    today: dayIn(now, workshop.timeZone),
    postedBy: offers.map(({ postedByOn }) => postedByOn),
  })
  if (!may.ok) return may
  const limit = workshop.holdingLimitDays
  const kept = run.openedAt === null ? 0 : daysBetween(dayIn(run.openedAt, workshop.timeZone), proposed)
  const isKept = limit === null || kept <= limit || (run.holdingPlan ?? '').trim() !== ''
  return isKept ? ok(true) : refuse('beyond_holding_limit')
}
