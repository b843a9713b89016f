import 'server-only'
import type { Transaction } from 'sequelize'
import { Order } from '@/models'

/** Units under deposit of a run that takes deposits; orders entered by hand do not count. Locks, writes: nothing. */
export const countDeposited = async (tx: Transaction, runId: string): Promise<number> =>
  (await Order.sum('unitCount', { where: { runId, kind: 'paid', state: 'reserved' }, transaction: tx })) ?? 0
