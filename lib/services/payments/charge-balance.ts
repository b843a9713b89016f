import 'server-only'
import type { Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { paymentDescription } from '@/lib/messages/payments'
import { SavedCardParams } from '@/lib/services/_steps/attempt-params'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { lookUpAttempt, truthOfPayment, type Truth } from '@/lib/services/_steps/look-up-attempt'
import { LIVE, moveAttempt } from '@/lib/services/_steps/move-attempt'
import { noteBalanceFailed } from '@/lib/services/_steps/note-balance-failed'
import { requestAttempt } from '@/lib/services/_steps/request-attempt'
import { recordTruth } from '@/lib/services/_steps/settle-attempt'
import { Module, type Order, PaymentAttempt, ProviderCustomer, type Run, Workshop } from '@/models'

/** What became of a balance: 'in_flight' will be ended by an event or a look-up; 'not_due' needs nothing. */
export type BalanceOutcome = 'captured' | 'needs_customer' | 'failed' | 'in_flight' | 'no_card' | 'not_due'

type Begun = { attemptId: string } | { outcome: BalanceOutcome }

/**
 * Charges one order's balance on the saved card, the buyer absent. Where the bank wants the buyer or the card fails, a
 * mail says so with the link to pay, and reminders and lapse count from the first failure. While the order is disputed or
 * the workshop suspended nothing is charged. For tasks: a bulk job works through the orders of a run.
 * Refuses: not_found · disputed · workshop_suspended · rate_limited (certainly not done: try again).
 * Locks: run, order, attempt, around the call. Writes: attempt, order, ledger, mail, due rows. Repeat: safe; a live or
 * captured attempt is never doubled.
 */
export async function chargeBalance(cmd: {
  orderId: string
  now: Date
}): Promise<
  Result<
    { outcome: BalanceOutcome },
    'not_found' | 'disputed' | 'workshop_suspended' | 'cannot_charge' | 'rate_limited'
  >
> {
  const { orderId, now } = cmd
  const begun = await inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    return locked ? begin(tx, locked, now) : refuse('not_found')
  })
  if (!begun.ok) return begun
  if ('outcome' in begun.value) return ok({ outcome: begun.value.outcome })
  return charge(begun.value.attemptId, now)
}

async function begin(
  tx: Transaction,
  { run, order }: { run: Run; order: Order },
  now: Date,
): Promise<Result<Begun, 'disputed' | 'workshop_suspended' | 'cannot_charge'>> {
  if (order.state !== 'balance_due') return ok({ outcome: 'not_due' })
  if (order.disputedAt !== null) return refuse('disputed')
  const workshop = await Workshop.findByPk(order.workshopId, { transaction: tx, rejectOnEmpty: true })
  if (workshop.state !== 'open') return refuse('workshop_suspended')
  const account = workshop.providerAccountId
  if (account === null) return refuse('cannot_charge')
  const where = { orderId: order.id, purpose: 'balance', state: [...LIVE] }
  const live = await PaymentAttempt.findOne({ where, transaction: tx })
  if (live?.state === 'requested' && live.method === 'saved_card') return ok({ attemptId: live.id })
  if (live) return ok({ outcome: live.state === 'needs_customer' ? 'needs_customer' : 'in_flight' })

  const customer = await ProviderCustomer.findOne({
    where: { workshopId: order.workshopId, personId: order.personId },
    transaction: tx,
  })
  const method = customer?.providerAccountId === account ? customer.methodId : null
  if (!customer || method === null) {
    await noteBalanceFailed(tx, { order, run, subjectId: order.id, why: 'no_card', now })
    return ok({ outcome: 'no_card' })
  }
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  const attempt = await requestAttempt(tx, {
    order,
    purpose: 'balance',
    amountMinor: order.balanceMinor,
    method: 'saved_card',
    account,
    now,
    paramsOf: (attemptId) => ({
      account,
      customer: customer.providerId,
      method,
      orderId: order.id,
      attemptId,
      purpose: 'balance',
      amount: order.balanceMinor,
      currency: order.currency,
      description: paymentDescription.balance(module.name, order.number),
    }),
  })
  return ok({ attemptId: attempt.id })
}

async function charge(
  attemptId: string,
  now: Date,
): Promise<Result<{ outcome: BalanceOutcome }, 'not_found' | 'rate_limited'>> {
  const attempt = await PaymentAttempt.findByPk(attemptId, { rejectOnEmpty: true })
  const { amount, ...params } = SavedCardParams.parse(attempt.params)
  crashPoint('balance_requested')
  const done = await payments().chargeSavedCard({
    ...params,
    amount: minor(amount),
    key: attempt.idempotencyKey,
  })
  crashPoint('balance_provider_answered')
  if (!done.ok && done.reason === 'rate_limited') return refuse('rate_limited')
  if (!done.ok && done.reason !== 'unknown_outcome') return failed(attemptId, done.reason, now)
  const truth: Truth = done.ok ? truthOfPayment(done.value.payment) : await lookUpAttempt(attempt)
  if (truth.state === 'never_had_it' || truth.state === 'unavailable') return lost(attemptId, now)
  const recorded = await recordTruth(attemptId, truth, { now })
  crashPoint('balance_sent')
  if (!recorded.ok) return recorded
  const { state } = recorded.value
  return ok({
    outcome: state === 'captured' || state === 'failed' || state === 'needs_customer' ? state : 'in_flight',
  })
}

async function lost(attemptId: string, now: Date) {
  return inTransaction(async (tx) => {
    const attempt = await PaymentAttempt.findByPk(attemptId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    await moveAttempt(tx, attempt, 'lose_answer', now)
    return ok({ outcome: 'in_flight' as const })
  })
}

/** The provider would not take the request as it stands: no money moved, the buyer pays on the card page. */
async function failed(attemptId: string, code: string, now: Date) {
  return inTransaction(async (tx) => {
    const seen = await PaymentAttempt.findByPk(attemptId, { transaction: tx, rejectOnEmpty: true })
    const locked = await lockOrder(tx, seen.orderId)
    if (!locked) return refuse('not_found')
    const attempt = await PaymentAttempt.findByPk(attemptId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const moved = await moveAttempt(tx, attempt, 'fail', now, { failureCode: code })
    if (moved.ok) await noteBalanceFailed(tx, { ...locked, subjectId: attemptId, why: 'declined', now })
    return ok({ outcome: 'failed' as const })
  })
}
