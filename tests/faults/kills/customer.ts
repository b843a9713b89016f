import { randomUUID } from 'node:crypto'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import type { OrderInput, OrderPlaced, OrderView, PayAnswer } from '@/lib/contracts/orders'
import { paths } from '@/lib/paths'
import { makeUser } from '@/tests/support/worlds/person'
import { sessionOf } from '@/tests/http/matrix/people'

/** A buyer who talks to the application over HTTP and, when it does not answer, looks again. */
export async function customerOf(baseUrl: string) {
  const { person } = await makeUser()
  const cookie = `${SESSION_COOKIE}=${await sessionOf(person)}`

  /** The answer, or null when the connection broke. */
  async function ask<T>(method: string, path: string, body?: unknown): Promise<T | null> {
    const answer = await fetch(`${baseUrl}${path}`, {
      method,
      headers: {
        cookie,
        origin: baseUrl,
        'content-type': 'application/json',
        'idempotency-key': randomUUID(),
      },
      ...(body !== undefined && { body: JSON.stringify(body) }),
      redirect: 'manual',
      signal: AbortSignal.timeout(30_000),
    }).catch(() => null)
    if (answer === null) return null
    const text = await answer.text().catch(() => null)
    if (text === null) return null
    if (!answer.ok) throw new Error(`${answer.status} from ${method} ${path}: ${text}`)
    return JSON.parse(text) as T
  }

  return {
    person,
    place: (input: OrderInput) => ask<OrderPlaced>('POST', paths.api.orders, input),
    orders: () => ask<{ items: OrderView[] }>('GET', paths.api.accountOrders),
    pay: (order: string) => ask<PayAnswer>('POST', paths.api.orderPay(order), {}),
    cancel: (order: string) => ask<{ state: string }>('POST', paths.api.orderCancel(order), {}),
    /** Types a card number on the provider's page, which is another process. */
    typeCard: async (payUrl: string, number = '4242424242424242') => {
      const answer = await fetch(payUrl, {
        method: 'POST',
        body: new URLSearchParams({ number }),
        redirect: 'manual',
      })
      await answer.arrayBuffer()
      if (answer.status !== 303) throw new Error(`the card page answered ${answer.status}`)
    },
  }
}
