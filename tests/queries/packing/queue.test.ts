import { beforeAll, expect, test } from 'vitest'
import type { Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { getPackSummary } from '@/lib/queries/packing/get-pack-summary'
import { getParcelOfOrder } from '@/lib/queries/packing/get-parcel-of-order'
import { listPackedParcels } from '@/lib/queries/packing/list-packed-parcels'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { listStoppedOrders } from '@/lib/queries/packing/list-stopped-orders'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { Destination, type OrderLine, type Parcel } from '@/models'
import { elsewhere, packingWorld } from '@/tests/services/packing/packing-world'
import { NOW } from '@/tests/support/worlds/base'
import { makePerson } from '@/tests/support/worlds/person'

type World = Awaited<ReturnType<typeof packingWorld>>
const asked = (world: World, actor: Actor = world.packer) => ({ actor, workshopId: world.workshopId })
const pack = ({ packer, workshopId }: World, parcel: Parcel, lines: OrderLine[]) =>
  packParcel({
    actor: packer,
    workshopId,
    parcelId: parcel.id,
    input: { lines: lines.map(({ id, quantity }) => ({ line: id, quantity })), grams: parcel.expectedGrams! },
    now: NOW,
  })

/** Statements sent while `work` runs. */
async function statements(work: () => Promise<unknown>): Promise<number> {
  const { options } = sequelize as unknown as { options: { logging: false | (() => void) } }
  let count = 0
  options.logging = () => void (count += 1)
  await work().finally(() => (options.logging = false))
  return count
}

let world: World
let numbers: Record<'late' | 'early' | 'delayed' | 'mixed', string>
beforeAll(async () => {
  world = await packingWorld()
  const { kit, built } = world.runOffers
  const late = await world.queued([{ offer: kit, quantity: 1 }])
  const early = await world.queued([{ offer: built, quantity: 2 }], { country: 'US' })
  await early.lines[0]!.update({ postedByOn: '2027-08-01' })
  const delayed = await world.queued([{ offer: kit, quantity: 1 }], { country: 'GB' })
  await delayed.lines[0]!.update({ postedByOn: '2027-07-01', revisedPostedByOn: '2027-10-01' })
  const mixed = await world.queued([
    { offer: kit, quantity: 1 },
    { offer: built, quantity: 1 },
  ])
  await mixed.lines[1]!.update({ postedByOn: '2027-08-15' })
  const nameOf = ({ order }: typeof late) => String(order.number)
  numbers = { late: nameOf(late), early: nameOf(early), delayed: nameOf(delayed), mixed: nameOf(mixed) }
})

test('the oldest promise comes first: the earliest line counts, and the day told in a delay notice', async () => {
  const { items, next } = await listPackQueue(asked(world))
  expect(items.map(({ number, postedBy }) => [number, postedBy])).toEqual([
    [numbers.early, '2027-08-01'],
    [numbers.mixed, '2027-08-15'],
    [numbers.late, '2027-08-31'],
    [numbers.delayed, '2027-10-01'],
  ])
  expect(next).toBeNull()
})

test('an item says what is on the parcel and nothing of money', async () => {
  const [item] = (await listPackQueue(asked(world))).items
  expect(item).toMatchObject({
    country: 'US',
    lines: [{ module: world.module.name, offer: 'built', quantity: 2, choices: [] }],
  })
  expect(Object.keys(item!).sort()).toEqual(
    ['country', 'lines', 'name', 'number', 'order', 'parcel', 'postedBy', 'run'].sort(),
  )
  expect(JSON.stringify(item)).not.toMatch(/minor|price|total|mail|currency/i)
})

test('pages follow each other without a gap or a repeat, and one statement each', async () => {
  const seen: string[] = []
  let after: string | undefined
  for (let page = 0; page < 4; page += 1) {
    const { items, next } = await listPackQueue({ ...asked(world), query: { after }, limit: 1 })
    seen.push(...items.map(({ number }) => number))
    after = next ?? undefined
  }
  expect(seen).toEqual([numbers.early, numbers.mixed, numbers.late, numbers.delayed])
  expect(after).toBeUndefined()
  expect(await statements(() => listPackQueue(asked(world)))).toBe(1)
})

test('filters by offer and country', async () => {
  const found = async (query: Parameters<typeof listPackQueue>[0]['query']) =>
    (await listPackQueue({ ...asked(world), query })).items.map(({ number }) => number)
  expect(await found({ offer: 'built' })).toEqual([numbers.early, numbers.mixed])
  expect(await found({ offer: 'boards' })).toEqual([])
  expect(await found({ country: 'DE' })).toEqual([numbers.mixed, numbers.late])
  expect(await found({ country: 'GB', offer: 'kit' })).toEqual([numbers.delayed])
})

test('a line filter leaves the other lines of the parcel in sight', async () => {
  const { items } = await listPackQueue({ ...asked(world), query: { offer: 'built', country: 'DE' } })
  expect(items[0]?.lines.map(({ offer }) => offer)).toEqual(['kit', 'built'])
})

test('what stops leaves the queue and is listed with its reason', async () => {
  const house = await packingWorld()
  const made = {
    fine: await house.queued(),
    disputed: await house.queued(),
    held: await house.queued(),
    paused: await house.queued(undefined, { country: 'JP' }),
    cancelled: await house.queued(),
    waiting: await house.paidOrder(),
  }
  await made.disputed.order.update({ disputedAt: NOW })
  await made.held.parcel.update({ onHoldReason: 'Which colour?' })
  await made.cancelled.order.update({ state: 'cancelled', cancelledAt: NOW, cancelCause: 'withdrawal' })
  await Destination.update(
    { state: 'paused', reason: 'No parcels at present.' },
    { where: { workshopId: house.workshopId, country: 'JP' } },
  )
  expect((await listPackQueue(asked(house))).items.map(({ parcel }) => parcel)).toEqual([made.fine.parcel.id])
  const stopped = await listStoppedOrders(asked(house))
  expect(new Map(stopped.map(({ order, reason }) => [order, reason]))).toEqual(
    new Map([
      [made.disputed.order.id, 'order_disputed'],
      [made.held.order.id, 'on_hold'],
      [made.paused.order.id, 'destination_paused'],
      [made.waiting.order.id, 'not_yet'],
    ]),
  )
})

test('progress, packed and posted follow the work', async () => {
  const house = await packingWorld()
  const [one, two] = [await house.queued(), await house.queued()]
  await house.paidOrder(undefined, { state: 'reserved', paidAt: null })
  expect(await getPackSummary(asked(house))).toMatchObject({
    toPack: 2,
    packed: 0,
    countries: ['DE'],
    progress: [{ run: house.run.id, posted: 0, total: 3 }],
  })
  await pack(house, one.parcel, one.lines)
  await pack(house, two.parcel, two.lines)
  const input = { service: 'Parcel', tracking: 'RR473124829GB' }
  await handOverParcel({
    actor: house.packer,
    workshopId: house.workshopId,
    parcelId: one.parcel.id,
    input,
    now: NOW,
  })
  expect(await getPackSummary(asked(house))).toMatchObject({
    toPack: 0,
    packed: 1,
    progress: [{ posted: 1, total: 3 }],
  })
  expect((await listPackedParcels({ ...asked(house), show: 'packed', now: NOW })).items).toMatchObject([
    { parcel: two.parcel.id, orderNumber: String(two.order.number), grams: 420, service: null },
  ])
  expect((await listPackedParcels({ ...asked(house), show: 'handed_over', now: NOW })).items).toMatchObject([
    { parcel: one.parcel.id, service: 'Parcel', tracking: 'RR473124829GB', at: NOW.toISOString() },
  ])
})

test('a scanned number leads to its parcel, the open one before one that left', async () => {
  const { parcel, order } = await world.queued(undefined, { person: await makePerson() })
  const find = (number: string, actor?: Actor) => getParcelOfOrder({ ...asked(world, actor), number })
  expect(await find(` ${order.number} `)).toBe(parcel.id)
  expect(await find('999999')).toBeNull()
  expect(await find('1; drop table parcels')).toBeNull()
  expect(await find(String(order.number), { kind: 'visitor' })).toBeNull()
  await parcel.update({ state: 'discarded', discardedAt: NOW })
  expect(await find(String(order.number))).toBeNull()
  const again = await world.open(order)
  expect(await find(String(order.number))).toBe(again?.id)
})

test('others see nothing', async () => {
  const stranger = await elsewhere()
  for (const actor of [stranger.actor, { kind: 'visitor' } as const]) {
    expect((await listPackQueue(asked(world, actor))).items).toEqual([])
    expect(await listStoppedOrders(asked(world, actor))).toEqual([])
    expect(await getPackSummary(asked(world, actor))).toBeNull()
    expect((await listPackedParcels({ ...asked(world, actor), show: 'packed', now: NOW })).items).toEqual([])
  }
  expect((await listPackQueue(stranger)).items).toEqual([])
})
