import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { GET as bulkProgress } from '@/app/api/admin/[workshop]/bulk/[bulk]/route'
import { POST as askBalances } from '@/app/api/admin/[workshop]/runs/[run]/ask-balances/route'
import { POST as callOff } from '@/app/api/admin/[workshop]/runs/[run]/call-off/route'
import { POST as close } from '@/app/api/admin/[workshop]/runs/[run]/close/route'
import { POST as lock } from '@/app/api/admin/[workshop]/runs/[run]/lock/route'
import { POST as lowerMinimum } from '@/app/api/admin/[workshop]/runs/[run]/lower-minimum/route'
import { POST as open } from '@/app/api/admin/[workshop]/runs/[run]/open/route'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { FormDraft, Order, Outcome, Session } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { sessionOf } from '@/tests/http/matrix/people'
import { postForm, postJson } from '@/tests/http/signups/post-form'
import { FEES_WAIVED, makeReady } from '@/tests/support/worlds/decision'
import { moneyWorld, reserved } from '@/tests/support/worlds/money'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeSignUp } from '@/tests/support/worlds/sign-up'

const draft = { state: 'draft' as const, openedAt: null, opensToAllAt: null, termsVersionId: null }
let world: Awaited<ReturnType<typeof moneyWorld>>
let cookie: string
beforeEach(async () => {
  world = await moneyWorld({ minimum: 2 })
  cookie = `${SESSION_COOKIE}=${await sessionOf(world.owner)}`
})
afterAll(closeSandboxPool)

const params = () => ({ workshop: world.workshop.slug, run: world.run.id })
const path = (deed: string) => `/api/admin/${world.workshop.slug}/runs/${world.run.id}/${deed}`
const send = (handler: typeof open, deed: string, body: object = {}, headers: object = {}) =>
  postJson(handler, path(deed), body, { params: params(), headers: { cookie, ...headers } })
const sendForm = (handler: typeof open, deed: string, fields: Record<string, string>) =>
  postForm(handler, path(deed), fields, { params: params(), headers: { cookie } })
const bulkOf = async (answer: Response) => {
  expect(answer.status).toBe(202)
  return ((await answer.json()) as { bulk: string }).bulk
}
const progressOf = async (bulk: string) => {
  const { workshop } = world
  const answer = await bulkProgress(
    new Request(`http://localhost:3000/api/admin/${workshop.slug}/bulk/${bulk}`, { headers: { cookie } }),
    { params: Promise.resolve({ workshop: workshop.slug, bulk }) },
  )
  return answer.json()
}
const reasonOf = async (answer: Response) => [
  answer.status,
  ((await answer.json()) as { reason: string }).reason,
]

