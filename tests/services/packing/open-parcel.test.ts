import { beforeAll, expect, test } from 'vitest'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { discardParcels } from '@/lib/services/_steps/discard-parcels'
import { fillQueue } from '@/lib/services/packing/fill-queue'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { AuditEntry, Destination, Order, Parcel, ParcelLine, Unit } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeUnit } from '@/tests/support/worlds/parcel'
import { elsewhere, open, packingWorld } from './packing-world'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeAll(async () => {
  world = await packingWorld()
})

test('a paid order gets one open parcel with all its lines and what they should weigh', async () => {
  const { runOffers } = world
  const { order, lines } = await world.paidOrder([
    { offer: runOffers.kit, quantity: 2 },
    { offer: runOffers.boards, quantity: 1 },
  ])
  const parcel = await open(order)
  expect(parcel).toMatchObject({ state: 'open', addressId: order.addressId, expectedGrams: 2 * 420 + 150 })
  const inside = await ParcelLine.findAll({ where: { parcelId: parcel!.id } })
  expect(new Map(inside.map((line) => [line.orderLineId, line.quantity]))).toEqual(
    new Map(lines.map((line) => [line.id, line.quantity])),
  )
  const trail = await AuditEntry.findAll({ where: { subjectId: parcel!.id } })
  expect(trail.map(({ event, toState }) => [event, toState])).toEqual([['open', 'open']])
})

test('asked again, nothing is left to pack', async () => {
  const { order } = await world.queued()
  expect(await open(order)).toBeNull()
})

test('numbers of parcels count up within the workshop', async () => {
  const [one, two] = [await world.queued(), await world.queued()]
  expect(two.parcel.number).toBe(one.parcel.number + 1)
})

test('an order that must not be packed opens nothing', async () => {
  const { kit } = world.runOffers
  const reserved = await makeOrder(
    { run: world.run, lines: [{ offer: kit, quantity: 1 }] },
    { state: 'reserved' },
  )
  expect(await open(reserved.order)).toBeNull()
  const disputed = await world.paidOrder(undefined, { disputedAt: NOW })
  expect(await open(disputed.order)).toBeNull()
  await Destination.update(
    { state: 'paused', reason: 'The post takes no parcels there.' },
    { where: { offerId: kit.offerId, country: 'JP' } },
  )
  const paused = await world.paidOrder(undefined, { country: 'JP' })
  expect(await open(paused.order)).toBeNull()
  const boards = await world.paidOrder([{ offer: world.runOffers.boards, quantity: 1 }], { country: 'JP' })
  expect(await open(boards.order)).not.toBeNull()
})

test('an offer that was never weighed gives nothing to compare with', async () => {
  const house = await packingWorld()
  await house.offers.built.update({ packedWeightG: null })
  const { built, kit } = house.runOffers
  const { parcel } = await house.queued([
    { offer: built, quantity: 1 },
    { offer: kit, quantity: 1 },
  ])
  expect(parcel.expectedGrams).toBeNull()
})

test('once units are recorded, an order waits until enough of them have passed', async () => {
  const house = await packingWorld()
  const { built } = house.runOffers
  const [first, second] = [
    await house.paidOrder([{ offer: built, quantity: 1 }]),
    await house.paidOrder([{ offer: built, quantity: 2 }]),
  ]
  const unit = await makeUnit(house.run, { state: 'started', passedAt: null })
  expect(await open(first.order)).toBeNull()
  await unit.update({ state: 'passed', passedAt: NOW })
  await makeUnit(house.run)
  expect(await open(first.order)).not.toBeNull()
  expect(await open(second.order)).toBeNull() // two have passed, one is promised to the first
  await makeUnit(house.run)
  expect(await fillQueue({ actor: house.packer, workshopId: house.workshopId, now: NOW })).toEqual(
    ok({ opened: 1 }),
  )
  expect(await fillQueue({ actor: house.packer, workshopId: house.workshopId, now: NOW })).toEqual(
    ok({ opened: 0 }),
  )
})

test('the queue is filled by those who may open parcels, of the own workshop only', async () => {
  const house = await packingWorld()
  await house.paidOrder()
  const { actor: stranger } = await elsewhere()
  const asked = { workshopId: house.workshopId, now: NOW }
  expect(await fillQueue({ actor: stranger, ...asked })).toMatchObject({ reason: 'forbidden' })
  expect(await fillQueue({ actor: { kind: 'visitor' }, ...asked })).toMatchObject({ reason: 'forbidden' })
  expect(await Parcel.count({ where: { workshopId: house.workshopId } })).toBe(0)
  expect(await fillQueue({ actor: house.packer, ...asked })).toEqual(ok({ opened: 1 }))
})

test('a called-off order leaves no parcel behind: packed ones are unpacked first, units are free again', async () => {
  const { built } = world.runOffers
  const { order, lines, parcel } = await world.queued([{ offer: built, quantity: 1 }])
  const unit = await makeUnit(world.run)
  const packed = await packParcel({
    actor: world.packer,
    workshopId: world.workshopId,
    parcelId: parcel.id,
    input: { lines: [{ line: lines[0]!.id, quantity: 1, serials: [unit.serial] }], grams: 460 },
    now: NOW,
  })
  expect(packed).toMatchObject({ ok: true, value: { order: 'packed' } })
  const discard = () =>
    inTransaction(async (tx) => {
      const again = await Order.findByPk(order.id, { transaction: tx, rejectOnEmpty: true })
      return ok(await discardParcels(tx, again, NOW))
    })
  await discard()
  await discard()
  expect(await AuditEntry.count({ where: { subjectId: parcel.id, event: 'discard' } })).toBe(1)
  expect(await parcel.reload()).toMatchObject({ state: 'discarded', discardedAt: NOW })
  expect(await order.reload()).toMatchObject({ state: 'paid', packedAt: null })
  expect(await unit.reload()).toMatchObject({ state: 'passed', orderLineId: null })
  await Unit.destroy({ where: { id: unit.id } })
})
