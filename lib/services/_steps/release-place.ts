import 'server-only'
import type { Transaction } from 'sequelize'
import { enqueue } from '@/lib/jobs/enqueue'
import { countPlace } from '@/lib/services/_steps/take-place'
import type { Order } from '@/models'

/**
 * Gives back the place of an order that had one (awaiting deposit, reserved, balance due, paid or packed) and no longer
 * has; a job then offers it to whoever waits, if the run still may.
 * Locks: the run, then its offers. Writes: the counts, one job. Repeat: not safe; call it in the transaction of the move.
 */
export async function releasePlace(tx: Transaction, order: Order): Promise<void> {
  const run = await countPlace(tx, order, -1)
  await enqueue(tx, 'offer_freed_place', { runId: run.id }, { key: `offer_freed_place:${run.id}` })
}
