import { beforeAll, expect, test } from 'vitest'
import { getFulfilmentOrders } from '@/lib/queries/packing/get-fulfilment-orders'
import { getPackingSlips } from '@/lib/queries/packing/get-packing-slips'
import { getParcelPage } from '@/lib/queries/packing/get-parcel-page'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { elsewhere, packingWorld } from '@/tests/services/packing/packing-world'
import { NOW } from '@/tests/support/worlds/base'
import { makeAddress } from '@/tests/support/worlds/order'
import { makeUnit } from '@/tests/support/worlds/parcel'
import { makePerson } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeAll(async () => {
  world = await packingWorld()
})

const problemUrl = (order: string) => `https://brimline.example/account/orders/${order}`
const slipsOf = (parcelIds: string[], over: object = {}) =>
  getPackingSlips({
    actor: world.packer,
    workshopId: world.workshopId,
    parcelIds,
    problemUrl,
    now: NOW,
    ...over,
  })
const pageOf = (parcelId: string, over: object = {}) =>
  getParcelPage({ actor: world.packer, workshopId: world.workshopId, parcelId, now: NOW, ...over })

test('a parcel’s page shows address, lines, weight and services, and no money', async () => {
  const { kit, boards } = world.runOffers
  const { order, parcel, lines } = await world.queued(
    [
      { offer: kit, quantity: 2 },
      { offer: boards, quantity: 1 },
    ],
    { country: 'US' },
  )
  await lines[0]!.update({
    choices: [
      { choiceId: 'c', question: 'Knobs', answerId: 'a', label: 'sand', surchargeMinor: 0, isDefault: false },
    ] as never,
  })
  const page = await pageOf(parcel.id)
  expect(page).toMatchObject({
    state: 'open',
    orderNumber: String(order.number),
    nth: 1,
    of: 1,
    stop: null,
    country: 'US',
    lines: [
      {
        line: lines[0]!.id,
        offer: 'kit',
        quantity: 2,
        choices: ['Knobs: sand'],
        serials: [],
        hasUnits: false,
      },
      { line: lines[1]!.id, offer: 'boards', quantity: 1 },
    ],
    expectedGrams: 990,
    toleranceGrams: 50, // 5 % of 990 is 49.5
    noticesLightest: true,
    services: [{ name: 'Parcel', maxGrams: 5000 }],
  })
  expect(page?.to.at(-1)).toMatch(/^UNITED STATES/)
  expect(Object.keys(page!).join()).not.toMatch(/minor|price|currency|mail|phone/i)
})

test('what stops it stands on its page', async () => {
  const { order, parcel } = await world.queued()
  await order.update({ disputedAt: NOW })
  expect((await pageOf(parcel.id))?.stop).toBe('order_disputed')
  await parcel.update({ state: 'discarded', discardedAt: NOW })
  expect((await pageOf(parcel.id))?.stop).toBe('parcel_discarded')
})

test('another workshop, another role and an unknown parcel: nothing', async () => {
  const { parcel } = await world.queued()
  const stranger = await elsewhere()
  expect(await pageOf(parcel.id, { actor: stranger.actor })).toBeNull()
  expect(await pageOf(parcel.id, stranger)).toBeNull()
  expect(await pageOf(world.workshopId)).toBeNull()
  expect(await slipsOf([parcel.id], { actor: stranger.actor })).toBeNull()
  expect((await slipsOf([parcel.id], stranger))?.slips).toEqual([])
  const list = { actor: stranger.actor, workshopId: world.workshopId, now: NOW }
  expect(await getFulfilmentOrders(list)).toBeNull()
})

test('a slip names sender, addressee in both scripts, lines and serial numbers', async () => {
  const person = await makePerson({ name: 'Hana Mori' })
  const address = await makeAddress(world.workshopId, person, {
    country: 'JP',
    name: '森 花',
    lines: ['本町1-2'],
    city: '港区',
    region: '東京都',
    postcode: '105-0001',
    latin: { name: 'Hana Mori', lines: ['1-2 Honcho'], city: 'Minato-ku', region: 'Tokyo' },
  })
  const { order, parcel, lines } = await world.queued([{ offer: world.runOffers.built, quantity: 2 }], {
    country: 'JP',
    person,
    address,
  })
  const { items } = await listPackQueue({ actor: world.packer, workshopId: world.workshopId })
  expect(items.find((item) => item.parcel === parcel.id)?.name).toBe('Hana Mori')
  const units = [await makeUnit(world.run), await makeUnit(world.run)]
  const serials = units.map(({ serial }) => serial)
  const input = { lines: [{ line: lines[0]!.id, quantity: 2, serials }], grams: 920 }
  const cmd = { actor: world.packer, workshopId: world.workshopId, parcelId: parcel.id, input, now: NOW }
  expect(await packParcel(cmd)).toMatchObject({ ok: true })

  const paper = await slipsOf([parcel.id])
  expect(paper).toMatchObject({
    workshop: world.workshop.name,
    printedBy: 'Lene Quast',
    printedOn: '2027-03-01',
  })
  expect(paper?.from).toEqual([world.workshop.name, 'Mara Quill', 'Am Kai 3', '20457 Hamburg', 'GERMANY'])
  expect(paper?.slips).toHaveLength(1)
  expect(paper?.slips[0]).toMatchObject({
    orderNumber: String(order.number),
    parcel: { nth: 1, of: 1 },
    isReplacement: false,
    lines: [{ module: world.module.name, offer: 'built', quantity: 2, serials: serials.sort() }],
    problemUrl: problemUrl(order.id),
  })
  expect(paper?.slips[0]?.to).toContain('Hana Mori')
  expect(paper?.slips[0]?.to.at(-1)).toBe('JAPAN')
  expect(paper?.slips[0]?.toOwnScript).toContain('森 花')
})

test('slips come in the order asked for; parcels taken apart are left out', async () => {
  const [one, two, three] = [await world.queued(), await world.queued(), await world.queued()]
  await two.parcel.update({ state: 'discarded', discardedAt: NOW })
  const paper = await slipsOf([three.parcel.id, two.parcel.id, one.parcel.id])
  expect(paper?.slips.map(({ orderNumber }) => orderNumber)).toEqual(
    [three, one].map(({ order }) => String(order.number)),
  )
  expect(paper?.slips[0]?.toOwnScript).toBeNull()
})

test('the fulfilment list is the queue in its order, under the run’s name', async () => {
  const house = await packingWorld()
  const late = await house.queued()
  const early = await house.queued()
  await early.lines[0]!.update({ postedByOn: '2027-08-01' })
  const paper = await getFulfilmentOrders({ actor: house.packer, workshopId: house.workshopId, now: NOW })
  expect(paper).toMatchObject({ isCut: false, usesLetter: false, printedBy: 'Lene Quast' })
  expect(paper?.runs).toEqual([{ module: house.module.name, revision: 'A', run: 1 }])
  expect(paper?.orders.map(({ number }) => number)).toEqual(
    [early, late].map(({ order }) => String(order.number)),
  )
  expect(paper?.orders[0]).toMatchObject({
    postedBy: '2027-08-01',
    country: 'DE',
    lines: [{ offer: 'kit', quantity: 1 }],
  })
  const filtered = { actor: house.packer, workshopId: house.workshopId, query: { country: 'FR' }, now: NOW }
  expect(await getFulfilmentOrders(filtered)).toMatchObject({ orders: [], runs: [] })
})
