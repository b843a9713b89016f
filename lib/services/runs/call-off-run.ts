import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { isConfirmedBy } from '@/lib/contracts/bulk'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { mayCallOff } from '@/lib/core/states/run-guards'
import { inTransaction } from '@/lib/db/in-transaction'
import { runWords } from '@/lib/messages/runs'
import { CALLED_OFF_FROM } from '@/lib/services/_steps/call-off-order'
import { countDeposited } from '@/lib/services/_steps/count-deposited'
import { endInvitations } from '@/lib/services/_steps/end-invitations'
import { moveRun } from '@/lib/services/_steps/move-run'
import { recordDecision } from '@/lib/services/_steps/record-decision'
import { callOffAt, dropRunDues } from '@/lib/services/_steps/set-run-dues'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { Module, Order, Parcel, Run, Workshop } from '@/models'
import type { CallOffCause } from '@/models/words'

/** A parcel in one of these has been in the post. */
const POSTED = ['handed_over', 'delivered', 'lost', 'returned'] as const

type Answer = Result<{ bulk: string }, string> | FieldRefusal

/**
 * Calls a run off: nobody can order any more, and a bulk job ends every order, pays everything back and writes to everyone.
 * `typed` are the words typed on the check page; a program that calls the API sends none.
 * Refuses: forbidden · not_found · invalid (other words typed) · reason_missing · already_handed_over · not_allowed.
 * Locks: the run. Writes: run, decision, invitations, bulk job, due rows, audit; its public page is made anew.
 * Repeat: refused as not_allowed; money goes back once.
 */
export function callOffRun(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  reason: string
  typed?: string | undefined
  now: Date
}) {
  const { actor, workshopId, runId, reason, typed, now } = cmd
  return inTransaction(async (tx): Promise<Answer> => {
    if (actor.kind !== 'person' || !can(actor, 'run:call_off', { workshopId })) return refuse('forbidden')
    const run = await lockRun(tx, { id: runId, workshopId })
    if (!run) return refuse('not_found')
    const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
    if (typed !== undefined && !isConfirmedBy(typed, runWords.confirmCallOff(module.slug)))
      return refuseFields({ typed: runWords.typedDiffers })
    return callOff(tx, run, { cause: 'owner', reason, byPersonId: actor.personId, now })
  })
}

/**
 * The clock calls off a run that nobody has decided about seven days after decide-by. A run decided meanwhile, or whose day
 * has moved, is left alone.
 * Refuses: already_handed_over. Locks, writes: as `callOffRun`. Repeat: safe.
 */
export function callOffUndecided(cmd: { runId: string; now: Date }) {
  return inTransaction(async (tx): Promise<Answer | Result<{ bulk: null }, never>> => {
    const run = await lockRun(tx, { id: cmd.runId })
    if (!run || run.state !== 'taking_deposits') return ok({ bulk: null })
    const workshop = await Workshop.findByPk(run.workshopId, { transaction: tx, rejectOnEmpty: true })
    if (callOffAt(run, workshop.timeZone) > cmd.now) return ok({ bulk: null })
    const reason = runWords.undecidedReason
    return callOff(tx, run, { cause: 'clock', reason, byPersonId: null, now: cmd.now })
  })
}

const lockRun = (tx: Transaction, where: { id: string; workshopId?: string }) =>
  Run.findOne({ where, transaction: tx, lock: tx.LOCK.UPDATE })

type By = { cause: CallOffCause; reason: string; byPersonId: string | null; now: Date }

async function callOff(tx: Transaction, run: Run, by: By): Promise<Result<{ bulk: string }, string>> {
  const { cause, reason, byPersonId, now } = by
  const handedOver = await Parcel.count({
    where: { runId: run.id, state: { [Op.in]: [...POSTED] } },
    transaction: tx,
  })
  const may = mayCallOff({ reason, handedOver })
  if (!may.ok) return may
  const from = run.state
  const deposited = await countDeposited(tx, run.id)
  const change = { calledOffAt: now, callOffReason: reason, callOffCause: cause }
  const moved = await moveRun(tx, run, 'call_off', { now, byPersonId, change })
  if (!moved.ok) return moved
  await dropRunDues(tx, run)
  await endInvitations(tx, run, now)
  const orders = await Order.findAll({
    where: { runId: run.id, state: [...CALLED_OFF_FROM] },
    attributes: ['id', 'state', 'unitCount', 'depositMinor'],
    order: [['number', 'ASC']],
    transaction: tx,
  })
  await recordDecision(tx, {
    run,
    kind: 'call_off',
    reason,
    inputs: { from, cause },
    figures: {
      deposited,
      orders: orders.length,
      units: orders.reduce((sum, { unitCount }) => sum + unitCount, 0),
    },
    byPersonId,
    now,
  })
  const subjectIds = orders.map(({ id }) => id)
  const bulk = await startBulk(tx, {
    kind: 'call_off',
    run,
    subjectIds,
    params: { cause, reason },
    byPersonId,
    now,
  })
  return ok({ bulk: bulk.id })
}
