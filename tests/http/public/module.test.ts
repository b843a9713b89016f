import { beforeAll, describe, expect, test } from 'vitest'
import { GET } from '@/app/api/w/[workshop]/[module]/route'
import type { ModulePublic } from '@/lib/contracts/modules'
import { minor } from '@/lib/core/brand'
import { Destination, TaxRate } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

beforeAll(() => setBusinessTime(NOW))

type Named = { workshop: { slug: string }; module: { slug: string } }
async function get({ workshop, module }: Named, query = '') {
  const params = { workshop: workshop.slug, module: module.slug }
  const request = new Request(`http://localhost:3000/api/w/${params.workshop}/${params.module}${query}`)
  return GET(request, { params: Promise.resolve(params) })
}
const read = async (named: Named, query = '') => (await (await get(named, query)).json()) as ModulePublic

describe('the run anyone may see', () => {
  test('counts units under deposit, held and waiting; orders entered by hand in none', async () => {
    const world = await makeRun(undefined, { maximum: 40 })
    const lines = (quantity: number) => [{ offer: world.runOffers.kit, quantity }]
    await makeOrder({ run: world.run, lines: lines(2) })
    await makeOrder({ run: world.run, lines: lines(3) }, { state: 'paid' })
    await makeOrder({ run: world.run, lines: lines(4) }, { state: 'posted' })
    await makeOrder({ run: world.run, lines: lines(5) }, { state: 'awaiting_deposit' })
    await makeOrder({ run: world.run, lines: lines(6) }, { state: 'waiting' })
    await makeOrder({ run: world.run, lines: lines(7) }, { state: 'cancelled' })
    await makeOrder(
      { run: world.run, lines: lines(8) },
      {
        state: 'paid',
        kind: 'manual',
        manualReason: 'tester',
        enteredByPersonId: world.run.createdByPersonId,
      },
    )
    const { run } = await read(world)
    expect(run).toEqual({
      id: world.run.id,
      state: 'taking_deposits',
      minimum: 3,
      maximum: 40,
      deposited: 9,
      held: 5,
      waiting: 6,
      decideBy: '2027-04-01',
      opensToAllAt: hoursAfter(NOW, -1).toISOString(),
      offers: [
        { offer: 'boards', priceMinor: 4500, depositMinor: 1000, postedBy: '2027-08-31' },
        { offer: 'kit', priceMinor: 9500, depositMinor: 2500, postedBy: '2027-08-31' },
        { offer: 'built', priceMinor: 16500, depositMinor: 4000, postedBy: '2027-08-31' },
      ],
    })
  })

  test('is the newest that takes deposits or is locked; never a draft, never one called off', async () => {
    const world = await makeRun(undefined, { state: 'locked', lockedAt: NOW })
    await makeRun(world, { state: 'draft', openedAt: null, termsVersionId: null, opensToAllAt: null })
    const calledOff = { calledOffAt: NOW, callOffReason: 'Too few.', callOffCause: 'owner' } as const
    await makeRun(world, { state: 'called_off', ...calledOff })
    expect((await read(world)).run).toMatchObject({ id: world.run.id, state: 'locked' })
    const newer = await makeRun(world)
    expect((await read(world)).run).toMatchObject({ id: newer.run.id, state: 'taking_deposits' })
  })

  test('is null where there is none', async () => {
    const { workshop } = await makeWorkshop()
    const made = await makeModule(workshop)
    expect((await read({ workshop, ...made })).run).toBeNull()
  })
})

describe('interest', () => {
  test('counts confirmed sign-ups only, and stays hidden below ten if the owner likes', async () => {
    const { workshop } = await makeWorkshop()
    const { module, offers } = await makeModule(workshop)
    for (let i = 0; i < 9; i += 1) await makeSignUp(offers.kit, { quantity: 2 })
    await makeSignUp(offers.kit, { state: 'unconfirmed' })
    await makeSignUp(offers.kit, { state: 'taken_back', takenBackAt: NOW })
    expect((await read({ workshop, module })).interest).toEqual({ confirmed: 9, units: 18 })
    await module.update({ hideInterestBelowTen: true })
    expect((await read({ workshop, module })).interest).toBeNull()
    await makeSignUp(offers.kit)
    expect((await read({ workshop, module })).interest).toEqual({ confirmed: 10, units: 19 })
  })
})

