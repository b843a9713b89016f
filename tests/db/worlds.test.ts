import { expect, test } from 'vitest'
import { Module, Order, Run } from '@/models'
import { NOW } from '../support/worlds/base'
import { actorOf, makeUser } from '../support/worlds/person'
import { makeParcel, makeUnit } from '../support/worlds/parcel'
import { pier } from '../support/worlds/pier'
import { makeWorkshop } from '../support/worlds/workshop'

test('the small world stands, and its rows find each other', async () => {
  const world = await pier()
  const order = await Order.findByPk(world.order.id, {
    include: [
      'lines',
      'attempts',
      'person',
      'address',
      { association: 'run', include: ['module', 'revision'] },
    ],
    rejectOnEmpty: true,
  })
  expect(order.run?.module?.slug).toBe('rowlock')
  expect(order.lines?.map((line) => [line.offerKind, line.quantity])).toEqual([['kit', 1]])
  expect(order.attempts?.map((attempt) => attempt.amountMinor)).toEqual([order.depositMinor])
  expect(order.person?.name).toBe('Ines Sommer')
  expect((await Run.findByPk(world.run.id))?.committedUnits).toBe(1)

  const module = await Module.findOne({
    where: { slug: 'rowlock' },
    include: ['workshop', 'revisions', { association: 'offers', include: ['choices', 'destinations'] }],
    rejectOnEmpty: true,
  })
  expect(module.offers?.map((offer) => offer.kind).sort()).toEqual(['boards', 'built', 'kit'])
  expect(module.workshop?.name).toBe('Hollow Pier Modular')

  await world.order.update({ state: 'paid', paidAt: world.order.placedAt })
  const { parcelLines } = await makeParcel(world.order, world.lines)
  expect(parcelLines).toHaveLength(1)
  expect((await makeUnit(world.run)).facts()).toMatchObject({ state: 'passed', runId: world.run.id })
})

test('an actor is a person with the memberships that still hold', async () => {
  const { workshop } = await makeWorkshop()
  const { person, membership } = await makeUser({ workshopId: workshop.id, role: 'packer' })
  expect(await actorOf(person)).toMatchObject({ memberships: [{ workshopId: workshop.id, role: 'packer' }] })
  await membership?.update({ endedAt: NOW })
  expect(await actorOf(person)).toMatchObject({ memberships: [] })
})
