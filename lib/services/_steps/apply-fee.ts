import 'server-only'
import type { Transaction } from 'sequelize'
import { feeCharged } from '@/lib/core/ledger/entries'
import { postings } from '@/lib/core/ledger/postings'
import type { PaymentFacts } from '@/lib/gateways/payments/types'
import { feeShare } from '@/lib/services/_steps/book-refund'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { type Order, type PaymentAttempt, Refund } from '@/models'

/**
 * Books the provider's fee for a captured payment once it is known, and the part of it that refunds booked before have
 * already lost. The caller has locked the attempt.
 * Locks: nothing more. Writes: the attempt's fee, up to two transfers. Repeat: safe, booked once.
 */
export async function applyFee(
  tx: Transaction,
  { attempt, order }: { attempt: PaymentAttempt; order: Order },
  payment: PaymentFacts,
  now: Date,
): Promise<void> {
  if (payment.fee === null || attempt.feeMinor !== null || payment.feeCurrency === null) return
  await attempt.update({ feeMinor: payment.fee }, { transaction: tx })
  if (payment.fee === 0) return
  const { id: sourceId, workshopId } = attempt
  const source = {
    workshopId,
    source: 'payment_attempt',
    sourceId,
    orderId: order.id,
    runId: order.runId,
    at: now,
  }
  const currency = payment.feeCurrency
  await postLedger(tx, {
    ...source,
    kind: 'fee_charged',
    entries: feeCharged({ amount: payment.fee, currency }),
  })
  const booked = await Refund.findAll({
    where: { attemptId: attempt.id, state: ['pending', 'succeeded'] },
    attributes: ['amountMinor'],
    transaction: tx,
  })
  const repaid = booked.reduce((sum, { amountMinor }) => sum + amountMinor, 0)
  const lost = feeShare(payment.fee, repaid, attempt.amountMinor)
  if (lost === 0) return
  const entries = postings(currency, { processing_fees: -lost, fees_lost_on_refunds: lost })
  await postLedger(tx, { ...source, kind: 'fee_lost', entries })
}
