import 'server-only'
import type { Transaction } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { moveUnit } from '@/lib/services/_steps/move-unit'
import { refundOrder } from '@/lib/services/_steps/refund-order'
import { type Order, OrderLine, Unit } from '@/models'

/**
 * The goods of an order withdrawn from are back, or shown to be on their way: price and standard postage go back the way
 * they came, and recorded units can be looked at again.
 * Refuses: not_found · not_allowed (not withdrawn from) · disputed (the bank decides first). Locks: run, order, attempts,
 * units. Writes: order, units, refunds, audit. Repeat: an order that is back answers the same and pays nothing twice.
 */
export function receiveReturn(cmd: { actor: Actor; workshopId: string; orderId: string; now: Date }) {
  const { actor, workshopId, orderId, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'order:receive_return', { workshopId }))
      return refuse('not_found')
    const locked = await lockOrder(tx, orderId)
    if (!locked || locked.order.workshopId !== workshopId) return refuse('not_found')
    const { order } = locked
    if (order.state === 'returned') return ok({ state: order.state, refundMinor: 0 })
    if (order.state !== 'withdrawn') return refuse('not_allowed')
    if (order.disputedAt !== null) return refuse('disputed')
    const by = { now, byPersonId: actor.personId }
    const moved = await moveOrder(tx, order, 'return_received', by)
    if (!moved.ok) return moved
    await returnUnits(tx, order, by)
    const { refundMinor } = await refundOrder(tx, { order, why: 'withdrawn', ...by })
    return ok({ state: order.state, refundMinor })
  })
}

async function returnUnits(
  tx: Transaction,
  order: Order,
  by: { now: Date; byPersonId: string },
): Promise<void> {
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, attributes: ['id'], transaction: tx })
  const units = await Unit.findAll({
    where: { orderLineId: lines.map(({ id }) => id), state: 'posted' },
    order: [['id', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  for (const unit of units) await moveUnit(tx, unit, 'return', by)
}
