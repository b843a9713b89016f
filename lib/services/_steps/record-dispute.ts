import 'server-only'
import type { Transaction } from 'sequelize'
import { disputed, disputeLost, disputeWon, type Entry } from '@/lib/core/ledger/entries'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import type { DisputeFacts } from '@/lib/gateways/payments/types'
import { enqueue } from '@/lib/jobs/enqueue'
import { openParcelForOrder } from '@/lib/services/_steps/open-parcel-for-order'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { recordMove } from '@/lib/services/_steps/record-move'
import { refundOrder } from '@/lib/services/_steps/refund-order'
import { Dispute, type Order, PaymentAttempt, Refund } from '@/models'
import type { DisputeState } from '@/models/words'

const STATE: Readonly<Record<DisputeFacts['state'], DisputeState>> = {
  needs_response: 'open',
  under_review: 'open',
  won: 'won',
  closed: 'won',
  lost: 'lost',
}

/**
 * Writes down a dispute of a payment of ours: it stops packing, lapse and refund of its order while it is open, and for
 * good when it is lost, since the buyer then has the money back. When it is won, what an ended order still owes goes
 * back.
 * Locks: run, order. Writes: dispute, order, ledger, audit, perhaps refunds. Repeat: safe; a decided one stays decided.
 */
export async function recordDispute(account: string, facts: DisputeFacts, now: Date): Promise<string> {
  const attempt =
    facts.payment === null
      ? null
      : await PaymentAttempt.findOne({ where: { providerAccountId: account, providerId: facts.payment } })
  if (!attempt) return 'not_ours'
  const done = await inTransaction(async (tx) => {
    const locked = await lockOrder(tx, attempt.orderId)
    if (!locked) return ok({ state: 'not_ours' })
    return ok({ state: await write(tx, locked.order, attempt, facts, now) })
  })
  return done.value.state
}

async function write(
  tx: Transaction,
  order: Order,
  attempt: PaymentAttempt,
  facts: DisputeFacts,
  now: Date,
): Promise<string> {
  const { workshopId } = order
  const [row, isNew] = await Dispute.findOrCreate({
    where: { providerId: facts.id },
    defaults: {
      workshopId,
      orderId: order.id,
      attemptId: attempt.id,
      providerId: facts.id,
      amountMinor: facts.amount,
      currency: facts.currency,
      reason: facts.reason,
      evidenceDueAt: facts.answerBy,
      openedAt: facts.createdAt,
    },
    transaction: tx,
  })
  const from = isNew ? null : row.state
  const to = STATE[facts.state]
  if (row.state !== 'open') return row.state
  const sum = { amount: facts.amount, currency: facts.currency }
  if (facts.isWithheld) await book(tx, order, row, 'disputed', disputed({ ...sum, fee: facts.fee }), now)
  if (from !== to) await audit(tx, row, { from, to, now })
  if (to === 'open') {
    await order.update({ disputedAt: order.disputedAt ?? facts.createdAt }, { transaction: tx })
    return to
  }
  await row.update({ state: to, closedAt: now }, { transaction: tx })
  const isPosted = order.postedAt !== null
  if (facts.isWithheld)
    await book(
      tx,
      order,
      row,
      to === 'won' ? 'dispute_won' : 'dispute_lost',
      to === 'won' ? disputeWon(sum) : disputeLost({ ...sum, posted: isPosted }),
      now,
    )
  if (to === 'won') await release(tx, order, now)
  else await order.update({ disputedAt: order.disputedAt ?? facts.createdAt }, { transaction: tx })
  return to
}

/** No dispute stands in the way any more: refunds that waited go out. */
async function release(tx: Transaction, order: Order, now: Date): Promise<void> {
  const others = await Dispute.count({
    where: { orderId: order.id, state: ['open', 'lost'] },
    transaction: tx,
  })
  if (others > 0) return
  await order.update({ disputedAt: null }, { transaction: tx })
  await openParcelForOrder(tx, order, now)
  if (order.state === 'cancelled' || order.state === 'lapsed')
    await refundOrder(tx, { order, why: order.state === 'lapsed' ? 'lapsed' : 'cancelled', now })
  const waiting = await Refund.findAll({
    where: { orderId: order.id, state: 'requested' },
    attributes: ['id'],
    transaction: tx,
  })
  for (const { id } of waiting) await enqueue(tx, 'send_refund', { refundId: id })
}

async function book(
  tx: Transaction,
  order: Order,
  row: Dispute,
  kind: string,
  entries: Entry[],
  now: Date,
): Promise<void> {
  const { workshopId, id: orderId, runId } = order
  await postLedger(tx, {
    workshopId,
    source: 'dispute',
    sourceId: row.id,
    kind,
    orderId,
    runId,
    at: now,
    entries,
  })
}

async function audit(
  tx: Transaction,
  row: Dispute,
  { from, to, now }: { from: string | null; to: string; now: Date },
): Promise<void> {
  await recordMove(tx, {
    workshopId: row.workshopId,
    subjectType: 'dispute',
    subjectId: row.id,
    from,
    event: from === null ? 'open' : to,
    to,
    byPersonId: null,
    at: now,
  })
}