describe('delivery', () => {
  async function taxed() {
    const { workshop } = await makeWorkshop()
    await TaxRate.destroy({ where: { country: 'DE' } })
    // 19 % since 2021-01-01: § 12 UStG, from memory.
    await TaxRate.create({ workshopId: null, country: 'DE', basisPoints: 1900, validFrom: '2021-01-01' })
    return { workshop, ...(await makeModule(workshop)) }
  }

  test('is the workshop’s own country when none is asked for', async () => {
    const { delivery } = await read(await taxed())
    expect(delivery).toMatchObject({ country: 'DE', currency: 'EUR' })
    // 9500 + 490 = 9990; of 9500 the tax is 9500·19/119 = 1516.8 → 1517, of 490 it is 78.2 → 78.
    expect(delivery.offers.find(({ offer }) => offer === 'kit')).toMatchObject({
      state: 'open',
      priceMinor: 9500,
      depositMinor: 2500,
      postageMinor: 490,
      totalMinor: 9990,
      taxMinor: 1595,
      taxBasisPoints: 1900,
    })
  })

  test('follows the country: other postage, and no tax on what leaves the tax area, at the same price', async () => {
    const world = await taxed()
    const kit = async (country: string) =>
      (await read(world, `?country=${country}`)).delivery.offers.find(({ offer }) => offer === 'kit')
    expect(await kit('AT')).toMatchObject({ postageMinor: 990, totalMinor: 10490, taxBasisPoints: 1900 })
    expect(await kit('us')).toMatchObject({ postageMinor: 1790, totalMinor: 11290, taxMinor: 0 })
  })

  test('says where it does not go, and why', async () => {
    const world = await taxed()
    await Destination.update(
      { state: 'paused', reason: 'Customs rules changed.' },
      { where: { offerId: world.offers.kit.id, country: 'US' } },
    )
    const { offers } = (await read(world, '?country=US')).delivery
    expect(offers.find(({ offer }) => offer === 'kit')).toMatchObject({
      state: 'paused',
      reason: 'Customs rules changed.',
      postageMinor: null,
      totalMinor: null,
    })
    const nowhere = (await read(world, '?country=BR')).delivery.offers
    expect(nowhere.map(({ state }) => state)).toEqual(['closed', 'closed', 'closed'])
    await world.offers.boards.update({ packedWeightG: null })
    const home = (await read(world)).delivery.offers
    expect(home.find(({ offer }) => offer === 'boards')).toMatchObject({ state: 'no_post', totalMinor: null })
  })

  test('prices that are still open are null', async () => {
    const world = await taxed()
    await world.offers.kit.update({
      priceMinor: null,
      depositMinor: null,
      priceListMinor: [minor(8500), minor(9500)],
    })
    const page = await read(world)
    expect(page.offers.find(({ offer }) => offer === 'kit')).toEqual({
      offer: 'kit',
      priceMinor: null,
      depositMinor: null,
      currency: 'EUR',
    })
    expect(page.delivery.offers.find(({ offer }) => offer === 'kit')).toMatchObject({
      postageMinor: 490,
      totalMinor: null,
      taxMinor: null,
    })
  })
})

describe('is refused', () => {
  test('404 for what is not public, whatever the reason', async () => {
    const { workshop } = await makeWorkshop()
    const draft = await makeModule(workshop, { state: 'draft', publishedAt: null })
    const pending = await makeWorkshop({ state: 'pending', openedAt: null })
    const theirs = await makeModule(pending.workshop)
    expect((await get({ workshop, module: draft.module })).status).toBe(404)
    expect((await get({ workshop: pending.workshop, module: theirs.module })).status).toBe(404)
    expect((await get({ workshop, module: theirs.module })).status).toBe(404)
    expect((await get({ workshop: { slug: 'nobody' }, module: draft.module })).status).toBe(404)
  })

  test('422 for a country that is none', async () => {
    const { workshop } = await makeWorkshop()
    const { module } = await makeModule(workshop)
    for (const country of ['XX', 'Austria']) {
      const answer = await get({ workshop, module }, `?country=${country}`)
      expect(answer.status).toBe(422)
      expect(await answer.json()).toMatchObject({ errors: { country: expect.stringMatching(/country/) } })
    }
  })
})
