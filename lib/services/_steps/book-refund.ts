import 'server-only'
import type { Transaction } from 'sequelize'
import { Op } from 'sequelize'
import { refunded, reversed } from '@/lib/core/ledger/entries'
import { roundHalfUp } from '@/lib/core/money/round'
import { creditRefund } from '@/lib/services/_steps/credit-note'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { LedgerEntry, LedgerTransfer, type Order, type PaymentAttempt, Refund } from '@/models'

/** The part of a fee that a share of its charge loses; what a full refund loses is the whole fee, however it is split. */
export function feeShare(fee: number, repaid: number, charged: number): number {
  return roundHalfUp(fee * repaid, charged)
}

/**
 * Books money that is on its way back to a buyer, with the part of the provider's fee that is lost by it, and issues the
 * credit note, which moves the tax. A refund that fails later leaves it standing: the money is still owed.
 * The caller has locked the order. Writes: up to two transfers, one credit note. Repeat: safe, booked once.
 */
export async function bookRefund(
  tx: Transaction,
  given: { refund: Refund; attempt: PaymentAttempt; order: Order; now: Date },
): Promise<void> {
  const { refund, attempt, order, now } = given
  const others = await Refund.findAll({
    where: { attemptId: attempt.id, id: { [Op.ne]: refund.id }, state: ['pending', 'succeeded'] },
    attributes: ['amountMinor'],
    transaction: tx,
  })
  const before = others.reduce((sum, { amountMinor }) => sum + amountMinor, 0)
  const fee = attempt.feeMinor ?? 0
  const feeLost =
    feeShare(fee, before + refund.amountMinor, attempt.amountMinor) -
    feeShare(fee, before, attempt.amountMinor)
  await postLedger(tx, {
    ...sourceOf(refund, order),
    kind: 'refunded',
    at: now,
    entries: refunded({
      amount: refund.amountMinor,
      currency: refund.currency,
      posted: order.postedAt !== null,
      feeLost,
    }),
  })
  await creditRefund(tx, { order, refund, now })
}

/**
 * Takes back what was booked for a refund that failed afterwards; nothing when nothing was booked.
 * Locks: nothing. Writes: one transfer. Repeat: safe, booked once.
 */
export async function bookRefundFailure(
  tx: Transaction,
  { refund, order, now }: { refund: Refund; order: Order; now: Date },
): Promise<void> {
  const booked = await LedgerTransfer.findOne({
    where: { workshopId: refund.workshopId, source: 'refund', sourceId: refund.id, kind: 'refunded' },
    include: [{ model: LedgerEntry, as: 'entries' }],
    transaction: tx,
  })
  if (!booked?.entries) return
  await postLedger(tx, {
    ...sourceOf(refund, order),
    kind: 'refund_failed',
    at: now,
    entries: reversed(booked.entries.map((entry) => entry.facts())),
  })
}

const sourceOf = (refund: Refund, order: Order) => ({
  workshopId: refund.workshopId,
  source: 'refund',
  sourceId: refund.id,
  orderId: order.id,
  runId: order.runId,
})
