import { createServer, type RequestListener, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { afterEach, describe, expect, test } from 'vitest'
import { stripeClient } from '@/lib/gateways/payments/client'
import { fakeFetch } from '@/lib/gateways/payments/fake/fake-fetch'
import { paymentsOver } from '@/lib/gateways/payments/live'
import {
  chargeArgs,
  checkoutArgs,
  newBuyer,
  newKey,
  openAccount,
  paidDeposit,
  reasonOf,
  valueOf,
} from './support'

let server: Server | undefined
afterEach(() => {
  server?.closeAllConnections()
  server?.close()
})

/** The gateway as with a real key, talking to a server of ours over HTTP. */
async function talkingTo(listener: RequestListener) {
  server = createServer(listener)
  await new Promise<void>((resolve) => server?.listen(0, '127.0.0.1', resolve))
  const apiBase = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  return paymentsOver(stripeClient({ secretKey: 'sk_test_of_somebody', apiBase }), { isFake: false })
}

const answering =
  (status: number, body: object): RequestListener =>
  (_, response) =>
    void response.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify(body))

const errorOf = (type: string, code?: string) => ({
  error: { type, message: 'said no', ...(code ? { code } : {}) },
})

describe('another server that speaks the provider’s API', () => {
  test('is used by the same code over HTTP, key, account and body included', async () => {
    const seen: string[] = []
    const gateway = await talkingTo((request, response) => {
      void (async () => {
        const parts: Buffer[] = []
        for await (const part of request as AsyncIterable<Buffer>) parts.push(part)
        seen.push(`${request.method} ${request.url?.split('?')[0]}`)
        const headers = Object.entries(request.headers).filter(
          ([name]) => !['host', 'connection', 'content-length'].includes(name),
        )
        const body = parts.length === 0 ? {} : { body: Buffer.concat(parts).toString() }
        const answer = await fakeFetch(`https://api.stripe.com${request.url}`, {
          method: request.method ?? 'GET',
          headers: Object.fromEntries(headers.map(([name, value]) => [name, String(value)])),
          ...body,
        })
        response.writeHead(answer.status, Object.fromEntries(answer.headers)).end(await answer.text())
      })()
    })
    const account = await openAccount()
    const customer = await newBuyer(account)
    const { sessionId } = valueOf(await gateway.createCheckout(await checkoutArgs({ account, customer })))
    expect(valueOf(await gateway.getCheckout({ account, sessionId }))).toMatchObject({
      state: 'open',
      amount: 2500,
    })
    const { method } = await paidDeposit({ account, customer })
    expect(valueOf(await gateway.chargeSavedCard(chargeArgs({ account, customer, method }))).state).toBe(
      'captured',
    )
    expect(seen).toEqual([
      'POST /v1/checkout/sessions',
      `GET /v1/checkout/sessions/${sessionId}`,
      'POST /v1/payment_intents',
    ])
  })

  test.each([
    [500, errorOf('api_error'), 'unknown_outcome', 'unavailable'],
    [429, errorOf('rate_limit_error'), 'rate_limited', 'rate_limited'],
    [401, errorOf('invalid_request_error'), 'not_allowed', 'not_allowed'],
    [403, errorOf('invalid_request_error', 'account_invalid'), 'not_allowed', 'not_allowed'],
    [404, errorOf('invalid_request_error', 'resource_missing'), 'not_found', 'not_found'],
    [400, errorOf('idempotency_error'), 'key_reused', 'unavailable'],
    [400, errorOf('invalid_request_error', 'balance_insufficient'), 'insufficient_balance', 'unavailable'],
    [400, errorOf('invalid_request_error'), 'invalid', 'invalid'],
  ])('answers %i %j: %s for a change, %s for a look-up', async (status, body, change, lookUp) => {
    const gateway = await talkingTo(answering(status, body))
    const refund = {
      account: 'acct_1',
      key: newKey(),
      payment: 'pi_1',
      amount: 100 as never,
      currency: 'EUR',
      refundId: 'r',
    }
    expect(reasonOf(await gateway.refund(refund))).toBe(change)
    expect(reasonOf(await gateway.getPayment({ account: 'acct_1', payment: 'pi_1' }))).toBe(lookUp)
  })

  test('not reached at all: nobody knows whether it happened', async () => {
    const gateway = await talkingTo((request) => request.socket.destroy())
    const args = { account: 'acct_1', key: newKey(), sessionId: 'cs_1' }
    expect(reasonOf(await gateway.expireCheckout(args))).toBe('unknown_outcome')
    expect(reasonOf(await gateway.balance({ account: 'acct_1' }))).toBe('unavailable')
  })
})
