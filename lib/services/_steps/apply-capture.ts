import 'server-only'
import type { Transaction } from 'sequelize'
import { balancePaid, changePaid, depositPaid } from '@/lib/core/ledger/entries'
import { freeUnits } from '@/lib/core/orders/free'
import { mayAccept, mayReserveLate } from '@/lib/core/states/order-guards'
import type { PaymentFacts } from '@/lib/gateways/payments/types'
import { acceptBalance } from '@/lib/services/_steps/accept-balance'
import { acceptChange, changeFits, changeOf } from '@/lib/services/_steps/accept-change'
import { acceptDeposit } from '@/lib/services/_steps/accept-deposit'
import { applyFee } from '@/lib/services/_steps/apply-fee'
import { moveAttempt } from '@/lib/services/_steps/move-attempt'
import { noteEffect } from '@/lib/services/_steps/note-effect'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { issuePrepayment } from '@/lib/services/_steps/prepayment-invoice'
import { requestRefund } from '@/lib/services/_steps/request-refund'
import type { LockedPayment } from '@/lib/services/_steps/locked-payment'
import { OrderLine, RunOffer } from '@/models'
import type { RefundCause } from '@/models/words'

/**
 * Money arrived. It counts for its order when order, currency and sum are those asked for and the order still waits for
 * it (or had expired and its place is free); in every other case all of it goes back at once, and the row then tells
 * what really came instead of what was asked for (that stays in its parameters).
 * Run, order and attempt are locked by the caller. Writes: attempt, order, ledger, invoice, mail, or a refund. Repeat: safe, the
 * effect is claimed once per payment.
 */
export async function applyCapture(
  tx: Transaction,
  locked: LockedPayment,
  { payment, sessionId }: { payment: PaymentFacts; sessionId: string | null },
  by: { now: Date; eventId?: string | null },
): Promise<void> {
  const { attempt, order } = locked
  const { now } = by
  const account = attempt.providerAccountId
  const effect = {
    account,
    objectId: payment.payment,
    transition: 'captured',
    eventId: by.eventId ?? null,
    now,
  }
  if (!(await noteEffect(tx, effect))) return

  const backFor = await whyBack(tx, locked, payment)
  const moved = await moveAttempt(tx, attempt, 'capture', now, {
    providerId: payment.payment,
    providerSessionId: sessionId ?? attempt.providerSessionId,
    chargeId: payment.charge,
    failureCode: null,
    ...(backFor === null
      ? {}
      : { surplusAt: now, amountMinor: payment.capturedAmount, currency: payment.currency }),
  })
  if (!moved.ok) throw new Error(`attempt ${attempt.id} cannot be captured from ${attempt.state}`)
  const sum = { amount: payment.capturedAmount, currency: payment.currency }
  const isDeposit = attempt.purpose === 'deposit'
  const isBalance = attempt.purpose === 'balance'
  await postLedger(tx, {
    workshopId: order.workshopId,
    source: 'payment_attempt',
    sourceId: attempt.id,
    kind: isDeposit ? 'deposit_paid' : isBalance ? 'balance_paid' : 'change_paid',
    orderId: order.id,
    runId: order.runId,
    at: now,
    entries: isDeposit ? depositPaid(sum) : isBalance ? balancePaid(sum) : changePaid(sum),
  })
  await applyFee(tx, locked, payment, now)
  if (backFor !== null)
    await requestRefund(tx, { attempt, amountMinor: payment.capturedAmount, why: backFor, now })
  else if (!isDeposit && !isBalance) await acceptChange(tx, locked, now)
  else {
    const invoice = await issuePrepayment(tx, { order, attempt, now })
    if (isDeposit) await acceptDeposit(tx, locked, payment, now)
    else await acceptBalance(tx, locked, { payment, invoice, now })
  }
}

/** Why the money goes back at once; null when it counts. */
async function whyBack(
  tx: Transaction,
  { attempt, order, run }: LockedPayment,
  payment: PaymentFacts,
): Promise<RefundCause | null> {
  const asked = { amount: attempt.amountMinor, currency: attempt.currency, order: order.id }
  const arrived = {
    amount: payment.capturedAmount,
    currency: payment.currency,
    order: payment.about?.orderId ?? '',
  }
  if (!mayAccept(asked, arrived).ok) return 'surplus'
  if (attempt.purpose === 'balance') {
    if (order.state === 'balance_due') return null
    return order.state === 'cancelled' || order.state === 'lapsed' ? 'late_capture' : 'surplus'
  }
  if (attempt.purpose !== 'deposit') {
    const change = await changeOf(tx, attempt)
    return change && (await changeFits(tx, { order, run, change })) ? null : 'order_change'
  }
  if (order.state === 'awaiting_deposit') return null
  if (order.state === 'cancelled' || order.state === 'lapsed') return 'late_capture'
  if (order.state !== 'expired') return 'surplus'
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, transaction: tx })
  const offers = await RunOffer.findAll({ where: { runId: run.id }, transaction: tx })
  const isFree = mayReserveLate({
    run: run.state,
    units: order.unitCount,
    free: freeUnits(run, offers, lines),
  })
  return isFree.ok ? null : 'late_capture'
}
