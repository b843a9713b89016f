import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, refuse, type Result } from '@/lib/core/result'
import { mayAskBalance } from '@/lib/core/states/order-guards'
import { dayIn } from '@/lib/core/time/zone'
import { setDue } from '@/lib/jobs/set-due'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { openParcelForOrder } from '@/lib/services/_steps/open-parcel-for-order'
import { cardEndingOf, orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { promisesOf } from '@/lib/services/_steps/promises-of'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { MailOutbox, type Order } from '@/models'

/** Days between the announcement of a balance and its charge. Source: product.md, Balances. */
const NOTICE_DAYS = 7

/**
 * Announces the balance of one order: sum, day and card, at least seven days before the card is charged. An order with
 * nothing left to pay is paid.
 * Refuses: not_found · run_not_locked · disputed. Locks: run, order. Writes: order, due row, mail, or the parcel of a paid
 * order. Repeat: safe; announced once.
 */
export async function askBalance(
  tx: Transaction,
  given: { orderId: string; byPersonId: string | null; now: Date },
): Promise<Result<true, 'not_found' | 'run_not_locked' | 'disputed' | 'not_allowed'>> {
  const { now, byPersonId } = given
  const locked = await lockOrder(tx, given.orderId)
  if (!locked) return refuse('not_found')
  const { run, order } = locked
  if (order.state !== 'reserved') return ok(true)
  const may = mayAskBalance({
    run: run.state,
    dueMinor: order.balanceMinor,
    disputed: order.disputedAt !== null,
  })
  if (may.ok) return announceBalance(tx, order, { event: 'ask_balance', byPersonId, now })
  if (may.reason !== 'nothing_due') return refuse(may.reason)
  const moved = await moveOrder(tx, order, 'nothing_due', { now, byPersonId })
  if (!moved.ok) return moved
  await openParcelForOrder(tx, order, now)
  return ok(true)
}

/**
 * Tells one buyer what is charged and when, and sets it due; also for an order the owner takes up again.
 * Refuses: not_allowed. The caller has locked run and order. Writes: order, due row, mail, audit. Repeat: refused.
 */
export async function announceBalance(
  tx: Transaction,
  order: Order,
  by: { event: 'ask_balance' | 'reinstate'; byPersonId: string | null; now: Date },
): Promise<Result<true, 'not_allowed'>> {
  const { event, byPersonId, now } = by
  const chargeAt = new Date(now.getTime() + NOTICE_DAYS * 86_400_000)
  const change = { balanceAskedAt: now, balanceChargeAt: chargeAt, balanceFailedAt: null }
  const moved = await moveOrder(tx, order, event, { now, byPersonId, change })
  if (!moved.ok) return moved
  const { id: subjectId, workshopId, personId, currency, balanceMinor } = order
  await setDue(tx, { kind: 'balance_charge', subjectId, workshopId, at: chargeAt })
  const { workshop, ofOrder } = await orderMailFacts(tx, order)
  await queueMail(tx, {
    kind: 'balance_coming',
    workshopId,
    personId,
    subjectId,
    version: await nextVersion(tx, subjectId),
    props: {
      ...ofOrder,
      currency,
      amountMinor: balanceMinor,
      payUrl: ofOrder.orderUrl,
      chargeOn: dayIn(chargeAt, workshop.timeZone),
      cardEnding: await cardEndingOf(tx, order),
      promises: await promisesOf(tx, order),
    },
    now,
  })
  return ok(true)
}

/** One announcement per time it is asked for. */
const nextVersion = async (tx: Transaction, subjectId: string) =>
  (await MailOutbox.count({ where: { kind: 'balance_coming', subjectId }, transaction: tx })) + 1
