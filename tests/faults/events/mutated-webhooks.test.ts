import fc from 'fast-check'
import Stripe from 'stripe'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { ProviderEvent } from '@/models'
import { moneyWorld, pay, placed, toOurDoor } from '@/tests/support/worlds/money'

// Real events, changed on their way: a byte, a header, a time, a secret. None may be let in, none may make us stumble.
const COUNT = process.env.FAULTS === 'long' ? 10_000 : 500

const bodies: string[] = []
beforeAll(async () => {
  const world = await moneyWorld()
  for (let nth = 0; nth < 3; nth += 1) await pay((await placed(world.run)).payUrl)
  await deliverDueEvents({ isHurried: true, deliver: async (body) => (bodies.push(body), 200) })
  expect(bodies.length).toBeGreaterThan(6)
})
afterAll(closeSandboxPool)

const sign = (payload: string, secret: string, timestamp?: number) =>
  Stripe.webhooks.generateTestHeaderString({ payload, secret, ...(timestamp !== undefined && { timestamp }) })

type Sent = { body: string; signature: string }
type Mutation = (good: Sent, at: number, text: string) => Sent

const put = (whole: string, at: number, text: string, over = 0) => {
  const place = at % (whole.length + 1)
  return whole.slice(0, place) + text + whole.slice(place + over)
}

const MUTATIONS: Record<string, Mutation> = {
  'a character of the body exchanged': ({ body, signature }, at, text) => ({
    body: put(body, at, text || '~', 1),
    signature,
  }),
  'something put into the body': ({ body, signature }, at, text) => ({
    body: put(body, at, text || ' '),
    signature,
  }),
  'the body cut off': ({ body, signature }, at) => ({ body: body.slice(0, at % body.length), signature }),
  'another sum': ({ body, signature }, at) => ({
    body: body.replace(/"amount": \d+/, `"amount": ${at + 1}`).replace(/$/, ' '),
    signature,
  }),
  'a character of the header exchanged': ({ body, signature }, at, text) => ({
    body,
    signature: put(signature, at, text || '0', 1),
  }),
  'the header cut off': ({ body, signature }, at) => ({
    body,
    signature: signature.slice(0, at % signature.length),
  }),
  'another secret': ({ body }, at) => ({ body, signature: sign(body, `whsec_${at}`) }),
  'signed long ago': ({ body }, at) => ({ body, signature: sign(body, secret(), now() - 301 - (at % 1e6)) }),
  'signed in the future': ({ body }, at) => ({
    body,
    signature: sign(body, secret(), now() + 310 + (at % 1e6)),
  }),
  'another time than was signed': ({ body, signature }, at) => ({
    body,
    signature: signature.replace(/t=\d+/, `t=${now() - 1 - (at % 200)}`),
  }),
  'the signature of another scheme': ({ body, signature }) => ({
    body,
    signature: signature.replace('v1=', 'v0='),
  }),
  'no signature': ({ body }) => ({ body, signature: '' }),
  'signed, but no event': (_, at, text) => {
    const body = [
      '',
      '[]',
      'null',
      `"${at}"`,
      '{}',
      `{"id": ${at}}`,
      `{"id":"evt_${at}","object":"event"}`,
      text,
    ][at % 8]!
    return { body, signature: sign(body, secret()) }
  },
}

const secret = () => process.env.STRIPE_WEBHOOK_SECRETS!
const now = () => Math.floor(Date.now() / 1000)
/** Header values carry no line breaks, no characters above U+00FF: a request with them never arrives. */
const arrivable = (text: string) => text.replaceAll(/[^\u0020-\u00ff]|\u007f/g, '').trim()

test(`${COUNT} mutated events: none let in, none answered 5xx`, async () => {
  const before = await ProviderEvent.count()
  const answers: Record<number, number> = {}
  const mutations = fc.tuple(
    fc.constantFrom(...Object.keys(MUTATIONS)),
    fc.nat(),
    fc.nat({ max: 1 << 20 }),
    fc.string({ unit: 'binary', maxLength: 3 }),
  )
  await fc.assert(
    fc.asyncProperty(mutations, async ([name, which, at, text]) => {
      const body = bodies[which % bodies.length]!
      const good = { body, signature: sign(body, secret()) }
      const bad = MUTATIONS[name]!(good, at, text)
      const sent = { body: bad.body, signature: arrivable(bad.signature) }
      fc.pre(sent.body !== good.body || sent.signature !== good.signature)
      const status = await toOurDoor(sent.body, sent.signature)
      answers[status] = (answers[status] ?? 0) + 1
      expect(status, name).toBeGreaterThanOrEqual(400)
      expect(status, name).toBeLessThan(500)
    }),
    { numRuns: COUNT, seed: 4, endOnFailure: true },
  )
  expect(await ProviderEvent.count()).toBe(before)
  expect(Object.values(answers).reduce((sum, each) => sum + each, 0)).toBeGreaterThanOrEqual(COUNT)
  // The unchanged ones are let in: it was the changes that kept the others out.
  for (const body of bodies) expect(await toOurDoor(body, sign(body, secret()))).toBe(200)
  expect(await ProviderEvent.count()).toBe(before + bodies.length)
}, 600_000)
