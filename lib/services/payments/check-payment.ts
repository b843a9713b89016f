import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { LIVE } from '@/lib/services/_steps/move-attempt'
import { settle } from '@/lib/services/_steps/settle-attempt'
import { Order, PaymentAttempt } from '@/models'

/**
 * The buyer comes back from the card page: asks the provider about the payments still open, so that nobody waits for an
 * event that is late or lost.
 * Refuses: not_found · provider_unreachable. Locks: run, order, attempt. Writes: what the provider says. Repeat: safe.
 */
export async function checkPayment(cmd: { actor: Actor; orderId: string; now: Date }) {
  const { actor, orderId, now } = cmd
  const order = await Order.findByPk(orderId)
  if (!order || actor.kind !== 'person' || !can(actor, 'order:pay', { personId: order.personId }))
    return refuse('not_found')
  const live = await PaymentAttempt.findAll({ where: { orderId, state: [...LIVE] }, attributes: ['id'] })
  for (const { id } of live) {
    const settled = await settle(id, { now })
    if (!settled.ok) return settled
  }
  await order.reload()
  return ok({ state: order.state })
}
