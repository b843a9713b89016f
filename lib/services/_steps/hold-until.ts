import 'server-only'
import type { Transaction } from 'sequelize'
import { setDue } from '@/lib/jobs/set-due'
import type { Order } from '@/models'

/**
 * Holds an unpaid place at least until an instant (the end of the card session), and never shorter than before.
 * The caller has locked the order. Writes: the order, its due row. Repeat: safe.
 */
export async function holdUntil(tx: Transaction, order: Order, until: Date): Promise<void> {
  const at = order.holdUntil !== null && order.holdUntil > until ? order.holdUntil : until
  await order.update({ holdUntil: at }, { transaction: tx })
  await setDue(tx, { kind: 'hold_ended', subjectId: order.id, workshopId: order.workshopId, at })
}
