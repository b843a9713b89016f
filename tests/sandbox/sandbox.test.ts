import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest'
import { GET as readMail } from '@/app/(sandbox)/sandbox/mail.json/route'
import { POST as passTime } from '@/app/(sandbox)/sandbox/clock/route'
import { POST as payLink } from '@/app/(sandbox)/sandbox/pay/route'
import { POST as signIn } from '@/app/(sandbox)/sandbox/sign-in/route'
import { GET as ownOrders } from '@/app/api/account/orders/route'
import { forgetEnv } from '@/lib/config/env'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { mailer } from '@/lib/gateways/mailer'
import { closeSandboxMailbox } from '@/lib/gateways/mailer/sandbox-mailbox'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { TASKS } from '@/lib/tasks'
import { DueItem, Session } from '@/models'
import { openMailStore } from '@/scripts/sandbox-mail/mail-store'
import { startMailServer, type MailServer } from '@/scripts/sandbox-mail/start-mail-server'
import { type RunningWorker, startWorker } from '@/scripts/support/start-worker'
import { attemptsOf, CARD, moneyWorld, placed, settleAll, toOurDoor } from '@/tests/support/worlds/money'

const databaseUrl = process.env.DATABASE_URL ?? ''
let mails: MailServer
let store: Awaited<ReturnType<typeof openMailStore>>
let worker: RunningWorker
let sending: NodeJS.Timeout
let world: Awaited<ReturnType<typeof moneyWorld>>

// The whole sandbox in one process: worker, mail server, and a provider that sends its events to our door.
beforeAll(async () => {
  store = await openMailStore(databaseUrl)
  mails = await startMailServer({ port: 0, keep: store.keep })
  process.env.SMTP_URL = `smtp://127.0.0.1:${mails.port}`
  forgetEnv()
  worker = await startWorker({ databaseUrl, tasks: TASKS })
})
beforeEach(async () => {
  clearInterval(sending)
  world = await moneyWorld()
})
afterAll(async () => {
  clearInterval(sending)
  await worker.stop()
  mailer().close()
  await mails.close()
  await store.close()
  await closeSandboxMailbox()
  await closeSandboxPool()
})

const startSending = () =>
  (sending = setInterval(() => void deliverDueEvents({ deliver: toOurDoor }).catch(() => {}), 50))

const call = async (handler: typeof payLink, path: string, body: object) => {
  const request = new Request(`http://localhost:3000${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  })
  return handler(request, { params: Promise.resolve({}) })
}
const pay = async (payUrl: string | null, card: string = CARD.pays) => {
  const answer = await call(payLink, '/sandbox/pay', { payUrl, card })
  return (await answer.json()) as { outcome: string }
}

describe('paying', () => {
  test('comes back once the webhook has been applied', async () => {
    startSending()
    const { order, payUrl } = await placed(world.run)
    expect(await pay(payUrl)).toMatchObject({ outcome: 'captured' })
    expect((await order.reload()).state).toBe('reserved')
  })

  test('comes back once the look-up has found it, when every event is lost', async () => {
    const { order, payUrl } = await placed(world.run)
    expect(await pay(payUrl)).toMatchObject({ outcome: 'captured' })
    expect((await order.reload()).state).toBe('reserved')
    await settleAll()
  })

  test('with a refused card says so and leaves the page open', async () => {
    const { order, payUrl } = await placed(world.run)
    expect(await pay(payUrl, CARD.refused)).toMatchObject({ outcome: 'failed' })
    expect((await attemptsOf(order))[0]!.state).toBe('sent')
    expect(await pay('http://127.0.0.1:3999/pay/cs_unknown')).toMatchObject({ outcome: 'failed' })
  })
})

test('the clock comes back once everything due has been done and every mail is out', async () => {
  startSending()
  const { order, person } = await placed(world.run)
  const before = Date.now()
  const answer = await call(passTime, '/sandbox/clock', { advanceHours: 1 })
  expect(answer.status).toBe(200)
  const { now } = (await answer.json()) as { now: string }
  expect(new Date(now).getTime() - order.placedAt.getTime()).toBeGreaterThanOrEqual(3_600_000)
  expect(Date.now() - before).toBeLessThan(30_000)
  expect((await order.reload()).state).toBe('expired')
  expect(await DueItem.count({ where: { subjectId: order.id, doneAt: null } })).toBe(0)
  const request = new Request(`http://localhost:3000/sandbox/mail.json?to=${person.emailNormal}`)
  const mail = await readMail(request, { params: Promise.resolve({}) })
  const { items } = (await mail.json()) as { items: { to: string; subject: string; text: string }[] }
  expect(items).toMatchObject([{ to: person.emailNormal }])
  expect(items[0]!.subject).toContain('is free again')
})

test.each([[0], [-1], ['x'], [1e9]])('the clock refuses to move by %s', async (advanceHours) => {
  expect((await call(passTime, '/sandbox/clock', { advanceHours })).status).toBe(422)
})

test('signing in makes a session whose second factor counts as given', async () => {
  const answer = await call(signIn, '/sandbox/sign-in', { email: 'New.Buyer@example.org' })
  expect(answer.status).toBe(200)
  expect(await answer.json()).toEqual({ email: 'new.buyer@example.org' })
  const cookie = answer.headers.get('set-cookie')!.split(';')[0]!
  expect(await Session.count({ where: { device: 'sandbox' } })).toBe(1)
  const request = new Request('http://localhost:3000/api/account/orders', { headers: { cookie } })
  expect((await ownOrders(request, { params: Promise.resolve({}) })).status).toBe(200)
})

test('outside the sandbox none of it exists', async () => {
  process.env.SANDBOX = '0'
  forgetEnv()
  try {
    const body = { email: 'a@example.org', payUrl: 'http://127.0.0.1/pay/x', card: '4242', advanceHours: 1 }
    for (const handler of [signIn, payLink, passTime])
      expect((await call(handler, '/sandbox/sign-in', body)).status).toBe(404)
    const request = new Request('http://localhost:3000/sandbox/mail.json')
    expect((await readMail(request, { params: Promise.resolve({}) })).status).toBe(404)
  } finally {
    process.env.SANDBOX = '1'
    forgetEnv()
  }
})
