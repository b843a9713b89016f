import { beforeEach, describe, expect, test } from 'vitest'
import { listToday } from '@/lib/queries/today/list-today'
import { Quote } from '@/models'
import { at, NOW } from '@/tests/support/worlds/base'
import { makePartsList } from '@/tests/support/worlds/decision'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeModule } from '@/tests/support/worlds/module'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

async function makeWorld(over: Parameters<typeof makeRun>[1] = {}) {
  const house = await makeWorkshop()
  const parts = await makeRun(
    { ...house, ...(await makeModule(house.workshop)) },
    { minimum: 2, maximum: 20, ...over },
  )
  return { ...house, ...parts, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
beforeEach(async () => {
  world = await makeWorld()
})

const today = async (now = NOW) => listToday({ actor: world.actor, workshopId: world.workshop.id, now })
const kinds = async (now = NOW) => (await today(now)).map(({ what }) => what)
const order = (over: Parameters<typeof makeOrder>[1] = {}) =>
  makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] }, over)

describe('what needs the owner', () => {
  test('nothing, far from every day that counts', async () => {
    expect(await today()).toEqual([])
  })

  test('a decision, from 14 days before its day on, with what the clock will do', async () => {
    expect(await kinds(at('2027-03-17T12:00:00Z'))).toEqual([])
    const [item] = await today(at('2027-03-18T12:00:00Z'))
    expect(item).toMatchObject({
      what: 'decide_soon',
      decideBy: '2027-04-01',
      callsOffOn: '2027-04-08',
      deposited: 0,
    })
  })

  test('a reached minimum', async () => {
    await order()
    expect(await kinds()).toEqual([])
    await order()
    expect(await kinds()).toEqual(['ready_to_lock'])
  })

  test('balances that failed, per run', async () => {
    const failed = { state: 'balance_due', balanceAskedAt: NOW, balanceFailedAt: NOW } as const
    await world.run.update({ state: 'locked', lockedAt: NOW })
    await order(failed)
    await order({ ...failed, balanceFailedAt: null })
    const item = (await today()).find(({ what }) => what === 'balances_failed')
    expect(item).toMatchObject({ count: 1, run: { id: world.run.id, number: world.run.number } })
  })

  test('a promise within 14 days, with what silence would do country by country', async () => {
    await world.run.update({ state: 'locked', lockedAt: NOW })
    await order({ country: 'US' })
    await order({ country: 'DE' })
    await order({ country: 'DE', state: 'posted', postedAt: NOW, paidAt: NOW })
    expect(await kinds(at('2027-08-16T12:00:00Z'))).toEqual([])
    const [item] = await today(at('2027-08-17T12:00:00Z'))
    if (item?.what !== 'notices_due') throw new Error('no notice is due')
    expect(item).toMatchObject({ postedBy: '2027-08-31', count: 2 })
    const us = item.silence.find(({ country }) => country === 'US')
    // 16 CFR 435.2(b): without a new date silence cancels, within 30 days of the first one; elsewhere it waits.
    expect(us).toMatchObject({ orders: 1, silenceMeans: 'cancel', answerBy: '2027-09-30' })
    expect(item.silence.find(({ country }) => country === 'DE')).toMatchObject({
      orders: 1,
      silenceMeans: 'wait',
    })
  })

  test('parts whose quote is 30 days old, or that have none', async () => {
    const { quote } = await makePartsList(world, { quotedOn: '2027-01-31' })
    expect(await kinds()).toEqual([])
    await quote.update({ quotedOn: '2027-01-30' })
    expect(await today()).toMatchObject([{ what: 'quotes_old', count: 1 }])
    await Quote.update({ quotedOn: '2027-02-28' }, { where: { id: quote.id } })
    expect(await kinds()).toEqual([])
  })

  test('nothing to who may not see it', async () => {
    await order()
    await order()
    const { person } = await makeUser({ workshopId: (await makeWorld()).workshop.id, role: 'owner' })
    const actor = await actorOf(person)
    expect(await listToday({ actor, workshopId: world.workshop.id, now: NOW })).toEqual([])
  })
})
