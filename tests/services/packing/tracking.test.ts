import { beforeEach, describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { csvText } from '@/lib/http/csv'
import { listPostRows } from '@/lib/queries/packing/list-post-rows'
import { handOverPacked } from '@/lib/services/packing/hand-over-packed'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { importTracking } from '@/lib/services/packing/import-tracking'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { previewTracking } from '@/lib/services/packing/preview-tracking'
import { reportParcel } from '@/lib/services/packing/report-parcel'
import { takeBatch } from '@/lib/services/packing/take-batch'
import { MailOutbox, Parcel } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeAddress } from '@/tests/support/worlds/order'
import { makePerson } from '@/tests/support/worlds/person'
import { elsewhere, packingWorld } from './packing-world'

// S10 numbers with their check digits: RR473124829GB is the standard's own example; the second is worked by hand:
// 1·8+2·6+3·4+4·2+5·2+6·3+7·5+8·9... of 12345678 gives 8·1+6·2+4·3+2·4+3·5+5·6+9·7+7·8 = 204; 204 mod 11 = 6; 11 − 6 = 5.
const GOOD = 'RR473124829GB'
const ALSO = 'LX123456785DE'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeEach(async () => {
  world = await packingWorld()
})

async function packed(...given: Parameters<typeof world.queued>) {
  const made = await world.queued(...given)
  const done = await packParcel({
    actor: world.packer,
    workshopId: world.workshopId,
    parcelId: made.parcel.id,
    input: {
      lines: made.lines.map(({ id, quantity }) => ({ line: id, quantity })),
      grams: made.parcel.expectedGrams!,
    },
    now: NOW,
  })
  if (!done.ok) throw new Error(done.reason)
  return made
}
const take = (csv: string, confirmed = true) =>
  importTracking({ actor: world.packer, workshopId: world.workshopId, input: { csv, confirmed }, now: NOW })
const see = async (csv: string) => {
  const seen = await previewTracking({ actor: world.packer, workshopId: world.workshopId, csv })
  if (!seen.ok) throw new Error(seen.reason)
  return seen.value.map(({ tracking, kind, mistake }) => mistake ?? [tracking, kind])
}
const post = (parcelId: string, input: { service: string; tracking?: string } = { service: 'Letter' }) =>
  handOverParcel({ actor: world.packer, workshopId: world.workshopId, parcelId, input, now: NOW })

test('numbers are matched by order number after a look; one bad line is left out and named', async () => {
  const [a, b] = [await packed(), await packed()]
  const csv = `Order;Tracking\n${a.order.number};rr 473 124 829 gb\n${b.order.number};RR473124828GB\n`
  expect(await take(csv, false)).toEqual(refuse('look_first'))
  expect(await a.parcel.reload()).toMatchObject({ tracking: null })
  expect(await take(csv)).toMatchObject({
    value: { taken: 1, left: [{ line: 3, mistake: 'mistyped: the check digit does not match' }] },
  })
  expect(await a.parcel.reload()).toMatchObject({ tracking: GOOD, trackingKind: 's10', state: 'packed' })
  expect(await b.parcel.reload()).toMatchObject({ tracking: null })
  expect(await take(csv)).toMatchObject({ value: { taken: 1 } })
  expect(await post(a.parcel.id)).toMatchObject({ value: { tracking: GOOD } })
})

describe('a line that cannot be taken says why', () => {
  test('another workshop’s order, one not packed, one number twice, one on another parcel', async () => {
    const [a, b] = [await packed(), await packed()]
    const waiting = await world.queued()
    await post(b.parcel.id, { service: 'Letter', tracking: ALSO })
    const stranger = await elsewhere()
    const line = (order: number | string, number: string) => `order,tracking\n${order},${number}`
    expect(await see(line(999_999, GOOD))).toEqual(['no such order in this workshop'])
    expect(await see(line(waiting.order.number, GOOD))).toEqual([
      'this order has no packed or posted parcel that could take it',
    ])
    expect(await see(line(a.order.number, ALSO))).toEqual([
      `this number stands on parcel ${b.parcel.number} already`,
    ])
    expect(await see(line(b.order.number, GOOD))).toEqual([`its parcel has number ${ALSO} already`])
    const c = await packed()
    expect(await see(`order,tracking\n${a.order.number},${GOOD}\n${c.order.number},${GOOD}`)).toEqual([
      [GOOD, 's10'],
      'this number stands in the list twice',
    ])
    const there = { actor: stranger.actor, workshopId: world.workshopId, csv: line(a.order.number, GOOD) }
    expect(await previewTracking(there)).toEqual(refuse('forbidden'))
  })

  test('shifted columns, formulas, words instead of numbers; another carrier’s form is taken as not verifiable', async () => {
    const a = await packed()
    const n = a.order.number
    expect(await see(`order;name;tracking\n${n};Ada;Grove;${GOOD}`)).toEqual([
      'has more or fewer columns than the headings: a cell is missing or has a stray separator',
    ])
    expect(await see(`order;tracking\n${n};=HYPERLINK("x")`)).toEqual(['holds a formula instead of a number'])
    expect(await see(`order;tracking\nAda Grove;${GOOD}`)).toEqual(['no such order in this workshop'])
    expect(await see(`order;tracking\n${n};not known`)).toEqual([
      'not a tracking number: use letters, digits and hyphens',
    ])
    expect(await see(`order;tracking\n${n};0340434-188`)).toEqual([['0340434-188', 'other']])
    expect(await see(`order;state\n${n};eaten`)).toEqual([
      '“eaten” is no state: write delivered, lost or returned',
    ])
    expect(await see(`order;state\n${n};delivered`)).toEqual(['its parcel was not handed over yet'])
  })

  test.each([
    ['order;tracking', 'The list has headings and nothing below them.'],
    ['number;code\n1;2', 'No heading says which column holds the order number. Name one “order”.'],
    [
      'order;weight\n1;2',
      'No heading names tracking numbers or states. Name a column “tracking” or “state”.',
    ],
  ])('%#', async (csv, sentence) => {
    expect(await take(csv)).toMatchObject({ reason: 'invalid', errors: { csv: sentence } })
  })
})

