import { beforeEach, describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { demandCsv } from '@/app/(admin)/_parts/demand-csv'
import { getDemandBoard } from '@/lib/queries/demand/get-demand-board'
import { getInterestBoard } from '@/lib/queries/demand/get-interest-board'
import { Invitation, Outcome } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePlan } from '@/tests/support/worlds/decision'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeModule } from '@/tests/support/worlds/module'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { makeSignUp } from '@/tests/support/worlds/sign-up'

async function makeWorld(over: Parameters<typeof makeRun>[1] = {}) {
  const house = await makeWorkshop()
  const parts = await makeRun(
    { ...house, ...(await makeModule(house.workshop)) },
    { minimum: 4, maximum: 20, ...over },
  )
  return { ...house, ...parts, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
beforeEach(async () => {
  world = await makeWorld()
})

const boardOf = async () => {
  const { actor, workshop, run } = world
  const board = await getDemandBoard({ actor, workshopId: workshop.id, runId: run.id, now: NOW })
  if (!board) throw new Error('no board')
  return board
}
const DRAFT = { state: 'draft', openedAt: null, opensToAllAt: null } as const

describe('interest', () => {
  test('is counted by each answer, weeks of Mondays where it lasts longer than a month', async () => {
    // 2027-01-11 and 2027-02-22 are Mondays; the last sign-up comes on a Sunday, late enough to be Monday in Hamburg.
    const at = (text: string) => ({ confirmedAt: new Date(text) })
    await makeSignUp(world.offers.kit, { quantity: 2, country: 'FR', ...at('2027-01-13T10:00:00Z') })
    await makeSignUp(world.offers.kit, { certainty: 'likely', ...at('2027-01-15T10:00:00Z') })
    await makeSignUp(world.offers.built, { quantity: 3, ...at('2027-02-21T23:30:00Z') })
    await makeSignUp(world.offers.kit, { state: 'taken_back', takenBackAt: NOW })
    const board = await boardOf()
    expect(board).toMatchObject({ people: 3, units: 6 })
    expect(board.overTime.step).toBe('week')
    expect(board.overTime.buckets).toHaveLength(7)
    expect(board.overTime.buckets[0]).toEqual({ from: '2027-01-11', people: 2, units: 3 })
    expect(board.overTime.buckets[6]).toEqual({ from: '2027-02-22', people: 1, units: 3 })
    expect(board.byOffer).toEqual([
      { key: 'built', people: 1, units: 3 },
      { key: 'kit', people: 2, units: 3 },
    ])
    expect(board.byCertainty).toEqual([
      { key: 'certain', people: 2, units: 5 },
      { key: 'likely', people: 1, units: 1 },
    ])
    expect(board.byCountry).toEqual([
      { key: 'DE', people: 2, units: 4 },
      { key: 'FR', people: 1, units: 2 },
    ])
  })

  test('goes out as CSV, exactly what is shown, and names nobody', async () => {
    const { person } = await makeSignUp(world.offers.kit, { topPriceMinor: minor(9500), quantity: 2 })
    const { actor, workshop, module } = world
    const board = await getInterestBoard({ actor, workshopId: workshop.id, module: module.slug })
    const [columns, rows] = demandCsv(board!)
    expect(columns).toHaveLength(4)
    expect(rows).toContainEqual(['By country', 'Germany', '1', '2'])
    expect(rows).toContainEqual(['By highest price stated: kit', '95.00 EUR', '1', '2'])
    expect(JSON.stringify([board, rows])).not.toContain(person.emailNormal ?? 'nobody')
  })

  test('is the owner’s to see', async () => {
    const { person } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    const at = { actor: await actorOf(person), workshopId: world.workshop.id }
    expect(await getDemandBoard({ ...at, runId: world.run.id, now: NOW })).toBeNull()
    expect(await getInterestBoard({ ...at, module: world.module.slug })).toBeNull()
  })
})

describe('what to expect', () => {
  test('per offer and together, from the same core', async () => {
    for (const quantity of [1, 2]) await makeSignUp(world.offers.kit, { quantity })
    await makeSignUp(world.offers.built, { certainty: 'likely' })
    await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 3 }] })
    const board = await boardOf()
    const certain = { alpha: 6, beta: 4, quantities: [1, 2] }
    const likely = { alpha: 3, beta: 7, quantities: [1] }
    const all = forecastUnits([certain, likely], { committed: 3 })
    expect(board.total.mean).toBeCloseTo(all.mean, 12)
    expect(board.total.chance).toBeCloseTo(all.atLeast(4), 12)
    const kits = forecastUnits([certain], { committed: 3 })
    const kit = board.byForecast.find(({ offer }) => offer === 'kit')!
    expect(kit).toEqual({
      offer: 'kit',
      deposited: 3,
      mean: expect.closeTo(kits.mean, 12) as number,
      low: kits.quantile(0.1),
      high: kits.quantile(0.9),
    })
    expect(board.byForecast.reduce((sum, { mean }) => sum + mean, 0)).toBeCloseTo(all.mean, 10)
  })

  test('says where it comes from: the starting values, and what closed runs changed', async () => {
    await Outcome.create({
      workshopId: world.workshop.id,
      runId: (await makeRun(world)).run.id,
      className: 'certain',
      converted: 12,
      notConverted: 18,
      storedAt: NOW,
    })
    await makeSignUp(world.offers.kit)
    const belief = (await boardOf()).beliefs.find(({ name }) => name === 'certain')!
    expect(belief.starting).toBeCloseTo(0.6, 12)
    expect(belief.seen).toEqual({ converted: 12, notConverted: 18 })
    // (6 + 12) of (10 + 30).
    expect(belief.believed.mean).toBeCloseTo(0.45, 12)
    expect(belief.here).toEqual({ ordered: 0, declined: 0, silent: 1 })
  })

  test('how many more sign-ups: one unit of four is missing, by hand', async () => {
    await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 3 }] })
    // With m certain people, nobody comes with 4·5·…·(3+m) / 10·11·…·(9+m): m = 1 0.4, m = 2 0.4 · 5/11 = 0.18.
    const { needed } = await boardOf()
    expect(needed.find(({ name }) => name === 'certain')).toEqual({ name: 'certain', more: 2 })
    await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] })
    expect((await boardOf()).needed[0]?.more).toBe('already_there')
  })

  test('counts invitations by their answer', async () => {
    for (const state of ['sent', 'ordered', 'ordered', 'declined', 'expired'] as const) {
      const { signup } = await makeSignUp(world.offers.kit)
      await Invitation.create({
        workshopId: world.workshop.id,
        runId: world.run.id,
        signupId: signup.id,
        personId: signup.personId,
        state,
        sentAt: NOW,
        answeredAt: state === 'sent' ? null : NOW,
      })
    }
    expect((await boardOf()).invitations).toEqual({ sent: 5, ordered: 2, declined: 1, expired: 1 })
  })
})

