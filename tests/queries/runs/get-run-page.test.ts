import { beforeEach, describe, expect, test } from 'vitest'
import { stillToCome } from '@/lib/core/demand/clock'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { sequelize } from '@/lib/db/sequelize'
import { getRunPage } from '@/lib/queries/runs/get-run-page'
import {
  Invitation,
  Lesson,
  Outcome,
  PaymentAttempt,
  Plan,
  Refund,
  Revision,
  RevisionLine,
  Unit,
  Waiver,
} from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makePartsList, makePlan, makeReady } from '@/tests/support/worlds/decision'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeUnit } from '@/tests/support/worlds/parcel'
import { makeAttempt, makeRefund } from '@/tests/support/worlds/payment'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { makeModule } from '@/tests/support/worlds/module'

async function makeWorld(over: Parameters<typeof makeRun>[1] = {}) {
  const house = await makeWorkshop()
  const design = await makeModule(house.workshop)
  const parts = await makeRun({ ...house, ...design }, { minimum: 4, maximum: 10, ...over })
  return { ...house, ...parts, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
beforeEach(async () => {
  world = await makeWorld()
})

const pageOf = async (balanceMinor: number | null = null, now = NOW) => {
  const { actor, workshop, run } = world
  const page = await getRunPage({ actor, workshopId: workshop.id, runId: run.id, balanceMinor, now })
  if (!page) throw new Error('no page')
  return page
}
const order = (kind: 'boards' | 'kit' | 'built', quantity = 1, over: Parameters<typeof makeOrder>[1] = {}) =>
  makeOrder({ run: world.run, lines: [{ offer: world.runOffers[kind], quantity }] }, over)
const lineOf = async (key: string, balanceMinor: number | null = null, now = NOW) =>
  (await pageOf(balanceMinor, now)).readiness.find((line) => line.key === key)?.state

describe('units', () => {
  test('count deposits, not held places, waiting people or orders entered by hand', async () => {
    await order('kit', 2)
    await order('built', 1, { state: 'balance_due' })
    await order('kit', 1, { state: 'awaiting_deposit' })
    await order('kit', 3, { state: 'waiting' })
    await order('kit', 1, { state: 'cancelled' })
    await order('kit', 1, { state: 'lapsed' })
    const byHand = { kind: 'manual' as const, manualReason: 'A tester', enteredByPersonId: world.owner.id }
    await order('kit', 1, { state: 'paid', ...byHand })
    const { figures, orders, withdrawableUnits } = await pageOf()
    expect(figures).toMatchObject({ deposited: 3, held: 1, waiting: 3 })
    expect(orders).toMatchObject({ reserved: 1, balance_due: 1, awaiting_deposit: 1, waiting: 1 })
    // All three go to Ulm, where the law lets buyers withdraw.
    expect(withdrawableUnits).toBe(3)
  })
})

describe('the forecast', () => {
  test('adds to the deposits what confirmed sign-ups are believed to bring, class by class', async () => {
    await order('kit', 2)
    for (const quantity of [1, 2]) await makeSignUp(world.offers.kit, { certainty: 'certain', quantity })
    await makeSignUp(world.offers.built, { certainty: 'likely', quantity: 1 })
    await makeSignUp(world.offers.built, { certainty: 'curious', confirmedAt: hoursAfter(NOW, -24 * 91) })
    await makeSignUp(world.offers.kit, { state: 'unconfirmed' })
    const { figures, signUps } = await pageOf()
    // Means by hand from the starting values: 2 + 3 × 6/10 + 1 × 3/10 + 1 × 1/10 (over 90 days old, whatever they said).
    expect(figures.forecast.mean).toBeCloseTo(2 + 1.8 + 0.3 + 0.1, 12)
    const same = forecastUnits(
      [
        { alpha: 6, beta: 4, quantities: [1, 2] },
        { alpha: 3, beta: 7, quantities: [1] },
        { alpha: 1, beta: 9, quantities: [1] },
      ],
      { committed: 2 },
    )
    expect(figures.forecast.chance).toBeCloseTo(same.atLeast(4), 12)
    expect([figures.forecast.low, figures.forecast.high]).toEqual([same.quantile(0.1), same.quantile(0.9)])
    expect(signUps).toEqual({ confirmed: 4, notOrdered: 4 })
  })

  test('leaves out who has ordered, but not whose hold ended unpaid', async () => {
    const { person } = await makeSignUp(world.offers.kit)
    const { person: late } = await makeSignUp(world.offers.kit)
    const lines = [{ offer: world.runOffers.kit, quantity: 1 }]
    await makeOrder({ run: world.run, person, lines })
    await makeOrder({ run: world.run, person: late, lines }, { state: 'expired' })
    const { figures, signUps } = await pageOf()
    expect(signUps.notOrdered).toBe(1)
    // One of two certain people has ordered: (6 + 1) of (10 + 1) is what is believed of the other.
    expect(figures.forecast.mean).toBeCloseTo(1 + 7 / 11, 12)
  })

  test('thinks less of invited people the longer they are silent, and counts who said no', async () => {
    const invite = async (over: object = {}) => {
      const { signup } = await makeSignUp(world.offers.kit)
      await Invitation.create({
        workshopId: world.workshop.id,
        runId: world.run.id,
        signupId: signup.id,
        personId: signup.personId,
        sentAt: world.run.openedAt!,
        answeredAt: null,
        ...over,
      })
    }
    for (let i = 0; i < 4; i += 1) await invite()
    await invite({ state: 'declined', answeredAt: NOW })
    // Half of the window from the opening to decide-by.
    const half = new Date((world.run.openedAt!.getTime() + world.run.decideByAt.getTime()) / 2)
    const { figures, weighed } = await pageOf(null, half)
    // The starting curve has 0.33 in by a tenth and 0.75 by nine tenths: 0.54 halfway.
    const still = stillToCome({ alpha: 6, beta: 5, arrivedShare: 0.54, silent: 4 })
    expect(weighed.fromListed).toBeCloseTo(still.expected, 4)
    expect(weighed.silent).toBe(4)
    expect(figures.forecast.mean).toBeCloseTo(weighed.fromListed + weighed.fromNewcomers, 10)
  })

  test('expects people on no list once it has been watched for a week, weighed by how deposits come', async () => {
    await order('kit', 2, { placedAt: NOW }).then(({ order: placed }) => makeAttempt(placed))
    const half = new Date((world.run.openedAt!.getTime() + world.run.decideByAt.getTime()) / 2)
    expect((await pageOf(null, hoursAfter(world.run.opensToAllAt!, 24 * 7 - 1))).weighed.fromNewcomers).toBe(
      0,
    )
    const { weighed } = await pageOf(null, half)
    // By hand: everyone was let in 48 hours into the window, F(48 h of it) = 0.33 · part / 0.1; half is 0.54 in.
    const window = (world.run.decideByAt.getTime() - world.run.openedAt!.getTime()) / 3_600_000
    const watched = 0.54 - (0.33 * (48 / window)) / 0.1
    expect(weighed.fromNewcomers).toBeCloseTo(((1 + 0.5) * (1 - 0.54) * 2) / watched, 3)
  })

  test('believes the workshop’s own history', async () => {
    const before = await makeRun(world)
    await makeSignUp(world.offers.kit, { certainty: 'certain' })
    const { workshop } = world
    await Outcome.create({
      workshopId: workshop.id,
      runId: before.run.id,
      className: 'certain',
      converted: 30,
      notConverted: 0,
      storedAt: NOW,
    })
    // (6 + 30) of (10 + 30).
    expect((await pageOf()).figures.forecast.mean).toBeCloseTo(0.9, 12)
  })

  test('expects nobody after decide-by or once decided', async () => {
    await makeSignUp(world.offers.kit)
    await order('kit')
    expect((await pageOf(null, new Date('2027-04-02T09:00:00Z'))).figures.forecast.mean).toBe(1)
    await world.run.update({ state: 'locked', lockedAt: NOW })
    expect((await pageOf()).figures.forecast).toMatchObject({ mean: 1, low: 1, high: 1, chance: 0 })
  })
})

describe('profit', () => {
  test('without a cost plan nothing about money is claimed', async () => {
    await order('kit', 5)
    const { figures, curve } = await pageOf()
    expect(figures).toMatchObject({
      breakEven: null,
      expectedProfitMinor: null,
      chanceOfLoss: null,
      starts: null,
    })
    expect(curve).toBeNull()
  })

  test('is counted at the run’s own prices and the mix under deposit', async () => {
    await makePlan(world)
    await order('kit', 4)
    const { figures, curve } = await pageOf()
    // By hand: 300.00 once; each kit brings 95.00 − 5.00. Three leave −30.00, four leave 60.00.
    expect(curve?.profits.slice(2, 4)).toEqual([-3000, 6000])
    expect(figures.breakEven).toBe(4)
    expect(curve?.mixOf).toBe('deposits')
    // The deposits are there; a loss comes only from those who do not pay. P(all 4 pay) with Beta(38, 2), by hand:
    // 38·39·40·41 / (40·41·42·43) = 38·39 / (42·43).
    const allPay = (38 * 39) / (42 * 43)
    expect(figures.chanceOfLoss).toBeCloseTo(1 - allPay, 10)
    // Σ C(4,k) B(38+k, 6−k)/B(38,2) · profit(k), with k = 4, 3, 2, 1, 0 by the beta-binomial written out.
    const rising = (from: number, n: number) =>
      Array.from({ length: n }, (_, i) => from + i).reduce((a, b) => a * b, 1)
    const choose = [1, 4, 6, 4, 1]
    const chance = (k: number) => (choose[k]! * rising(38, k) * rising(2, 4 - k)) / rising(40, 4)
    const profit = [-30_000, -21_000, -12_000, -3000, 6000]
    const expected = profit.reduce((sum, each, k) => sum + each * chance(k), 0)
    expect(figures.expectedProfitMinor).toBe(Math.round(expected))
  })

  test('is weighed: who pays, the worst in ten, a tenth not paying, the low point of the money', async () => {
    await makePlan(world)
    await order('kit', 4)
    const { weighed } = await pageOf()
    // Four at 38 of 40. P(at most two pay) = 1 − P(3) − P(4), by the beta-binomial 0.037; P(at most 3) = 0.179: so the worst in
    // ten pays three, which loses 30.00. Three of four pay when a tenth (a unit) does not.
    expect(weighed.likelyToPay).toBeCloseTo(3.8, 12)
    expect(weighed.worstInTenMinor).toBe(-3000)
    expect(weighed.tenthFails).toEqual({ units: 3, profitMinor: -3000 })
    // Tooling of 300.00 is paid today, four deposits of 25.00 come only with the lock.
    expect(weighed.cashLow).toMatchObject({ units: 4, lowMinor: -30_000, on: '2027-03-01' })
  })

  test('takes the mix from sign-ups while nobody is under deposit, and says so', async () => {
    await makePlan(world)
    await makeSignUp(world.offers.boards)
    const { curve } = await pageOf()
    expect(curve?.mixOf).toBe('signups')
    // Boards only: 45.00 − 5.00 each.
    expect(curve?.profits[0]).toBe(4000 - 30_000)
  })

  test('a plan that knows one of the offers not at all gives no figures', async () => {
    const plan = await makePlan(world)
    const offers = (plan.plan['offers'] as { offer: string }[]).filter(({ offer }) => offer !== 'built')
    await Plan.update({ plan: { ...plan.plan, offers } }, { where: { id: plan.id } })
    await order('kit', 4)
    expect((await pageOf()).figures).toMatchObject({ breakEven: null, starts: null })
  })

  test('the run’s own plan goes before the module’s', async () => {
    const { workshop, module, revision } = world
    await makePlan({ workshop, module, revision })
    await makePlan(world, { oneOff: [] })
    await order('kit')
    expect((await pageOf()).curve?.profits[0]).toBe(9000)
  })
})

describe('boards to put into work', () => {
  test('cover the yield of what is assembled, orders entered by hand among them', async () => {
    await makePlan(world)
    await order('built', 2)
    await order('kit', 3)
    const byHand = { kind: 'manual' as const, manualReason: 'A tester', enteredByPersonId: world.owner.id }
    await order('built', 1, { state: 'paid', ...byHand })
    // Three good ones at 95 % each, sure to 95 %: 3 give 0.857, 4 give 0.95⁴ + 4·0.95³·0.05 = 0.986.
    expect((await pageOf()).figures.starts).toBe(4)
  })

  test('believe boards that were really built', async () => {
    await makePlan(world)
    await order('built', 1)
    // One start is good in 95 of 100 cases, which is as sure as the plan asks for.
    expect((await pageOf()).figures.starts).toBe(1)
    for (let i = 0; i < 10; i += 1)
      await makeUnit(world.run, { state: 'scrapped', passedAt: null, scrappedAt: NOW })
    // Beta(19, 1 + 10): one start is good with 19/30, two 1 − (11·12)/(30·31), three 1 − (11·12·13)/(30·31·32) = 0.942,
    // four 1 − (11·12·13·14)/(30·31·32·33) = 0.976.
    expect((await pageOf()).figures.starts).toBe(4)
  })
})

describe('the readiness list', () => {
  test('knows nothing of a run without data, and a line without data is not ready', async () => {
    await world.revision.update({ firstGoodAt: null, firstGoodByPersonId: null, firstGoodHow: null })
    const { readiness } = await pageOf()
    expect(readiness.map(({ key, state }) => [key, state])).toEqual([
      ['first_good_unit', 'unknown'],
      ['lessons', 'ready'],
      ['quotes', 'unknown'],
      ['samples', 'unknown'],
      ['parts_list', 'unknown'],
      ['post_data', 'ready'],
      ['promise', 'unknown'],
      ['page', 'ready'],
      ['repay', 'unknown'],
    ])
  })

  test('is ready line by line when the data are there', async () => {
    await makeReady(world)
    const { readiness } = await pageOf(0)
    expect(readiness.filter(({ state }) => state !== 'ready')).toEqual([])
  })

  test('a first unit that was tried and did not pass is missing', async () => {
    await world.revision.update({ firstGoodAt: null, firstGoodByPersonId: null, firstGoodHow: null })
    const unit = await makeUnit(world.run, { runId: null, state: 'rework', passedAt: null })
    expect(await lineOf('first_good_unit')).toBe('missing')
    await Unit.update({ state: 'passed', passedAt: NOW }, { where: { id: unit.id } })
    expect(await lineOf('first_good_unit')).toBe('ready')
  })

  test('lessons of earlier revisions must be mended here or on the way here, or waived', async () => {
    const { workshop, module } = world
    const about = { workshopId: workshop.id, moduleId: module.id }
    const b = await Revision.create({ ...about, letter: 'B', state: 'testing', createdAt: NOW })
    const c = await Revision.create({ ...about, letter: 'C', state: 'draft', createdAt: NOW })
    const lesson = await Lesson.create({
      ...about,
      foundOnRevisionId: world.revision.id,
      symptom: 'The power header’s silkscreen is reversed.',
      createdAt: NOW,
      createdByPersonId: world.owner.id,
    })
    expect(await lineOf('lessons')).toBe('ready')
    await world.run.update({ revisionId: b.id })
    expect(await lineOf('lessons')).toBe('missing')
    await lesson.update({ mendedInRevisionId: c.id })
    expect(await lineOf('lessons')).toBe('missing')
    await lesson.update({ mendedInRevisionId: b.id })
    expect(await lineOf('lessons')).toBe('ready')
    await world.run.update({ revisionId: c.id })
    expect(await lineOf('lessons')).toBe('ready')
  })

  test.each([
    ['2027-01-30', 30, 'missing'],
    ['2027-01-31', 29, 'missing'],
    ['2027-02-22', 7, 'ready'],
    ['2027-02-21', 8, 'missing'],
  ])('quotes and stock seen on %s (%i days ago): %s', async (quotedOn, _, state) => {
    await makePartsList(world, { quotedOn })
    expect(await lineOf('quotes')).toBe(state)
  })

  test('a part needs stock for the quantity, or an alternate at the end of its life', async () => {
    const { part, quote } = await makePartsList(world)
    await order('kit', 5)
    // Ten resistors for five kits, four of the minimum being fewer.
    await quote.update({ stockSeen: 9 })
    expect(await lineOf('quotes')).toBe('missing')
    await quote.update({ stockSeen: 10 })
    expect(await lineOf('quotes')).toBe('ready')
    await part.update({ lifecycle: 'gone' })
    expect(await lineOf('quotes')).toBe('missing')
  })

  test('parts marked to be checked first need a check that fitted', async () => {
    const { part } = await makePartsList(world)
    await part.update({ needsSample: true })
    expect(await lineOf('samples')).toBe('missing')
    const check = {
      sampleCheckedOn: '2027-02-20',
      sampleByPersonId: world.owner.id,
      sampleNote: 'The shaft is long.',
    }
    await part.update({ ...check, sampleFits: false })
    expect(await lineOf('samples')).toBe('missing')
    await part.update({ ...check, sampleFits: true })
    expect(await lineOf('samples')).toBe('ready')
  })

  test('a parts list with an error is not ready', async () => {
    const { line } = await makePartsList(world)
    await RevisionLine.update({ designators: 'R1' }, { where: { id: line.id } })
    expect(await lineOf('parts_list')).toBe('missing')
  })

  test('an offer without weight, or without an open destination, is not ready', async () => {
    await world.offers.boards.update({ packedWeightG: null })
    expect(await lineOf('post_data')).toBe('missing')
  })

  test('the promise must be at or after the day reached in 8 of 10 cases', async () => {
    await makePlan(world)
    // Ten working days after Monday 1 March 2027 is Monday 15 March.
    const promise = (postedByOn: string) =>
      Promise.all(Object.values(world.runOffers).map((each) => each.update({ postedByOn })))
    await world.run.update({ decideByOn: '2027-03-10', decideByFirstOn: '2027-03-10' })
    await promise('2027-03-15')
    expect(await lineOf('promise')).toBe('ready')
    await promise('2027-03-14')
    expect(await lineOf('promise')).toBe('missing')
    const { runLine, readinessFigures } = await pageOf()
    expect(readinessFigures).toMatchObject({ promisedBy: '2027-03-14', likelyBy: '2027-03-15' })
    expect(runLine).toMatchObject({
      postedBy: '2027-03-14',
      chance: 0,
      steps: [{ from: '2027-03-01', to: '2027-03-15' }],
    })
  })

  test('a workshop without a postal address is not ready', async () => {
    await world.workshop.update({ postalAddress: null })
    expect(await lineOf('page')).toBe('missing')
  })

  test('a line let pass says why', async () => {
    const { workshop, run, owner } = world
    const reason = 'Seen at the fair.'
    await Waiver.create({
      workshopId: workshop.id,
      runId: run.id,
      key: 'quotes',
      reason,
      byPersonId: owner.id,
      at: NOW,
    })
    const { readiness } = await pageOf()
    expect(readiness[2]).toEqual({ key: 'quotes', state: 'waived', waivedFor: reason })
  })
})

describe('paying everyone back', () => {
  test('needs what was taken and has not gone back, of every run that takes deposits', async () => {
    const mine = await order('kit', 2)
    await makeAttempt(mine.order)
    const other = await makeRun(world)
    const theirs = await makeOrder({ run: other.run, lines: [{ offer: other.runOffers.kit, quantity: 1 }] })
    await makeAttempt(theirs.order)
    // 2 × 25.00 here, 25.00 in the other run; of 194.90 with postage 144.90 is still to be asked for.
    expect((await pageOf(7499)).repay).toEqual({ state: 'short', shortByMinor: 1 })
    expect((await pageOf(7500)).repay).toEqual({ state: 'yes' })
    expect((await pageOf(null)).repay).toEqual({ state: 'unknown' })
    expect((await pageOf(7500)).money).toEqual({
      heldMinor: 5000,
      balancesMinor: 14_490,
    })
    const attempt = await PaymentAttempt.findOne({ where: { orderId: theirs.order.id }, rejectOnEmpty: true })
    const refund = await makeRefund(attempt)
    // Asked for, but the money is still there to be taken.
    expect((await pageOf(7499)).repay).toEqual({ state: 'short', shortByMinor: 1 })
    await Refund.update(
      { state: 'succeeded', providerId: 're_1', sentAt: NOW, succeededAt: NOW },
      { where: { id: refund.id } },
    )
    expect((await pageOf(5000)).repay).toEqual({ state: 'yes' })
  })
})

describe('who may see it', () => {
  test('only an owner of the workshop; to everyone else it does not exist', async () => {
    const { person: packer } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    const other = await makeWorld()
    const ask = (actor: Parameters<typeof getRunPage>[0]['actor'], workshopId: string, runId: string) =>
      getRunPage({ actor, workshopId, runId, balanceMinor: null, now: NOW })
    expect(await ask(await actorOf(packer), world.workshop.id, world.run.id)).toBeNull()
    expect(await ask(other.actor, world.workshop.id, world.run.id)).toBeNull()
    expect(await ask(other.actor, other.workshop.id, world.run.id)).toBeNull()
    expect(await ask({ kind: 'visitor' }, world.workshop.id, world.run.id)).toBeNull()
  })
})

describe('statements', () => {
  async function countStatements(): Promise<number> {
    let count = 0
    const { options } = sequelize as unknown as { options: { logging: false | (() => void) } }
    options.logging = () => void (count += 1)
    await pageOf().finally(() => (options.logging = false))
    return count
  }

  test('are as many for 50 orders, sign-ups and parts as for 5', async () => {
    world = await makeWorld({ maximum: 100 })
    await makePlan(world)
    const add = async (rows: number) => {
      for (let i = 0; i < rows; i += 1) {
        await order('kit')
        await makeSignUp(world.offers.built)
      }
    }
    await makePartsList(world)
    await add(5)
    const few = await countStatements()
    await add(45)
    expect(await countStatements()).toBe(few)
    expect(few).toBeLessThan(25)
  })
})
