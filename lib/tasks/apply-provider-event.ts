import 'server-only'
import { clock } from '@/lib/gateways/clock'
import type { Task } from '@/lib/jobs/task'
import { applyProviderEvent } from '@/lib/services/payments/apply-provider-event'
import { refreshPaymentAccount } from '@/lib/services/workshops/refresh-payment-account'

/** Applies one stored event; while the provider cannot be asked the queue tries again. */
export const applyProviderEventJob: Task<'apply_provider_event'> = async ({ eventId }) => {
  const now = await clock.now()
  const applied = await applyProviderEvent({ eventId, now })
  if (!applied.ok) {
    if (applied.reason === 'provider_unreachable') throw new Error(`event ${eventId} waits for the provider`)
    return
  }
  const account = applied.value.refreshAccount
  if (account !== null) await refreshPaymentAccount({ account, now })
}
