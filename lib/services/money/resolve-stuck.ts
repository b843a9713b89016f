import 'server-only'
import type { StuckInput } from '@/lib/contracts/money-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { enqueue } from '@/lib/jobs/enqueue'
import { recordDispute } from '@/lib/services/_steps/record-dispute'
import { recordRefund } from '@/lib/services/_steps/record-refund'
import { repaidOf } from '@/lib/services/_steps/refund-order'
import { requestRefund } from '@/lib/services/_steps/request-refund'
import { settle } from '@/lib/services/_steps/settle-attempt'
import { Dispute, Order, PaymentAttempt, ProviderEvent, Refund, Workshop } from '@/models'

type Asked = { workshopId: string; id: string; now: Date; byPersonId: string }

/**
 * Takes up one thing that is stuck, in the one way that cannot do harm: a payment, refund or dispute is looked up at the
 * provider and its word written down; a refund that waits is sent by its job under its own key; one that failed is asked
 * for anew under a new key, as far as the payment still holds it; an event is applied again.
 * Refuses: not_found · not_allowed (a failed refund without anything left, or already asked for anew) · disputed ·
 * provider_unreachable. Locks: as what it calls. Writes: what the provider says, at most one new refund, one job. Repeat:
 * safe.
 */
export async function resolveStuck(cmd: { actor: Actor; workshopId: string; input: StuckInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'refund:retry', { workshopId })) return refuse('not_found')
  const asked = { workshopId, id: input.id, now, byPersonId: actor.personId }
  switch (input.kind) {
    case 'attempt':
      return lookUpPayment(asked)
    case 'refund':
      return takeUpRefund(asked)
    case 'dispute':
      return lookUpDispute(asked)
    case 'event':
      return applyAgain(asked)
  }
}

async function lookUpPayment({ workshopId, id, now }: Asked) {
  const seen = await PaymentAttempt.findOne({ where: { id, workshopId }, attributes: ['id'] })
  if (!seen) return refuse('not_found')
  const settled = await settle(id, { now })
  return settled.ok ? ok({ state: settled.value.attempt.state as string }) : settled
}

async function takeUpRefund(asked: Asked) {
  const { workshopId, id, now } = asked
  const seen = await Refund.findOne({
    where: { id, workshopId },
    include: [{ model: PaymentAttempt, as: 'attempt' }],
  })
  if (!seen?.attempt) return refuse('not_found')
  if (seen.state === 'failed') return askAnew(asked)
  if (seen.state === 'requested' || seen.state === 'unknown' || seen.providerId === null)
    return inTransaction(async (tx) => {
      await enqueue(tx, 'send_refund', { refundId: id }, { key: `send_refund:${id}` })
      return ok({ state: seen.state as string })
    })
  const account = seen.attempt.providerAccountId
  const found = await payments().getRefund({ account, refund: seen.providerId })
  if (!found.ok) return refuse('provider_unreachable')
  return inTransaction(async (tx) => {
    const refund = await Refund.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
    if (found.value.state !== refund.state) await recordRefund(tx, refund, found.value, now)
    return ok({ state: refund.state as string })
  })
}

/** A failed refund is over; its sum, if the payment still holds it, is asked for under a key of its own. */
function askAnew({ workshopId, id, now, byPersonId }: Asked) {
  return inTransaction(async (tx) => {
    const failed = await Refund.findOne({ where: { id, workshopId }, transaction: tx, rejectOnEmpty: true })
    const attempt = await PaymentAttempt.findByPk(failed.attemptId, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const order = await Order.findByPk(failed.orderId, { transaction: tx, rejectOnEmpty: true })
    if (order.disputedAt !== null) return refuse('disputed')
    const repeated = await Refund.count({ where: { retryOfId: id }, transaction: tx })
    const left = attempt.amountMinor - (await repaidOf(tx, attempt))
    if (repeated > 0 || left < failed.amountMinor) return refuse('not_allowed')
    const { amountMinor, cause: why, reason } = failed
    const again = await requestRefund(tx, {
      attempt,
      amountMinor,
      why,
      reason,
      byPersonId,
      retryOfId: id,
      now,
    })
    return ok({ state: again.state as string })
  })
}

async function lookUpDispute({ workshopId, id, now }: Asked) {
  const seen = await Dispute.findOne({ where: { id, workshopId } })
  const workshop = await Workshop.findByPk(workshopId, { rejectOnEmpty: true })
  const account = workshop.providerAccountId
  if (!seen || account === null) return refuse('not_found')
  const found = await payments().getDispute({ account, dispute: seen.providerId })
  if (!found.ok) return refuse('provider_unreachable')
  return ok({ state: await recordDispute(account, found.value, now) })
}

async function applyAgain({ workshopId, id }: Asked) {
  const workshop = await Workshop.findByPk(workshopId, { rejectOnEmpty: true })
  const account = workshop.providerAccountId
  const event = account === null ? null : await ProviderEvent.findOne({ where: { id, account } })
  if (!event) return refuse('not_found')
  return inTransaction(async (tx) => {
    await enqueue(tx, 'apply_provider_event', { eventId: id }, { key: `apply_provider_event:${id}` })
    return ok({ state: event.outcome ?? 'waiting' })
  })
}
