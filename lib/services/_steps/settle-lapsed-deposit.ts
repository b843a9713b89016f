import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { depositKept } from '@/lib/core/ledger/entries'
import { sequelize } from '@/lib/db/sequelize'
import { creditStanding } from '@/lib/services/_steps/credit-note'
import { depositThen } from '@/lib/services/_steps/deposit-then'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { refundOrder, repaidOf } from '@/lib/services/_steps/refund-order'
import { LedgerTransfer, type Order, PaymentAttempt } from '@/models'

/**
 * Gives a lapsed order's deposit back, or books it as kept where terms and law allow that. A kept deposit counts as
 * damages: tax booked on it when it came in is taken back (own rule; ask an adviser).
 * The caller has locked the order. Writes: refunds and jobs, or a ledger transfer. Repeat: safe.
 */
export async function settleLapsedDeposit(
  tx: Transaction,
  order: Order,
  now: Date,
): Promise<'returned' | 'kept'> {
  const then = await depositThen(tx, order)
  if (then === 'returned') {
    await refundOrder(tx, { order, why: 'lapsed', now })
    return then
  }
  const captured = await PaymentAttempt.findAll({
    where: { orderId: order.id, state: 'captured' },
    transaction: tx,
  })
  let amount = 0
  for (const attempt of captured) amount += attempt.amountMinor - (await repaidOf(tx, attempt))
  if (amount === 0) return then
  const nth = await LedgerTransfer.count({
    where: { orderId: order.id, kind: 'deposit_kept' },
    transaction: tx,
  })
  await postLedger(tx, {
    workshopId: order.workshopId,
    // An order taken up again may lapse again, and the books take one movement of a kind per source.
    source: nth === 0 ? 'order' : `order_${nth + 1}`,
    sourceId: order.id,
    kind: 'deposit_kept',
    orderId: order.id,
    runId: order.runId,
    at: now,
    entries: depositKept({ amount, currency: order.currency, taxBooked: await taxBookedOn(tx, order) }),
  })
  await creditStanding(tx, order, now)
  return then
}

/** Tax that fell due when the deposit came in and waits for the posting that will not be. */
async function taxBookedOn(tx: Transaction, order: Order): Promise<number> {
  const [row] = await sequelize.query<{ sum: number }>(
    `select coalesce(sum(e.amount_minor), 0)::bigint as sum
     from ledger_entries e join ledger_transfers t on t.id = e.transfer_id
     where t.order_id = $orderId and e.account = 'tax_on_deposits'`,
    { bind: { orderId: order.id }, type: QueryTypes.SELECT, transaction: tx },
  )
  return row?.sum ?? 0
}
