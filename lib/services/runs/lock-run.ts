import 'server-only'
import type { Transaction } from 'sequelize'
import type { FieldRefusal } from '@/lib/contracts/problem'
import type { LockInput } from '@/lib/contracts/runs'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { balanceAtProvider } from '@/lib/services/_steps/balance-at-provider'
import { endHolds } from '@/lib/services/_steps/end-holds'
import { endInvitations } from '@/lib/services/_steps/end-invitations'
import { judgeLock, type LockAsked } from '@/lib/services/_steps/judge-lock'
import { moveRun } from '@/lib/services/_steps/move-run'
import { endDeposits, openDeposits } from '@/lib/services/_steps/open-deposits'
import { recordDecision } from '@/lib/services/_steps/record-decision'
import { dropRunDues } from '@/lib/services/_steps/set-run-dues'
import { startAsking } from '@/lib/services/_steps/start-asking'
import { startBulk } from '@/lib/services/_steps/start-bulk'
import { Order, Run, Workshop } from '@/models'

type Answer = Result<{ bulk: string }, string> | FieldRefusal

/** Somebody may open a card page between the last one being ended and the lock; so often it is tried again. */
const TRIES = 3

/**
 * Locks a run: the go. Judged twice: once before anything is touched, and again in the transaction that locks, after the
 * open card sessions have been ended at the provider. The figures it was decided on are frozen with it; a bulk job tells
 * everyone, another announces the balances when they fall due at the lock.
 * Refuses: forbidden · not_found · invalid (other words typed) · not_allowed · below_minimum · not_ready · session_open ·
 * attempt_unknown. Locks: the run, held orders. Writes: run, waivers, decision, held orders, invitations, bulk jobs, due
 * rows, audit; its public page is made anew. Repeat: refused as not_allowed.
 */
export async function lockRun(cmd: {
  actor: Actor
  workshopId: string
  runId: string
  input: LockInput & { typed?: string | undefined }
  now: Date
}): Promise<Answer> {
  const { actor, workshopId, runId, input, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'run:lock', { workshopId })) return refuse('forbidden')
  const workshop = await Workshop.findByPk(workshopId)
  if (!workshop) return refuse('not_found')
  const lying = await balanceAtProvider(workshop.providerAccountId, workshop.currency)
  const asked = { input, personId: actor.personId, balanceMinor: lying.ok ? lying.value : null, now }
  const which = { id: runId, workshopId }

  const looked = await look(which, asked)
  if (looked.reason !== LOOKED_AT) return looked
  for (let tried = 1; ; tried += 1) {
    const ended = await endDeposits(runId, now)
    if (!ended.ok) return ended
    const locked = await inTransaction((tx) => lock(tx, which, asked))
    const isRaced = !locked.ok && (locked.reason === 'session_open' || locked.reason === 'attempt_unknown')
    crashPoint('run_locked')
    if (!isRaced || tried >= TRIES) return locked
  }
}

type Which = { id: string; workshopId: string }

const findRun = (tx: Transaction, where: Which) =>
  Run.findOne({ where, transaction: tx, lock: tx.LOCK.UPDATE })

const LOOKED_AT = 'looked_at'

/** A refusal rolls back: so the first look leaves no waiver behind. */
async function look(which: Which, asked: LockAsked) {
  const seen = await inTransaction(async (tx) => {
    const run = await findRun(tx, which)
    if (!run) return refuse('not_found')
    const judged = await judgeLock(tx, run, asked, { openSessions: 0, unknownAttempts: 0 })
    return judged.ok ? refuse(LOOKED_AT) : judged
  })
  return seen
}

async function lock(tx: Transaction, which: Which, asked: LockAsked): Promise<Answer> {
  const { input, now, personId: byPersonId } = asked
  const run = await findRun(tx, which)
  if (!run) return refuse('not_found')
  const open = await openDeposits(tx, run.id)
  if (open.openSessions + open.unknownAttempts === 0) await endHolds(tx, run, now)
  const judged = await judgeLock(tx, run, asked, open)
  if (!judged.ok) return judged
  const { facts, figures, weighed, readiness } = judged.value
  const lockReason = figures.deposited < run.minimum ? (input.reason ?? null) : null
  const change = { lockedAt: now, lockReason, plannedStarts: figures.starts || null }
  const moved = await moveRun(tx, run, 'lock', { now, byPersonId, change })
  if (!moved.ok) return moved
  await dropRunDues(tx, run)
  await endInvitations(tx, run, now)
  await recordDecision(tx, {
    run,
    kind: 'lock',
    reason: lockReason,
    inputs: { facts, balanceMinor: asked.balanceMinor },
    figures: { ...figures, weighed, readiness },
    byPersonId,
    now,
  })
  return ok({ bulk: await tellAndAsk(tx, run, { deposited: figures.deposited, byPersonId, now }) })
}

async function tellAndAsk(
  tx: Transaction,
  run: Run,
  { deposited, ...by }: { deposited: number; byPersonId: string; now: Date },
): Promise<string> {
  const orders = await Order.findAll({
    where: { runId: run.id, state: 'reserved' },
    attributes: ['id'],
    order: [['number', 'ASC']],
    transaction: tx,
  })
  const subjectIds = orders.map(({ id }) => id)
  const told = await startBulk(tx, { kind: 'tell_locked', run, subjectIds, params: { deposited }, ...by })
  if (run.balanceWhen === 'at_lock') await startAsking(tx, run, by)
  return told.id
}
