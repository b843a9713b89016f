import { randomUUID } from 'node:crypto'
import { env } from '@/lib/config/env'
import { log } from '@/lib/config/log'
import type { Result } from '@/lib/core/result'
import { payments } from '@/lib/gateways/payments'
import type { ProviderEvent } from '@/lib/gateways/payments/changes'
import { MAX_BODY_BYTES, readText } from './body'
import { problem } from './errors'

/**
 * The wrapper of the provider's webhook: the body as it came, its signature checked against every secret, then one quick
 * call. A bad signature changes nothing and is answered 400; a second copy of an event is answered like the first. It has
 * no session, so no origin is asked for; signatures are judged by real time.
 */
export function webhook(
  receive: (event: ProviderEvent, receivedAt: Date) => Promise<Result<unknown, string>>,
) {
  return async (request: Request): Promise<Response> => {
    const requestId = request.headers.get('x-request-id') ?? randomUUID()
    try {
      const text = await readText(request, MAX_BODY_BYTES)
      if (text === null) return problem('too_large')
      const signature = request.headers.get('stripe-signature')
      const event = payments().verifyWebhook(text, signature, env().STRIPE_WEBHOOK_SECRETS)
      if (!event.ok) {
        log().warn({ requestId, reason: event.reason }, 'webhook refused')
        return problem('unreadable')
      }
      const received = await receive(event.value, new Date())
      return received.ok ? Response.json({ received: true }) : problem(received.reason)
    } catch (error) {
      // Not answered with 2xx, it is sent again.
      log().error({ error, requestId }, 'webhook failed')
      const answer = problem('bug', { requestId })
      return new Response(answer.body, { status: 500, headers: answer.headers })
    }
  }
}
