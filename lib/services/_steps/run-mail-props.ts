import 'server-only'
import type { Transaction } from 'sequelize'
import type { Day } from '@/lib/core/brand'
import type { MailProps } from '@/lib/contracts/mails'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { promisesOf } from '@/lib/services/_steps/promises-of'
import type { Order } from '@/models'
import type { CallOffCause } from '@/models/words'

/** What changed about a run that takes deposits, and how many units are under deposit as it does. */
export type RunChange = { deposited: number } & (
  | { minimum: { from: number; to: number }; decideBy: null }
  | { minimum: null; decideBy: { from: Day; to: Day; callsOffOn: Day } }
)

/** What the mail of a lock tells the buyer of one order. Locks, writes: nothing. */
export async function lockedProps(
  tx: Transaction,
  order: Order,
  { deposited, lockReason }: { deposited: number; lockReason: string | null },
): Promise<MailProps<'run_locked'>> {
  const { run, ofOrder } = await orderMailFacts(tx, order)
  return {
    ...ofOrder,
    currency: order.currency,
    deposited,
    minimum: run.minimum,
    belowMinimum: deposited < run.minimum ? lockReason : null,
    balanceMinor: order.balanceMinor,
    balanceWhen: run.balanceWhen,
    promises: await promisesOf(tx, order),
  }
}

/** What the mail of a call-off tells the buyer of one order. Locks, writes: nothing. */
export async function calledOffProps(
  tx: Transaction,
  order: Order,
  { cause, reason, refundMinor }: { cause: CallOffCause; reason: string; refundMinor: number },
): Promise<MailProps<'run_called_off'>> {
  const { ofOrder } = await orderMailFacts(tx, order)
  return {
    ...ofOrder,
    currency: order.currency,
    cause,
    reason: cause === 'owner' ? reason : null,
    refundMinor,
  }
}

/** What the mail of a lowered minimum or a moved decide-by tells the buyer of one order. Locks, writes: nothing. */
export async function changedProps(
  tx: Transaction,
  order: Order,
  change: RunChange,
): Promise<MailProps<'run_changed'>> {
  const { ofOrder } = await orderMailFacts(tx, order)
  return { ...ofOrder, ...change, isWaiting: order.state === 'waiting' }
}
