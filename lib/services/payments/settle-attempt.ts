import 'server-only'
import { settle } from '@/lib/services/_steps/settle-attempt'

/**
 * Asks the provider how a payment stands and writes it down: for attempts whose answer or event was lost. "The provider
 * never had it" is final a minute after the request.
 * Refuses: not_found · provider_unreachable (ask again). Locks: run, order, attempt. Writes: attempt and what follows
 * from it. Repeat: safe.
 */
export async function settleAttempt(cmd: { attemptId: string; now: Date }) {
  const settled = await settle(cmd.attemptId, { now: cmd.now })
  return settled.ok ? { ok: true as const, value: { state: settled.value.attempt.state } } : settled
}
