import 'server-only'
import type { Transaction } from 'sequelize'
import type { MailProps, MailSender } from '@/lib/contracts/mails'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import type { OrderState } from '@/lib/core/states/order'
import { callOffDueOn } from '@/lib/core/states/run-changes'
import { inTransaction } from '@/lib/db/in-transaction'
import { getMailSender } from '@/lib/queries/mails/get-mail-sender'
import { CALLED_OFF_FROM } from '@/lib/services/_steps/call-off-order'
import { countDeposited } from '@/lib/services/_steps/count-deposited'
import { leftOf } from '@/lib/services/_steps/left-of'
import { calledOffProps, changedProps, lockedProps } from '@/lib/services/_steps/run-mail-props'
import { TOLD_OF_CHANGE } from '@/lib/services/_steps/tell-changed'
import { Order, Run } from '@/models'

/** A deed that writes to buyers, with what the owner has typed or not typed yet. */
export type DeedAhead =
  | { deed: 'lock'; reason: string }
  | { deed: 'call_off'; reason: string }
  | { deed: 'lower_minimum'; minimum: number }
  | { deed: 'move_decide_by'; decideBy: string }

/** The mail to the first of those who get one, and how many get theirs. */
export type MailAhead = { count: number; sender: MailSender } & (
  | { kind: 'run_locked'; props: MailProps<'run_locked'> }
  | { kind: 'run_called_off'; props: MailProps<'run_called_off'> }
  | { kind: 'run_changed'; props: MailProps<'run_changed'> }
)

const TOLD: Readonly<Record<DeedAhead['deed'], readonly OrderState[]>> = {
  lock: ['reserved'],
  call_off: CALLED_OFF_FROM,
  lower_minimum: TOLD_OF_CHANGE,
  move_decide_by: TOLD_OF_CHANGE,
}

/**
 * The mail a deed would send, written from the same facts as the real one: to the first order, with how many orders get
 * theirs; null where nobody does.
 * Refuses: forbidden · not_found. Locks, writes: nothing. Repeat: safe.
 */
export function previewRunMails(cmd: { actor: Actor; workshopId: string; runId: string; ahead: DeedAhead }) {
  const { actor, workshopId, runId, ahead } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'run:read', { workshopId })) return refuse('forbidden')
    const run = await Run.findOne({ where: { id: runId, workshopId }, transaction: tx })
    if (!run) return refuse('not_found')
    const where = { runId, kind: 'paid' as const, state: [...TOLD[ahead.deed]] }
    const count = await Order.count({ where, transaction: tx })
    const first = await Order.findOne({ where, order: [['number', 'ASC']], transaction: tx })
    if (!first) return ok(null)
    const sender = await getMailSender(workshopId, tx)
    return ok<MailAhead>({ count, sender, ...(await write(tx, run, first, ahead)) })
  })
}

async function write(tx: Transaction, run: Run, order: Order, ahead: DeedAhead) {
  const deposited = await countDeposited(tx, run.id)
  if (ahead.deed === 'lock') {
    const props = await lockedProps(tx, order, { deposited, lockReason: ahead.reason })
    return { kind: 'run_locked' as const, props }
  }
  if (ahead.deed === 'call_off') {
    const { reason } = ahead
    const refundMinor = await leftOf(tx, order)
    const props = await calledOffProps(tx, order, { cause: 'owner', reason, refundMinor })
    return { kind: 'run_called_off' as const, props }
  }
  const { decideByOn: from } = run
  const change =
    ahead.deed === 'lower_minimum'
      ? { minimum: { from: run.minimum, to: ahead.minimum }, decideBy: null, deposited }
      : {
          minimum: null,
          decideBy: { from, to: ahead.decideBy, callsOffOn: callOffDueOn(ahead.decideBy) },
          deposited,
        }
  return { kind: 'run_changed' as const, props: await changedProps(tx, order, change) }
}
