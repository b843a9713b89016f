import 'server-only'
import { randomUUID } from 'node:crypto'
import { env } from '@/lib/config/env'
import type { PayAnswer } from '@/lib/contracts/orders'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { paths } from '@/lib/paths'
import { type Due, dueOf } from '@/lib/services/_steps/due-of'
import { ensureCustomer } from '@/lib/services/_steps/ensure-customer'
import { truthOfPayment } from '@/lib/services/_steps/look-up-attempt'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { openCardSession } from '@/lib/services/_steps/open-card-session'
import { requestCardSession } from '@/lib/services/_steps/request-card-session'
import { recordTruth, settle } from '@/lib/services/_steps/settle-attempt'
import { Module, Order, PaymentAttempt, Person, Workshop } from '@/models'

type Cmd = { actor: Actor; orderId: string; otherCard?: boolean; now: Date }
type Asked = { order: Order; workshop: Workshop; due: Due; now: Date }
type Reason =
  | 'not_found'
  | 'nothing_to_pay'
  | 'workshop_suspended'
  | 'cannot_charge'
  | 'provider_unreachable'
  | 'provider_refused'
  | 'payment_in_flight'

/**
 * The link for whichever payment of an order is due: the open card session again while it lasts, the bank's page of a
 * balance that wants the buyer (`otherCard` gives that payment up for another card), or a new session.
 * Refuses: not_found · nothing_to_pay (also when the look-up shows that it has been paid) · workshop_suspended ·
 * cannot_charge · provider_unreachable · provider_refused · payment_in_flight (nobody knows yet what became of a charge).
 * Locks: run, order, attempt, in transactions around each call. Writes: at most one new attempt. Repeat: safe; the same
 * link.
 */
export async function payOrder(cmd: Cmd): Promise<Result<PayAnswer, Reason>> {
  const { actor, now } = cmd
  const order = await Order.findByPk(cmd.orderId)
  if (!order || actor.kind !== 'person' || !can(actor, 'order:pay', { personId: order.personId }))
    return refuse('not_found')
  const due = await dueOf(order)
  if (due === null) return refuse('nothing_to_pay')
  const workshop = await Workshop.findByPk(order.workshopId, { rejectOnEmpty: true })
  if (workshop.state !== 'open') return refuse('workshop_suspended')
  const { purpose } = due
  const asked = { order, workshop, due, now }
  const live = await PaymentAttempt.findOne({ where: { orderId: order.id, purpose, state: [...LIVE] } })
  if (live) {
    const again = await continueAttempt(live, asked, cmd.otherCard ?? false)
    if (again !== 'over') return again
  }
  return startAttempt(asked)
}

/** What a payment that was begun leads to; 'over' when it can never be finished and a new one may begin. */
async function continueAttempt(
  live: PaymentAttempt,
  asked: Asked,
  otherCard: boolean,
): Promise<Result<PayAnswer, Reason> | 'over'> {
  const { now } = asked
  const settled = await settle(live.id, { now })
  // The provider does not answer; the link it gave before is still good.
  if (!settled.ok) return live.payUrl ? ok({ payUrl: live.payUrl }) : refuse('provider_unreachable')
  const { attempt, truth } = settled.value
  if (attempt.state === 'captured') return refuse('nothing_to_pay')
  if (attempt.state === 'failed' || attempt.state === 'abandoned') return 'over'
  if (truth.state === 'open' && truth.url !== null) return ok({ payUrl: truth.url })
  if (attempt.state === 'needs_customer') return finish(attempt, asked, otherCard)
  if (attempt.method === 'checkout' && truth.state === 'never_had_it') return open(attempt.id, now)
  return refuse('payment_in_flight')
}

async function finish(
  attempt: PaymentAttempt,
  { order, now }: Asked,
  otherCard: boolean,
): Promise<Result<PayAnswer, Reason> | 'over'> {
  const account = attempt.providerAccountId
  const payment = attempt.providerId ?? ''
  const key = `finish:${attempt.id}:${randomUUID()}`
  if (otherCard) {
    const cancelled = await payments().cancelPayment({ account, key, payment })
    if (!cancelled.ok) return refuse('provider_unreachable')
    await recordTruth(attempt.id, truthOfPayment(cancelled.value), { now })
    return cancelled.value.state === 'captured' ? refuse('nothing_to_pay') : 'over'
  }
  const returnUrl = `${env().BASE_URL}${paths.accountOrder(order.id)}?paid=1`
  const done = await payments().finishPayment({ account, key, payment, returnUrl })
  if (!done.ok) return refuse('provider_unreachable')
  if (done.value.state === 'go') return ok({ payUrl: done.value.url })
  const recorded = await recordTruth(attempt.id, truthOfPayment(done.value.payment), { now })
  if (recorded.ok && recorded.value.state === 'captured') return refuse('nothing_to_pay')
  return done.value.state === 'failed' ? 'over' : refuse('payment_in_flight')
}

async function startAttempt(asked: Asked): Promise<Result<PayAnswer, Reason>> {
  const { workshop, now } = asked
  const { purpose } = asked.due
  const person = await Person.findByPk(asked.order.personId, { rejectOnEmpty: true })
  const customer = await ensureCustomer(workshop, person, now)
  if (!customer.ok) return customer
  const requested = await inTransaction(async (tx) => {
    const locked = await lockOrder(tx, asked.order.id)
    const due = locked && (await dueOf(locked.order, tx))
    if (!locked || due?.purpose !== purpose) return refuse('nothing_to_pay')
    const where = { orderId: asked.order.id, purpose, state: [...LIVE] }
    // Two presses at once: the second shares the first one's session.
    const other = await PaymentAttempt.findOne({ where, transaction: tx })
    if (other) return ok({ attemptId: other.id })
    const module = await Module.findByPk(locked.run.moduleId, { transaction: tx, rejectOnEmpty: true })
    const attempt = await requestCardSession(tx, {
      order: locked.order,
      due,
      workshop,
      module,
      customer: customer.value,
      now,
    })
    return ok({ attemptId: attempt.id })
  })
  return requested.ok ? open(requested.value.attemptId, now) : requested
}

async function open(attemptId: string, now: Date): Promise<Result<PayAnswer, Reason>> {
  const session = await openCardSession(attemptId, now)
  if (!session.ok) return session
  const { payUrl } = session.value
  return payUrl === null ? refuse('provider_unreachable') : ok({ payUrl })
}
