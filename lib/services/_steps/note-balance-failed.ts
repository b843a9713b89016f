import 'server-only'
import type { Transaction } from 'sequelize'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { setBalanceDues } from '@/lib/services/_steps/balance-dues'
import { cardEndingOf, orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import type { Order, Run } from '@/models'

type Failed = {
  order: Order
  run: Run
  /** What the mail is about: the attempt, or the order where no card was there to be tried. */
  subjectId: string
  why: 'bank_asks' | 'declined' | 'expired' | 'no_card'
  now: Date
}

/**
 * A balance could not be charged without the buyer: the first time starts reminders and lapse, each time a mail says why
 * and where to pay.
 * Run and order are locked by the caller. Writes: order, due rows, mail. Repeat: safe; one mail per subject.
 */
export async function noteBalanceFailed(tx: Transaction, failed: Failed): Promise<void> {
  const { order, now } = failed
  if (order.state !== 'balance_due') return
  const { workshop, ofOrder } = await orderMailFacts(tx, order)
  const { lapseAfterDays } = workshop
  if (order.balanceFailedAt === null) {
    await order.update({ balanceFailedAt: now }, { transaction: tx })
    await setBalanceDues(tx, { order, failedAt: now, lapseAfterDays })
  }
  const failedOn = dayIn(order.balanceFailedAt ?? now, workshop.timeZone)
  await queueMail(tx, {
    kind: 'card_needs_you',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: failed.subjectId,
    props: {
      ...ofOrder,
      currency: order.currency,
      amountMinor: order.balanceMinor,
      payUrl: ofOrder.orderUrl,
      cardEnding: await cardEndingOf(tx, order),
      why: failed.why,
      lapseOn: addDays(failedOn, lapseAfterDays),
    },
    now,
  })
}
