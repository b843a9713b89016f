import 'server-only'
import { clock } from '@/lib/gateways/clock'
import type { Task } from '@/lib/jobs/task'
import { settleAttempt } from '@/lib/services/payments/settle-attempt'

/** Looks one payment up at the provider; the due row of the attempt asks again while nobody answers. */
export const settleAttemptJob: Task<'settle_attempt'> = async ({ attemptId }) => {
  const settled = await settleAttempt({ attemptId, now: await clock.now() })
  if (!settled.ok && settled.reason === 'provider_unreachable')
    throw new Error(`attempt ${attemptId} waits for the provider`)
}