describe('along the price list of a draft', () => {
  test('fewer join the higher it is; profit by hand for one certain person', async () => {
    world = await makeWorld({ ...DRAFT, minimum: 1 })
    await makePlan(world, { oneOff: [] })
    for (const price of [8000, 9000]) await makeSignUp(world.offers.kit, { topPriceMinor: minor(price) })
    const [prices] = (await boardOf()).prices
    expect(prices?.points.map(({ priceMinor, members }) => [priceMinor, members])).toEqual([
      [8000, 2],
      [9000, 1],
    ])
    // At 90.00 one certain person, 6 of 10, leaves 90.00 − 5.00; nobody costs nothing, as nothing is spent before.
    expect(prices?.points[1]).toMatchObject({ expectedProfitMinor: 0.6 * 8500 })
    expect(prices?.points[1]?.expectedUnits).toBeCloseTo(0.6, 12)
    // At 80.00 two of Beta(6, 4): P(2) = 6·7/(10·11), P(1) = 2·6·4/(10·11).
    const [two, one] = [42 / 110, 48 / 110]
    expect(prices?.points[0]?.expectedProfitMinor).toBe(Math.round(two * 15_000 + one * 7500))
    expect(prices?.best).toBe(8000)
  })

  test('once deposits are taken the prices stand, and nothing is said of others', async () => {
    await makeSignUp(world.offers.kit, { topPriceMinor: minor(9000) })
    expect((await boardOf()).prices).toEqual([])
  })
})
