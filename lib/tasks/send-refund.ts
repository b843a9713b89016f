import 'server-only'
import { clock } from '@/lib/gateways/clock'
import type { Task } from '@/lib/jobs/task'
import { sendRefund } from '@/lib/services/refunds/send-refund'

/** Sends one refund; when the provider asks us to slow down the queue tries again. */
export const sendRefundJob: Task<'send_refund'> = async ({ refundId }, { attempt }) => {
  const sent = await sendRefund({ refundId, isRepeat: attempt > 1, now: await clock.now() })
  if (!sent.ok && sent.reason === 'rate_limited') throw new Error(`refund ${refundId} was not taken yet`)
}
