import 'server-only'
import type { Transaction } from 'sequelize'
import { ok } from '@/lib/core/result'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { setDue } from '@/lib/jobs/set-due'
import { REMINDER_DAYS } from '@/lib/services/_steps/balance-dues'
import { depositThen } from '@/lib/services/_steps/deposit-then'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { MailOutbox, type Order } from '@/models'

const DAY_MS = 86_400_000

/**
 * Reminds a buyer of a balance that could not be charged, on days 3, 7 and 12 after the failed charge; each time says when
 * the order lapses and what becomes of the deposit. Nobody is pressed while the bank decides a dispute.
 * Locks: run, order. Writes: mail, the next due row. Repeat: safe; one mail per reminder.
 */
export function remindBalance(cmd: { orderId: string; now: Date }) {
  const { orderId, now } = cmd
  return inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    const order = locked?.order
    if (!order || order.state !== 'balance_due' || order.balanceFailedAt === null) return ok({ nth: 0 })
    const sent = await MailOutbox.count({
      where: { kind: 'balance_reminder', subjectId: orderId },
      transaction: tx,
    })
    const isDue = (nth: number) => dueAt(order, nth) <= now
    const nth = sent + 1
    if (!isReminder(nth)) return ok({ nth: 0 })
    if (!isDue(nth)) {
      await plan(tx, order, nth)
      return ok({ nth: 0 })
    }
    if (order.disputedAt === null) await remind(tx, order, nth, now)
    if (isReminder(nth + 1)) await plan(tx, order, nth + 1)
    return ok({ nth })
  })
}

type Nth = 1 | 2 | 3
const isReminder = (nth: number): nth is Nth => nth >= 1 && nth <= REMINDER_DAYS.length

const dueAt = (order: Order, nth: number) =>
  new Date((order.balanceFailedAt?.getTime() ?? 0) + (REMINDER_DAYS[nth - 1] ?? 0) * DAY_MS)

async function plan(tx: Transaction, order: Order, nth: number): Promise<void> {
  const { id: subjectId, workshopId } = order
  await setDue(tx, { kind: 'balance_reminder', subjectId, workshopId, at: dueAt(order, nth) })
}

async function remind(tx: Transaction, order: Order, nth: Nth, now: Date): Promise<void> {
  const { workshop, ofOrder } = await orderMailFacts(tx, order)
  const failedOn = dayIn(order.balanceFailedAt ?? now, workshop.timeZone)
  await queueMail(tx, {
    kind: 'balance_reminder',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: order.id,
    version: nth,
    props: {
      ...ofOrder,
      currency: order.currency,
      amountMinor: order.balanceMinor,
      payUrl: ofOrder.orderUrl,
      nth,
      lapseOn: addDays(failedOn, workshop.lapseAfterDays),
      depositMinor: order.depositMinor,
      depositThen: await depositThen(tx, order),
    },
    now,
  })
}
