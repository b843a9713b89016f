import 'server-only'
import type { Transaction } from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { Purpose } from '@/lib/gateways/payments/types'
import { type Order, OrderChange } from '@/models'

/** Which payment of an order is due, and how much it is. */
export type Due = { purpose: Purpose; amountMinor: Minor }

export const isChange = (purpose: Purpose): purpose is `change-${number}` => purpose.startsWith('change-')

/**
 * The payment an order waits for: its deposit, its balance, or the difference of a change that is not paid yet; null when
 * none is due.
 * Locks: nothing. Writes: nothing. One statement at most.
 */
export async function dueOf(order: Order, tx?: Transaction): Promise<Due | null> {
  if (order.state === 'awaiting_deposit') return { purpose: 'deposit', amountMinor: order.depositMinor }
  if (order.state === 'balance_due') return { purpose: 'balance', amountMinor: order.balanceMinor }
  if (order.state !== 'reserved') return null
  const change = await openChange(order.id, tx)
  return change && { purpose: `change-${change.number}`, amountMinor: change.differenceMinor }
}

/** The change of an order whose difference is not paid yet; null without one. Locks, writes: nothing. */
export function openChange(orderId: string, tx?: Transaction): Promise<OrderChange | null> {
  return OrderChange.findOne({
    where: { orderId, appliedAt: null, droppedAt: null },
    order: [['number', 'DESC']],
    ...(tx && { transaction: tx }),
  })
}
