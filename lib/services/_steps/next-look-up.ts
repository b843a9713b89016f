import 'server-only'
import type { AttemptState } from '@/lib/core/states/attempt'
import type { PaymentAttempt } from '@/models'

const MINUTE_MS = 60_000

const MINUTES: Readonly<Record<AttemptState, number>> = {
  requested: 1,
  unknown: 1,
  sent: 5,
  needs_customer: 24 * 60,
  captured: 60,
  failed: 24 * 60,
  abandoned: 24 * 60,
}

/**
 * When the provider is asked about a payment should no event come: soon while nobody knows whether it has the request,
 * every five minutes while someone may be paying, daily while the buyer's bank waits for the buyer, hourly for a fee.
 * Own rule.
 */
export function nextLookUp(attempt: PaymentAttempt, now: Date): Date {
  return new Date(now.getTime() + MINUTES[attempt.state as AttemptState] * MINUTE_MS)
}
