import 'server-only'
import { minor, type Minor } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import type { ChangeReason, RefundFacts } from '@/lib/gateways/payments/types'
import { setDue } from '@/lib/jobs/set-due'
import { failRefund } from '@/lib/services/_steps/fail-refund'
import { moveRefund } from '@/lib/services/_steps/move-refund'
import { recordRefund } from '@/lib/services/_steps/record-refund'
import { Order, PaymentAttempt, Refund } from '@/models'

/** A provider may forget a key after 24 hours; an older request is looked up before it is sent again. */
const KEY_IS_SURE_MS = 12 * 3_600_000
/** A look-up is final only when the request can no longer be under way. */
const FINAL_AFTER_MS = 60_000
const LOOK_UP_AGAIN_MS = 60_000

type Sent =
  | { state: 'answered'; facts: RefundFacts; shortBy?: Minor }
  | { state: 'short'; byMinor: Minor }
  | { state: 'never_had_it' }
  | { state: 'unknown' }
  | { state: 'refused'; reason: ChangeReason }

/**
 * Sends one requested refund to the provider, under its own stored key (act 1 was writing it down with its cause).
 * While the order is disputed it stays; a balance too small leaves a successor that names the shortfall; an answer that
 * was lost is looked up, now or when its due row comes.
 * Refuses: not_found · rate_limited (certainly not done: the job runs again). Locks: the refund while it is recorded.
 * Writes: the refund, ledger, mail. Repeat: safe; one key, one refund.
 */
export async function sendRefund(cmd: { refundId: string; isRepeat: boolean; now: Date }) {
  const refund = await Refund.findByPk(cmd.refundId, { include: [{ model: PaymentAttempt, as: 'attempt' }] })
  const payment = refund?.attempt?.providerId
  if (!refund || !refund.attempt || !payment) return refuse('not_found')
  if (refund.state !== 'requested' && refund.state !== 'unknown') return ok({ state: refund.state })
  const order = await Order.findByPk(refund.orderId, { rejectOnEmpty: true })
  if (order.disputedAt !== null) return ok({ state: refund.state })

  crashPoint('refund_requested')
  const sent = await send(refund, { account: refund.attempt.providerAccountId, payment, ...cmd })
  crashPoint('refund_provider_answered')
  if (sent.state === 'refused' && sent.reason === 'rate_limited') return refuse('rate_limited')
  const recorded = await record(refund.id, sent, cmd.now)
  crashPoint('refund_sent')
  return recorded
}

async function send(
  refund: Refund,
  at: { account: string; payment: string; isRepeat: boolean; now: Date },
): Promise<Sent> {
  const { account, payment, now } = at
  const age = now.getTime() - refund.requestedAt.getTime()
  const lookUp = { account, payment, refundId: refund.id }
  if (refund.state === 'unknown' || at.isRepeat || age > KEY_IS_SURE_MS) {
    const found = await payments().findRefund(lookUp)
    if (found.ok) return { state: 'answered', facts: found.value }
    if (found.reason !== 'not_found') return { state: 'unknown' }
    if (refund.state === 'unknown') return { state: age >= FINAL_AFTER_MS ? 'never_had_it' : 'unknown' }
  }
  const { amountMinor: amount, currency, idempotencyKey: key } = refund
  const done = await payments().refund({ account, key, payment, amount, currency, refundId: refund.id })
  if (done.ok) {
    const isShort = done.value.failure === 'insufficient_funds'
    const shortBy = isShort ? { shortBy: await shortfall(account, amount, currency) } : {}
    return { state: 'answered', facts: done.value, ...shortBy }
  }
  if (done.reason === 'insufficient_balance')
    return { state: 'short', byMinor: await shortfall(account, amount, currency) }
  if (done.reason !== 'unknown_outcome') return { state: 'refused', reason: done.reason }
  const found = await payments().findRefund(lookUp)
  return found.ok ? { state: 'answered', facts: found.value } : { state: 'unknown' }
}

/** By how much the balance falls short of a refund; all of it when the provider does not say. */
async function shortfall(account: string, amount: Minor, currency: string): Promise<Minor> {
  const balance = await payments().balance({ account })
  if (!balance.ok) return amount
  const sum = [...balance.value.available, ...balance.value.pending]
    .filter((each) => each.currency === currency)
    .reduce((total, each) => total + each.amount, 0)
  return minor(Math.min(amount, Math.max(1, amount - sum)))
}

async function record(refundId: string, sent: Sent, now: Date): Promise<Result<{ state: string }, string>> {
  return inTransaction(async (tx) => {
    const refund = await Refund.findByPk(refundId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const { id: subjectId, workshopId } = refund
    if (sent.state === 'answered') await recordRefund(tx, refund, sent.facts, now, sent.shortBy)
    else if (sent.state === 'short')
      await failRefund(tx, refund, {
        code: 'insufficient_balance',
        shortByMinor: sent.byMinor,
        isTriedAgain: true,
        now,
      })
    else if (sent.state === 'never_had_it')
      await failRefund(tx, refund, { code: 'never_arrived', isTriedAgain: true, now })
    else if (sent.state === 'refused')
      await failRefund(tx, refund, { code: sent.reason, isTriedAgain: false, now })
    else {
      await moveRefund(tx, refund, 'lose_answer', now, { sentAt: refund.sentAt ?? now })
      const at = new Date(now.getTime() + LOOK_UP_AGAIN_MS)
      await setDue(tx, { kind: 'refund_look_up', subjectId, workshopId, at })
    }
    return ok({ state: refund.state })
  })
}
