import 'server-only'
import Stripe from 'stripe'
import { type Books, nextNumber } from '@/lib/gateways/payments/fake/books'
import { chance, idFor, isFault } from '@/lib/gateways/payments/fake/chance'
import { WEBHOOK_EVENTS } from '@/lib/gateways/payments/webhook-events'

/**
 * Writes an event into the books, in the same transaction as its cause. Under faults some are lost, some arrive
 * twice and some late, so that later ones overtake them; which, is decided by the seed.
 */
export async function emit(books: Books, type: Stripe.Event.Type, object: object): Promise<void> {
  if (!WEBHOOK_EVENTS.includes(type)) return
  const n = await nextNumber(books)
  const event = {
    id: idFor('evt_', n),
    object: 'event',
    account: books.account,
    api_version: Stripe.API_VERSION,
    created: books.now,
    data: { object },
    livemode: false,
    pending_webhooks: 1,
    request: { id: null, idempotency_key: null },
    type,
  }
  const isLost = isFault('event_lost', n, 0.06)
  const delays = [delayMs(n, 'event_late')]
  if (isFault('event_twice', n, 0.12)) delays.push(delayMs(n, 'event_late_again') + 300)
  const body = JSON.stringify(event, null, 2)
  for (const delay of delays) books.outbox.push({ id: event.id, type, body, delayMs: delay, isLost })
}

function delayMs(n: number, label: string): number {
  return isFault(label, n, 0.25) ? Math.round(100 + 1900 * chance(`${label}_by`, n)) : 0
}