describe('deeds over HTTP', () => {
  test('open answers a bulk job whose progress can be asked for', async () => {
    world = await moneyWorld(draft)
    cookie = `${SESSION_COOKIE}=${await sessionOf(world.owner)}`
    await makeSignUp(world.offers.kit)
    const bulk = await bulkOf(await send(open, 'open'))
    expect(await progressOf(bulk)).toEqual({ total: 1, done: 0, failed: 0 })
    await runJobs()
    expect(await progressOf(bulk)).toEqual({ total: 1, done: 1, failed: 0 })
    expect(await reasonOf(await send(open, 'open'))).toEqual([409, 'not_allowed'])
  })

  test('lock takes reasons and waivers; balances are asked for afterwards', async () => {
    await makeReady(world)
    await reserved(world.run)
    expect(await reasonOf(await send(lock, 'lock', {}))).toEqual([409, 'below_minimum'])
    const reason = 'A friend takes the rest.'
    expect(await reasonOf(await send(lock, 'lock', { reason }))).toEqual([409, 'not_ready'])
    expect(await reasonOf(await send(askBalances, 'ask-balances'))).toEqual([409, 'run_not_locked'])
    await bulkOf(await send(lock, 'lock', { reason, waivers: FEES_WAIVED }))
    const bulk = await bulkOf(await send(askBalances, 'ask-balances'))
    await runJobs()
    expect(await progressOf(bulk)).toEqual({ total: 1, done: 1, failed: 0 })
  })

  test.each([
    ['a line nobody knows', { waivers: [{ key: 'weather', reason: 'It rains.' }] }, 'waivers.0.key'],
    ['a line let pass without a reason', { waivers: [{ key: 'repay', reason: ' ' }] }, 'waivers.0.reason'],
  ])('lock refuses at its field: %s', async (_, body, field) => {
    const answer = await send(lock, 'lock', body)
    expect(answer.status).toBe(422)
    expect(Object.keys(((await answer.json()) as { errors: object }).errors)).toEqual([field])
  })

  test('call-off wants a reason, and pays everyone back', async () => {
    const { order } = await reserved(world.run)
    expect((await send(callOff, 'call-off', { reason: '' })).status).toBe(422)
    const bulk = await bulkOf(await send(callOff, 'call-off', { reason: 'The jacks cannot be had.' }))
    await runJobs()
    expect(await progressOf(bulk)).toEqual({ total: 1, done: 1, failed: 0 })
    expect((await order.reload()).state).toBe('cancelled')
  })

  test('the minimum only falls', async () => {
    expect(await reasonOf(await send(lowerMinimum, 'lower-minimum', { minimum: 3 }))).toEqual([
      409,
      'not_lower',
    ])
    expect((await send(lowerMinimum, 'lower-minimum', { minimum: 0 })).status).toBe(422)
    expect((await send(lowerMinimum, 'lower-minimum', { minimum: '1' })).status).toBe(200)
    expect((await world.run.reload()).minimum).toBe(1)
  })

  test('close waits for the last order, stores what became of everyone, and ends the waiting list', async () => {
    const lines = [{ offer: world.runOffers.kit, quantity: 1 }]
    const { order } = await reserved(world.run)
    const waiting = await makeOrder({ run: world.run, lines }, { state: 'waiting' })
    expect(await reasonOf(await send(close, 'close'))).toEqual([409, 'order_short_of_end'])
    await Order.update(
      { state: 'posted', paidAt: order.placedAt, postedAt: order.placedAt },
      { where: { id: order.id } },
    )
    expect(await reasonOf(await send(close, 'close'))).toEqual([409, 'not_allowed'])
    await world.run.update({ state: 'locked', lockedAt: order.placedAt })
    expect((await send(close, 'close')).status).toBe(200)
    expect((await world.run.reload()).state).toBe('closed')
    expect(await waiting.order.reload()).toMatchObject({ state: 'cancelled', cancelCause: 'run_closed' })
    const outcomes = await Outcome.findAll({ where: { runId: world.run.id } })
    expect(outcomes.map((each) => each.facts())).toEqual([
      { className: 'deposit_paying', converted: 1, notConverted: 0 },
    ])
  })
})

describe('deeds about everyone’s money', () => {
  test.each([
    ['lock', lock, {}],
    ['call-off', callOff, { reason: 'No jacks.' }],
    ['ask-balances', askBalances, {}],
  ] as const)('%s asks for a fresh code', async (deed, handler, body) => {
    await Session.update({ device: 'a browser' }, { where: {} })
    expect(await reasonOf(await send(handler, deed, body))).toEqual([409, 'second_factor'])
    const page = await postForm(
      handler,
      path(deed),
      { reason: 'No jacks.' },
      {
        params: params(),
        headers: { cookie, referer: `http://localhost:3000/admin/${world.workshop.slug}` },
      },
    )
    expect(page.status).toBe(303)
    expect(page.headers.get('location')).toMatch(/^\/account\/code\?next=/)
  })

  test('from a page want the words typed; a page without them changes nothing and loses nothing typed', async () => {
    const { order } = await reserved(world.run)
    const fields = { reason: 'The jacks cannot be had.' }
    for (const typed of [{}, { typed: 'yes' }] as Record<string, string>[]) {
      const answer = await sendForm(callOff, 'call-off', { ...fields, ...typed })
      expect(answer.status).toBe(303)
      const back = new URL(answer.headers.get('location') ?? '', 'http://localhost:3000')
      expect(back.pathname).toBe(`/admin/${world.workshop.slug}/runs/${world.run.id}/call-off`)
      const kept = await FormDraft.findByPk(back.searchParams.get('draft') ?? '', { rejectOnEmpty: true })
      expect(kept.values).toMatchObject(fields)
      expect(Object.keys(kept.errors)).toEqual(['typed'])
    }
    expect((await order.reload()).state).toBe('reserved')
    const done = await sendForm(callOff, 'call-off', { ...fields, typed: `Call off ${world.module.slug}` })
    expect(done.headers.get('location')).toMatch(new RegExp(`^/admin/${world.workshop.slug}/bulk/`))
  })

  test('lock from a page leaves lines without a typed reason unwaived', async () => {
    await makeReady(world)
    await reserved(world.run)
    await reserved(world.run)
    const fields = {
      'waivers.0.key': 'quotes',
      'waivers.0.reason': '',
      'waivers.1.key': 'repay',
      'waivers.1.reason': 'I pay the fees in.',
      typed: `lock ${world.module.slug}`,
    }
    const done = await sendForm(lock, 'lock', fields)
    expect(done.headers.get('location')).toMatch(/\/bulk\//)
    expect((await world.run.reload()).state).toBe('locked')
  })
})
