import { beforeEach, describe, expect, test } from 'vitest'
import type { RunInput } from '@/lib/contracts/runs'
import { createRun } from '@/lib/services/runs/create-run'
import { AuditEntry, Plan, Run, RunOffer } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePlan } from '@/tests/support/worlds/decision'
import { makeModule } from '@/tests/support/worlds/module'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

async function makeWorld() {
  const house = await makeWorkshop()
  const design = await makeModule(house.workshop)
  return { ...house, ...design, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
beforeEach(async () => {
  world = await makeWorld()
})

const input = (over: Partial<RunInput> = {}): RunInput => ({
  module: world.module.slug,
  revision: 'A',
  minimum: 20,
  maximum: 60,
  decideBy: '2027-04-30',
  balanceWhen: 'before_packing',
  offers: [
    { offer: 'kit', priceMinor: 9900, depositMinor: 2000, postedBy: '2027-09-30' },
    { offer: 'built', priceMinor: 17_500, depositMinor: 4000, postedBy: '2027-11-30' },
  ],
  ...over,
})
const create = (over: Partial<RunInput> = {}) =>
  createRun({ actor: world.actor, workshopId: world.workshop.id, input: input(over), now: NOW })

/** The sentences at the fields, or the reason. */
const refusalOf = async (over: Partial<RunInput>) => {
  const answer = await create(over)
  if (answer.ok) throw new Error('was not refused')
  return 'errors' in answer ? Object.keys(answer.errors) : answer.reason
}

describe('a run that is drafted', () => {
  test('keeps prices, dates and the workshop’s habits, and begins as a draft', async () => {
    const made = await create()
    if (!made.ok) throw new Error(made.reason)
    const run = await Run.findByPk(made.value.run, { rejectOnEmpty: true })
    expect(run).toMatchObject({
      state: 'draft',
      number: 1,
      minimum: 20,
      minimumFirst: 20,
      maximum: 60,
      decideByOn: '2027-04-30',
      currency: 'EUR',
      headStartHours: 48,
      limitPerPerson: 4,
      openedAt: null,
    })
    // The day ends in Berlin, two hours before Greenwich in summer.
    expect(run.decideByAt.toISOString()).toBe('2027-04-30T22:00:00.000Z')
    const offers = await RunOffer.findAll({ where: { runId: run.id }, order: [['priceMinor', 'ASC']] })
    expect(offers.map((each) => [each.kind, each.priceMinor, each.depositMinor, each.postedByOn])).toEqual([
      ['kit', 9900, 2000, '2027-09-30'],
      ['built', 17_500, 4000, '2027-11-30'],
    ])
    const audit = await AuditEntry.findAll({ where: { subjectId: run.id } })
    expect(audit.map(({ event, toState }) => [event, toState])).toEqual([['create', 'draft']])
  })

  test('gets its own copy of the module’s plan, at its own prices', async () => {
    await makePlan(world)
    const made = await create()
    if (!made.ok) throw new Error(made.reason)
    const plan = await Plan.findOne({ where: { runId: made.value.run }, rejectOnEmpty: true })
    const offers = plan.plan['offers'] as { offer: string; price: number }[]
    expect(offers.map(({ offer, price }) => [offer, price])).toEqual([
      ['kit', 9900],
      ['built', 17_500],
    ])
  })

  test('is numbered after the ones before it, two at once included', async () => {
    const made = await Promise.all([create(), create(), create()])
    expect(made.map(({ ok }) => ok)).toEqual([true, true, true])
    const runs = await Run.findAll({ where: { moduleId: world.module.id }, order: [['number', 'ASC']] })
    expect(runs.map(({ number }) => number)).toEqual([1, 2, 3])
  })
})

describe('a draft is refused', () => {
  const offer = (over: object) => [
    { offer: 'kit' as const, priceMinor: 9900, depositMinor: 2000, postedBy: '2027-09-30', ...over },
  ]
  test.each([
    ['a module nobody has', { module: 'nowhere' }, ['module']],
    ['a revision nobody has', { revision: 'C' }, ['revision']],
    ['a decide-by day that is today', { decideBy: '2027-03-01' }, ['decideBy']],
    [
      'a deposit the provider cannot charge (its least is 0.50 EUR; from memory)',
      { offers: offer({ depositMinor: 49 }) },
      ['offers.0.depositMinor'],
    ],
  ])('at its field: %s', async (_, over, fields) => {
    expect(await refusalOf(over)).toEqual(fields)
    expect(await Run.count({ where: { moduleId: world.module.id } })).toBe(0)
  })

  test('for an offer the module no longer sells', async () => {
    await world.offers.kit.update({ withdrawnAt: NOW })
    expect(await refusalOf({ offers: offer({}) })).toEqual(['offers.0.offer'])
  })

  test('for another workshop’s module, as if it did not exist', async () => {
    const other = await makeWorld()
    expect(await refusalOf({ module: other.module.slug })).toEqual(['module'])
  })

  test('to everyone but an owner of this workshop', async () => {
    const { person: packer } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    const other = await makeWorld()
    for (const actor of [await actorOf(packer), other.actor, { kind: 'visitor' } as const]) {
      const answer = await createRun({ actor, workshopId: world.workshop.id, input: input(), now: NOW })
      expect(answer).toEqual({ ok: false, reason: 'forbidden' })
    }
  })
})
