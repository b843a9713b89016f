import 'server-only'
import { setTimeout as pause } from 'node:timers/promises'
import { env } from '@/lib/config/env'
import { ok, refuse, type Result } from '@/lib/core/result'
import { clock } from '@/lib/gateways/clock'
import { payAsCustomer, type Paid } from '@/lib/gateways/payments/fake/pay-as-customer'
import { settle } from '@/lib/services/_steps/settle-attempt'
import { PaymentAttempt } from '@/models'

const LOOK_EVERY_MS = 50
/** How long an event may take before it counts as lost and the payment is looked up. */
const EVENT_MS = 2_500
const LONGEST_MS = 60_000

/**
 * Pays a link of the sandbox's card page as a customer would, and comes back once the application has applied it: by
 * webhook, or by look-up when the event is lost.
 * Refuses: not_found outside the sandbox · busy (not applied within a minute). Writes: the fake's books, then what a
 * payment writes. Repeat: a session that is paid answers captured again.
 */
export async function payInSandbox(cmd: {
  payUrl: string
  card: string
}): Promise<Result<{ outcome: Paid['outcome']; words: string }, 'not_found' | 'busy'>> {
  if (!env().SANDBOX) return refuse('not_found')
  const paid = await payAsCustomer(cmd)
  const answer = ok({ outcome: paid.outcome, words: paid.words })
  if (paid.attemptId === null) return answer
  const isBankPage = paid.sessionId === null
  // On the card page a refused card changes nothing here: the buyer tries another.
  if (paid.outcome === 'failed' && !isBankPage) return answer
  return (await isApplied(paid.attemptId, paid.outcome)) ? answer : refuse('busy')
}

async function isApplied(attemptId: string, outcome: Paid['outcome']): Promise<boolean> {
  const began = performance.now()
  let lookUpAt = EVENT_MS
  for (;;) {
    const attempt = await PaymentAttempt.findByPk(attemptId, { attributes: ['state'] })
    const isOver =
      outcome === 'captured' ? attempt?.state === 'captured' : attempt?.state !== 'needs_customer'
    if (attempt === null || isOver) return true
    const waited = performance.now() - began
    if (waited > LONGEST_MS) return false
    if (waited > lookUpAt) {
      await settle(attemptId, { now: await clock.now() })
      // A bank that refuses leaves the payment where it was when it is asked again: nothing more will come.
      if (outcome === 'failed') return true
      lookUpAt = waited + 1_000
    }
    await pause(LOOK_EVERY_MS)
  }
}
