import { beforeAll, describe, expect, test } from 'vitest'
import { GET as list, POST as create } from '@/app/api/admin/[workshop]/runs/route'
import { GET as read } from '@/app/api/admin/[workshop]/runs/[run]/route'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { FormDraft, Run } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { sessionOf } from '@/tests/http/matrix/people'
import { postForm, postJson } from '@/tests/http/signups/post-form'
import { NOW } from '@/tests/support/worlds/base'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let cookie: string
beforeAll(async () => {
  await setBusinessTime(NOW)
  world = await pier()
  cookie = `${SESSION_COOKIE}=${await sessionOf(world.owner)}`
})

const params = () => ({ workshop: world.workshop.slug })
const path = () => `/api/admin/${world.workshop.slug}/runs`
const offer = { offer: 'kit', priceMinor: 9900, depositMinor: 2000, postedBy: '2027-09-30' }
const body = {
  module: 'rowlock',
  revision: 'A',
  minimum: 20,
  maximum: 60,
  decideBy: '2027-04-30',
  balanceWhen: 'at_lock',
  offers: [offer],
}
const post = (sent: object) => postJson(create, path(), sent, { params: params(), headers: { cookie } })
const get = (handler: typeof list, run?: string) =>
  handler(new Request(`http://localhost:3000${path()}${run ? `/${run}` : ''}`, { headers: { cookie } }), {
    params: Promise.resolve({ ...params(), ...(run && { run }) }),
  })

describe('a run over HTTP', () => {
  test('is drafted with 201, stands in the list, and is read with figures and readiness', async () => {
    const made = await post(body)
    expect(made.status).toBe(201)
    const { run } = (await made.json()) as { run: string }
    const { items, next } = (await (await get(list)).json()) as { items: object[]; next: null }
    expect(next).toBeNull()
    expect(items.length).toBeGreaterThanOrEqual(2)
    expect(items).toContainEqual({
      id: run,
      number: expect.any(Number),
      module: { slug: 'rowlock', name: 'Rowlock' },
      revision: 'A',
      state: 'draft',
      minimum: 20,
      maximum: 60,
      decideBy: '2027-04-30',
      deposited: 0,
    })
    const view = (await (await get(read, run)).json()) as Record<string, unknown>
    expect(view).toMatchObject({
      id: run,
      state: 'draft',
      currency: 'EUR',
      opensToAllAt: null,
      offers: [offer],
      figures: {
        deposited: 0,
        held: 0,
        waiting: 0,
        forecast: { chance: 0 },
        breakEven: null,
        expectedProfitMinor: null,
        chanceOfLoss: null,
        starts: null,
      },
    })
    const readiness = view['readiness'] as { key: string; state: string; words: string }[]
    expect(readiness.map(({ key }) => key)).toEqual([
      'first_good_unit',
      'lessons',
      'quotes',
      'samples',
      'parts_list',
      'post_data',
      'promise',
      'page',
      'repay',
    ])
    // The account of the small world is not in the provider's books, so nobody knows what lies on it.
    expect(readiness[8]).toMatchObject({ state: 'unknown' })
    expect(readiness.every(({ words }) => words.endsWith('.'))).toBe(true)
  })

  test('of another workshop, or with an id that is none, does not exist', async () => {
    expect((await get(read, 'nonsense')).status).toBe(404)
    const strange = `${SESSION_COOKIE}=${await sessionOf(world.fenLamp.owner)}`
    const answer = await read(
      new Request(`http://localhost:3000/api/admin/fen-lamp/runs/${world.run.id}`, {
        headers: { cookie: strange },
      }),
      { params: Promise.resolve({ workshop: 'fen-lamp', run: world.run.id }) },
    )
    expect(answer.status).toBe(404)
  })

  test.each([
    ['minimum above maximum', { minimum: 61 }, 'minimum'],
    ['minimum of nothing', { minimum: 0 }, 'minimum'],
    ['half a unit', { maximum: 1.5 }, 'maximum'],
    ['a number written as a power', { maximum: '1e3' }, 'maximum'],
    ['a day that does not exist', { decideBy: '2027-02-30' }, 'decideBy'],
    ['posted-by before decide-by', { offers: [{ ...offer, postedBy: '2027-04-30' }] }, 'offers.0.postedBy'],
    ['a deposit above the price', { offers: [{ ...offer, depositMinor: 9901 }] }, 'offers.0.depositMinor'],
    ['a deposit of nothing', { offers: [{ ...offer, depositMinor: 0 }] }, 'offers.0.depositMinor'],
    ['an unknown offer', { offers: [{ ...offer, offer: 'gold' }] }, 'offers.0.offer'],
    ['the same offer twice', { offers: [offer, offer] }, 'offers.1.offer'],
    ['no offer at all', { offers: [] }, 'offers'],
    ['balances never', { balanceWhen: 'never' }, 'balanceWhen'],
    ['another workshop’s module', { module: 'elsewhere' }, 'module'],
    ['a revision that is none', { revision: '7' }, 'revision'],
  ])('is refused at its field: %s', async (_, over, field) => {
    const before = await Run.count()
    const answer = await post({ ...body, ...over })
    expect(answer.status).toBe(422)
    const { errors } = (await answer.json()) as { errors: Record<string, string> }
    expect(Object.keys(errors)).toEqual([field])
    expect(errors[field]).toMatch(/\w.*\.$/)
    expect(await Run.count()).toBe(before)
  })

  test('from another site is not carried out', async () => {
    const headers = { cookie, origin: 'https://elsewhere.example' }
    expect((await postJson(create, path(), body, { params: params(), headers })).status).toBe(403)
  })
})

