import 'server-only'
import type { Transaction } from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { RefundEvent } from '@/lib/core/states/refund'
import { crashPoint } from '@/lib/db/crash-point'
import type { RefundFacts } from '@/lib/gateways/payments/types'
import { dropDue, setDue } from '@/lib/jobs/set-due'
import { bookRefund, bookRefundFailure } from '@/lib/services/_steps/book-refund'
import { moveRefund } from '@/lib/services/_steps/move-refund'
import { cardEndingOf, orderMailFacts } from '@/lib/services/_steps/order-mail-facts'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { Order, PaymentAttempt, type Refund } from '@/models'

const DAY_MS = 86_400_000
/** How often a refund that the provider has not finished is looked up, in case its event was lost. */
export const REFUND_LOOK_UP_MS = DAY_MS

const EVENT: Readonly<Record<RefundFacts['state'], RefundEvent>> = {
  pending: 'pend',
  succeeded: 'succeed',
  failed: 'fail',
}

/**
 * Writes down what the provider says of a refund the caller has locked: its state, the ledger, the mail once it went
 * through. What it says twice, or late, changes nothing.
 * Locks: nothing more. Writes: the refund, audit, ledger, mail, due row. Repeat: safe.
 */
export async function recordRefund(
  tx: Transaction,
  refund: Refund,
  facts: RefundFacts,
  now: Date,
  /** What the balance lacks, where that was looked up. */
  shortBy?: Minor,
): Promise<void> {
  const isShort = facts.state === 'pending' && facts.failure === 'insufficient_funds'
  const moved = await moveRefund(tx, refund, EVENT[facts.state], now, {
    providerId: facts.id,
    sentAt: refund.sentAt ?? now,
    ...(facts.state === 'failed' ? { failureCode: facts.failure ?? 'failed', failedAt: now } : {}),
    ...(facts.state === 'succeeded' ? { succeededAt: now, shortByMinor: null } : {}),
    ...(isShort ? { shortByMinor: shortBy ?? refund.shortByMinor ?? refund.amountMinor } : {}),
  })
  if (!moved.ok) return
  const order = await Order.findByPk(refund.orderId, { transaction: tx, rejectOnEmpty: true })
  if (facts.state === 'failed') {
    await bookRefundFailure(tx, { refund, order, now })
    await dropDue(tx, 'refund_look_up', refund.id)
    return
  }
  const attempt = await PaymentAttempt.findByPk(refund.attemptId, { transaction: tx, rejectOnEmpty: true })
  await bookRefund(tx, { refund, attempt, order, now })
  const { id: subjectId, workshopId } = refund
  const at = new Date(now.getTime() + REFUND_LOOK_UP_MS)
  if (facts.state === 'pending') await setDue(tx, { kind: 'refund_look_up', subjectId, workshopId, at })
  else {
    await dropDue(tx, 'refund_look_up', subjectId)
    await mailRefundSent(tx, { refund, order, now })
  }
  crashPoint('refund_before_commit')
}

async function mailRefundSent(
  tx: Transaction,
  { refund, order, now }: { refund: Refund; order: Order; now: Date },
): Promise<void> {
  const { ofOrder } = await orderMailFacts(tx, order)
  await queueMail(tx, {
    kind: 'refund_sent',
    workshopId: order.workshopId,
    personId: order.personId,
    subjectId: refund.id,
    props: {
      ...ofOrder,
      currency: refund.currency,
      amountMinor: refund.amountMinor,
      cause: refund.cause,
      cardEnding: await cardEndingOf(tx, order),
    },
    now,
  })
}
