import 'server-only'
import type { Transaction } from 'sequelize'
import type { BulkKind } from '@/lib/contracts/bulk'
import { ok, refuse, type Result } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { askBalance } from '@/lib/services/_steps/ask-balance'
import { callOffOrder } from '@/lib/services/_steps/call-off-order'
import { inviteSignUp } from '@/lib/services/_steps/invite-signup'
import type { RunChange } from '@/lib/services/_steps/run-mail-props'
import { tellChanged } from '@/lib/services/_steps/tell-changed'
import { tellLocked } from '@/lib/services/_steps/tell-locked'
import { BulkItem, BulkJob, Run, SignUp } from '@/models'
import type { CallOffCause } from '@/models/words'

type Work = (tx: Transaction, job: BulkJob, subjectId: string, now: Date) => Promise<Result<true, string>>

/** Kinds whose whole deed on one row is one transaction. Balances are charged by the task, in three acts. */
const WORK: Readonly<Record<Exclude<BulkKind, 'charge_balances'>, Work>> = {
  invite: async (tx, job, signUpId, now) => {
    const run = await Run.findByPk(job.runId ?? '', { transaction: tx })
    const signUp = await SignUp.findByPk(signUpId, { transaction: tx })
    if (run?.state !== 'taking_deposits' || signUp?.state !== 'confirmed') return ok(true)
    await inviteSignUp(tx, { run, signUp, now })
    return ok(true)
  },
  tell_locked: (tx, { params }, orderId, now) =>
    tellLocked(tx, { orderId, deposited: Number(params['deposited']), now }),
  tell_changed: (tx, { params }, orderId, now) =>
    tellChanged(tx, {
      orderId,
      change: params['change'] as RunChange,
      version: Number(params['version']),
      now,
    }),
  call_off: (tx, { params }, orderId, now) =>
    callOffOrder(tx, {
      orderId,
      cause: params['cause'] as CallOffCause,
      reason: String(params['reason']),
      now,
    }),
  ask_balances: (tx, { byPersonId }, orderId, now) => askBalance(tx, { orderId, byPersonId, now }),
}

/** Not a mistake of the row: it is tried again later. */
const LATER = 'payment_in_flight'

/**
 * Does a bulk job's deed on one of its rows and ticks it off, in one transaction: a killed worker has done it or has not.
 * Refuses: payment_in_flight (the row waits for another try). Locks: the item, then what the deed locks. Writes: what the
 * deed writes, the item. Repeat: safe; an item ticked off is left alone.
 */
export async function workBulkItem(cmd: { itemId: string; now: Date }): Promise<Result<true, string>> {
  const { itemId, now } = cmd
  const done = await inTransaction(async (tx): Promise<Result<true, string>> => {
    const item = await BulkItem.findByPk(itemId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!item || item.state !== 'waiting') return ok(true)
    const job = await BulkJob.findByPk(item.bulkJobId, { transaction: tx, rejectOnEmpty: true })
    const work = WORK[job.kind as keyof typeof WORK]
    if (!work) throw new RangeError(`workBulkItem: no deed for the kind ${job.kind}`)
    const result = await work(tx, job, item.subjectId, now)
    if (!result.ok && result.reason === LATER) return refuse(LATER)
    const settled = result.ok
      ? { state: 'done' as const, reason: null }
      : { state: 'failed' as const, reason: result.reason }
    await item.update({ ...settled, doneAt: now }, { transaction: tx })
    crashPoint('bulk_item_before_commit')
    return ok(true)
  })
  crashPoint('bulk_item_done')
  return done
}
