import 'server-only'
import type { Transaction } from 'sequelize'
import type { PaymentFacts } from '@/lib/gateways/payments/types'
import { dropDue } from '@/lib/jobs/set-due'
import { askBalance } from '@/lib/services/_steps/ask-balance'
import { modulePageChanged } from '@/lib/services/_steps/module-page-changed'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { mailContract } from '@/lib/services/_steps/mail-contract'
import { saveCard } from '@/lib/services/_steps/save-card'
import { takePlace } from '@/lib/services/_steps/take-place'
import type { LockedPayment } from '@/lib/services/_steps/locked-payment'

/**
 * A deposit counts: the order is reserved (one whose hold had ended takes its place again), the card is remembered for
 * the balance, and the buyer gets the contract on paper. In a run whose balances were asked for, this one is asked for too.
 * Run and order are locked by the caller. Writes: order, counts, saved card, mail, page. Repeat: not safe; called once
 * per capture.
 */
export async function acceptDeposit(
  tx: Transaction,
  { order, run }: LockedPayment,
  payment: PaymentFacts,
  now: Date,
): Promise<void> {
  const isLate = order.state === 'expired'
  const moved = await moveOrder(tx, order, isLate ? 'late_capture' : 'deposit_captured', { now })
  if (!moved.ok) throw new Error(`order ${order.id} cannot take a deposit from ${order.state}`)
  if (isLate) await takePlace(tx, order)
  else await modulePageChanged(tx, run.moduleId)
  await dropDue(tx, 'hold_ended', order.id)
  await saveCard(tx, order, payment, now)
  await mailContract(tx, order, { version: 1, now })
  // Whoever gets a freed place after balances were asked for is asked too.
  if (run.state === 'locked' && run.balancesAskedAt !== null)
    await askBalance(tx, { orderId: order.id, byPersonId: null, now })
}