test('what arrived comes back by list or by hand; with the last piece the order’s day of arrival is known', async () => {
  const { kit } = world.runOffers
  const a = await packed([{ offer: kit, quantity: 1 }])
  await post(a.parcel.id)
  expect(await take(`order;state\n${a.order.number};Delivered`)).toMatchObject({ value: { taken: 1 } })
  expect(await a.parcel.reload()).toMatchObject({ state: 'delivered', deliveredAt: NOW })
  expect(await a.order.reload()).toMatchObject({ deliveredAt: NOW })
  const report = (parcelId: string, state: 'delivered' | 'lost' | 'returned' | 'found') =>
    reportParcel({
      ...{ actor: world.packer, workshopId: world.workshopId, parcelId, now: NOW },
      input: { state },
    })
  expect(await report(a.parcel.id, 'delivered')).toEqual(refuse('not_allowed'))
  const b = await packed()
  expect(await report(b.parcel.id, 'lost')).toEqual(refuse('not_handed_over'))
  await post(b.parcel.id)
  expect(await report(b.parcel.id, 'lost')).toMatchObject(ok({ state: 'lost' }))
  expect(await report(b.parcel.id, 'found')).toMatchObject(ok({ state: 'delivered' }))
})

test('a batch is handed over in one press by the quoted services; one that cannot go stays, the others’ mails go out', async () => {
  const made = [await packed(), await packed()]
  const waiting = [await world.queued(), await world.queued()]
  const quote = { zoneId: 'z', serviceId: 's', grams: 420, priceMinor: 500 as never, serviceName: 'Letter' }
  for (const { order } of [...made, ...waiting]) await order.update({ postageQuote: quote })
  const batch = await takeBatch({
    ...{ actor: world.packer, workshopId: world.workshopId, now: NOW },
    input: { most: 2 },
  })
  if (!batch.ok) throw new Error(batch.reason)
  const inBatch = await Parcel.findAll({ where: { batchId: batch.value.batch } })
  for (const each of waiting)
    await packParcel({
      ...{ actor: world.packer, workshopId: world.workshopId, parcelId: each.parcel.id, now: NOW },
      input: {
        lines: each.lines.map(({ id, quantity }) => ({ line: id, quantity })),
        grams: each.parcel.expectedGrams!,
      },
    })
  await waiting[0]!.order.update({ disputedAt: NOW })
  const go = () =>
    handOverPacked({
      ...{ actor: world.packer, workshopId: world.workshopId, now: NOW },
      batchId: batch.value.batch,
    })
  expect(await go()).toEqual(
    ok({ handedOver: 1, left: [{ parcel: waiting[0]!.parcel.number, reason: 'order_disputed' }] }),
  )
  expect(await go()).toMatchObject(ok({ handedOver: 0 }))
  const mails = await MailOutbox.count({
    where: { kind: 'parcel_handed_over', subjectId: inBatch.map(({ id }) => id) },
  })
  expect(mails).toBe(1)
})

test('the list for a carrier has the columns asked for, and a formula somebody typed as a name is text', async () => {
  const person = await makePerson()
  const address = await makeAddress(world.workshopId, person, {
    country: 'DE',
    name: '=HYPERLINK("http://evil.example")',
    lines: ['Hof 1'],
    city: 'Ulm',
    postcode: '89073',
  })
  const { order } = await packed(undefined, { person, address })
  const [row] = await listPostRows({
    ...{ actor: world.packer, workshopId: world.workshopId, now: NOW },
    query: {},
  })
  expect(row).toMatchObject({ order: String(order.number), line1: 'Hof 1', city: 'Ulm', grams: '420' })
  const text = csvText(['name', 'order'], [[row!.name, row!.order]])
  expect(text).toContain(`'=HYPERLINK`)
})
