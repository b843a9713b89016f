import 'server-only'
import { compareBooks } from '@/lib/services/money/compare-books'
import { expireHold } from '@/lib/services/orders/expire-hold'
import { settleAttempt } from '@/lib/services/payments/settle-attempt'
import { lookUpRefund } from '@/lib/services/refunds/look-up-refund'
import { sendRefund } from '@/lib/services/refunds/send-refund'
import { planAgain } from '@/lib/services/payments/plan-again'
import type { DueItem } from './due-kinds'

/** How long to wait when the provider has not said what became of something. */
const AGAIN_MS = 60_000

/** Does it, or sets it again for a little later while the provider does not answer. */
async function orAgain(item: DueItem, now: Date, done: { ok: boolean; reason?: string }): Promise<void> {
  const waits = ['provider_unreachable', 'payment_in_flight', 'rate_limited']
  if (!done.ok && waits.includes(done.reason ?? ''))
    await planAgain({ ...item, at: new Date(now.getTime() + AGAIN_MS) })
}

export const holdEnded = async (item: DueItem, now: Date) =>
  orAgain(item, now, await expireHold({ orderId: item.subjectId, now }))

export const attemptLookUp = async (item: DueItem, now: Date) =>
  orAgain(item, now, await settleAttempt({ attemptId: item.subjectId, now }))

export const refundRetry = async (item: DueItem, now: Date) =>
  orAgain(item, now, await sendRefund({ refundId: item.subjectId, isRepeat: true, now }))

/** One whose answer was lost is sent again under its key, after a look-up; one that is on its way is asked about. */
export const refundLookUp = async (item: DueItem, now: Date) => {
  const sent = await sendRefund({ refundId: item.subjectId, isRepeat: true, now })
  const isOnItsWay = sent.ok && sent.value.state === 'pending'
  await orAgain(item, now, isOnItsWay ? await lookUpRefund({ refundId: item.subjectId, now }) : sent)
}

/** A workshop's books against the provider's lists, once a day; while the provider does not answer, a little later. */
export const compareBooksDue = async (item: DueItem, now: Date) =>
  orAgain(item, now, await compareBooks({ workshopId: item.subjectId, now }))
