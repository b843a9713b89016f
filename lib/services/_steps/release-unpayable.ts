import 'server-only'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { dropDue } from '@/lib/jobs/set-due'
import { lockOrder } from '@/lib/services/_steps/lock-order'
import { moveOrder } from '@/lib/services/_steps/move-order'
import { releasePlace } from '@/lib/services/_steps/release-place'

/**
 * Gives back the place of an order whose card page the provider certainly refused to open.
 * Locks: run, order. Writes: order, counts, job. Repeat: safe.
 */
export async function releaseUnpayable(orderId: string, now: Date): Promise<void> {
  await inTransaction(async (tx) => {
    const locked = await lockOrder(tx, orderId)
    if (locked?.order.state !== 'awaiting_deposit') return ok({})
    await moveOrder(tx, locked.order, 'hold_ended', { now, note: 'provider_refused' })
    await releasePlace(tx, locked.order)
    await dropDue(tx, 'hold_ended', orderId)
    return ok({})
  })
}
