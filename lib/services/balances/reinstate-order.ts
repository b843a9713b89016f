import 'server-only'
import type { Transaction } from 'sequelize'
import { depositKept, reversed } from '@/lib/core/ledger/entries'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { announceBalance } from '@/lib/services/_steps/ask-balance'
import { depositThen } from '@/lib/services/_steps/deposit-then'
import { fitsIn } from '@/lib/services/_steps/fits-in'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { issuePrepayment } from '@/lib/services/_steps/prepayment-invoice'
import { repaidOf } from '@/lib/services/_steps/refund-order'
import { takePlace } from '@/lib/services/_steps/take-place'
import { LedgerTransfer, type Order, PaymentAttempt } from '@/models'

/**
 * The owner takes a lapsed order up again whose deposit was kept, as long as its place is free: the deposit counts for it
 * again and its balance is announced anew. One whose deposit went back has nothing left to build on; its buyer orders
 * again.
 * Refuses: not_found · not_allowed (not lapsed, or its deposit went back) · run_not_locked · disputed · no_place.
 * Locks: run, order. Writes: order, counts, ledger, papers, due row, mail, audit. Repeat: refused as not_allowed.
 */
export function reinstateOrder(cmd: { actor: Actor; workshopId: string; orderId: string; now: Date }) {
  const { actor, workshopId, orderId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'order:reinstate', { workshopId })) return refuse('not_found')
    const locked = await lockOrder(tx, orderId)
    if (!locked || locked.order.workshopId !== workshopId) return refuse('not_found')
    const { run, order } = locked
    if (order.state !== 'lapsed' || (await depositThen(tx, order)) !== 'kept') return refuse('not_allowed')
    if (run.state !== 'locked') return refuse('run_not_locked')
    if (order.disputedAt !== null) return refuse('disputed')
    if (!(await fitsIn(tx, order))) return refuse('no_place')
    await takePlace(tx, order)
    await countDepositAgain(tx, order, now)
    const asked = await announceBalance(tx, order, { event: 'reinstate', byPersonId: actor.personId, now })
    return asked.ok ? ok({ state: order.state }) : asked
  })
}

/** What was kept as damages is the buyer's payment again, with papers of its own. */
async function countDepositAgain(tx: Transaction, order: Order, now: Date): Promise<void> {
  const captured = await PaymentAttempt.findAll({
    where: { orderId: order.id, state: 'captured', surplusAt: null },
    order: [['endedAt', 'ASC']],
    transaction: tx,
  })
  const { workshopId, id, runId, currency } = order
  let amount = 0
  for (const attempt of captured) amount += attempt.amountMinor - (await repaidOf(tx, attempt))
  if (amount === 0) return
  const nth = await LedgerTransfer.count({
    where: { workshopId, source: 'order', sourceId: id, kind: 'deposit_counted_again' },
    transaction: tx,
  })
  await postLedger(tx, {
    workshopId,
    source: nth === 0 ? 'order' : `order_${nth + 1}`,
    sourceId: id,
    kind: 'deposit_counted_again',
    orderId: id,
    runId,
    at: now,
    entries: reversed(depositKept({ amount, currency })),
  })
  for (const attempt of captured) await issuePrepayment(tx, { order, attempt, now })
}
