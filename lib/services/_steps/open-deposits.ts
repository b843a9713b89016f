import 'server-only'
import type { Transaction } from 'sequelize'
import { ok, refuse, type Result } from '@/lib/core/result'
import { endOpenPayments } from '@/lib/services/_steps/end-open-payments'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { Order, PaymentAttempt } from '@/models'

const liveDeposits = (runId: string, tx: Transaction | null) =>
  PaymentAttempt.findAll({
    where: { purpose: 'deposit', state: [...LIVE] },
    attributes: ['orderId', 'state'],
    include: [{ model: Order, as: 'order', attributes: [], required: true, where: { runId } }],
    transaction: tx,
  })

/**
 * Card pages still open for deposits of a run, and deposits nobody can say anything of.
 * Locks, writes: nothing.
 */
export async function openDeposits(
  tx: Transaction,
  runId: string,
): Promise<{ openSessions: number; unknownAttempts: number }> {
  const live = await liveDeposits(runId, tx)
  const unknownAttempts = live.filter(({ state }) => state === 'unknown').length
  return { openSessions: live.length - unknownAttempts, unknownAttempts }
}

/**
 * Makes sure that no deposit of a run can be captured any more without being written down: open card sessions are expired
 * at the provider. Outside any transaction. A buyer who was faster has paid.
 * Refuses: attempt_unknown (the provider has not said what became of one). Repeat: safe.
 */
export async function endDeposits(runId: string, now: Date): Promise<Result<true, 'attempt_unknown'>> {
  const live = await liveDeposits(runId, null)
  for (const orderId of new Set(live.map((attempt) => attempt.orderId))) {
    const ended = await endOpenPayments(orderId, now)
    if (!ended.ok) return refuse('attempt_unknown')
  }
  return ok(true)
}