describe('the form without script', () => {
  const fields = {
    currency: 'EUR',
    module: 'rowlock',
    revision: 'A',
    minimum: '20',
    maximum: '60',
    decideBy: '2027-04-30',
    headStartHours: '',
    balanceWhen: 'at_lock',
    holdingPlan: '',
    'offers.0.offer': 'boards',
    'offers.0.priceMinor': '45.00',
    'offers.0.depositMinor': '10.00',
    'offers.0.postedBy': '',
    'offers.1.offer': 'kit',
    'offers.1.priceMinor': '99.00',
    'offers.1.depositMinor': '20.00',
    'offers.1.postedBy': '2027-09-30',
  }
  const submit = (over: Record<string, string> = {}) =>
    postForm(create, path(), { ...fields, ...over }, { params: params(), headers: { cookie } })

  test('drafts the run, leaving out the offer without a date, and goes to its page', async () => {
    const answer = await submit({ headStartHours: '0' })
    expect(answer.status).toBe(303)
    const run = await Run.findOne({
      where: { moduleId: world.module.id },
      order: [['number', 'DESC']],
      include: ['offers'],
      rejectOnEmpty: true,
    })
    expect(answer.headers.get('location')).toBe(`/admin/hollow-pier/runs/${run.id}`)
    expect(run).toMatchObject({ headStartHours: 0, holdingPlan: null })
    expect(run.offers?.map(({ kind, priceMinor }) => [kind, priceMinor])).toEqual([['kit', 9900]])
  })

  test('comes back with everything typed and the sentences at the typed rows', async () => {
    const answer = await submit({ minimum: '70', 'offers.1.depositMinor': '100.00' })
    expect(answer.status).toBe(303)
    const back = new URL(answer.headers.get('location') ?? '', 'http://localhost:3000')
    expect(back.pathname).toBe('/admin/hollow-pier/runs/new')
    expect(back.searchParams.get('module')).toBe('rowlock')
    const draft = await FormDraft.findByPk(back.searchParams.get('draft') ?? '', { rejectOnEmpty: true })
    expect(draft.values).toMatchObject({ ...fields, minimum: '70', 'offers.1.depositMinor': '100.00' })
    expect(Object.keys(draft.errors).sort()).toEqual(['minimum', 'offers.0.depositMinor'])
  })
})
