import { beforeAll, describe, expect, test } from 'vitest'
import type { HandOverInput } from '@/lib/contracts/packing'
import { MAILS } from '@/lib/contracts/mails'
import { minor } from '@/lib/core/brand'
import { ok, refuse } from '@/lib/core/result'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { reopenParcel } from '@/lib/services/packing/reopen-parcel'
import {
  AuditEntry,
  LedgerEntry,
  LedgerTransfer,
  MailOutbox,
  type Order,
  ParcelLine,
  PostageService,
} from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeUnit } from '@/tests/support/worlds/parcel'
import { elsewhere, packingWorld } from './packing-world'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeAll(async () => {
  world = await packingWorld()
})

async function packed(...given: Parameters<typeof world.queued>) {
  const made = await world.queued(...given)
  const lines = made.lines.map(({ id, quantity }) => ({ line: id, quantity }))
  const input = { lines, grams: made.parcel.expectedGrams ?? 1 }
  const cmd = { actor: world.packer, workshopId: world.workshopId, parcelId: made.parcel.id, input, now: NOW }
  expect(await packParcel(cmd)).toMatchObject({ ok: true })
  return made
}

const handOver = (
  parcelId: string,
  input: HandOverInput = { service: 'Parcel' },
  over: Partial<Parameters<typeof handOverParcel>[0]> = {},
) => handOverParcel({ actor: world.packer, workshopId: world.workshopId, parcelId, input, now: NOW, ...over })

const bookedFor = async (order: Order) => {
  const transfer = await LedgerTransfer.findOne({
    where: { sourceId: order.id, kind: 'order_posted' },
    include: [{ model: LedgerEntry, as: 'entries' }],
  })
  return new Map(transfer?.entries?.map((entry) => [entry.account, entry.amountMinor]))
}

test('the last parcel posts the order: mail, money, trail', async () => {
  const { order, parcel } = await packed([{ offer: world.runOffers.kit, quantity: 2 }])
  expect(await handOver(parcel.id, { service: 'parcel', tracking: 'rr 473 124 829 gb' })).toEqual(
    ok({ parcel: parcel.id, state: 'handed_over', order: 'posted', tracking: 'RR473124829GB' }),
  )
  expect(await parcel.reload()).toMatchObject({
    serviceName: 'Parcel',
    tracking: 'RR473124829GB',
    trackingKind: 's10',
    handedOverAt: NOW,
    handedOverByPersonId: world.lene.id,
  })
  expect((await PostageService.findByPk(parcel.serviceId!))?.zoneId).toBe(world.zones[0]!.id)
  expect(await order.reload()).toMatchObject({ state: 'posted', postedAt: NOW })

  // By hand: two kits at 95.00 and postage of 4.90 with 19 % in them; 190.00 × 19/119 = 30.34, 4.90 × 19/119 = 0.78.
  expect(await bookedFor(order)).toEqual(
    new Map([
      ['customer_deposits', 19490],
      ['sales', -(19490 - 3112)],
      ['tax_payable', -3112],
    ]),
  )

  const mail = await MailOutbox.findOne({ where: { subjectId: parcel.id }, rejectOnEmpty: true })
  expect(MAILS.parcel_handed_over.parse(mail.props)).toMatchObject({
    orderNumber: String(order.number),
    lines: [{ offer: 'kit', quantity: 2, choices: [] }],
    service: 'Parcel',
    tracking: 'RR473124829GB',
    trackingUrl: null,
    handedOverOn: '2027-03-01',
    more: false,
    crossesCustoms: false,
  })
  expect(mail).toMatchObject({ kind: 'parcel_handed_over', personId: order.personId })
  const trail = await AuditEntry.findAll({ where: { subjectId: [order.id, parcel.id], event: 'hand_over' } })
  expect(trail.map(({ subjectType, toState }) => [subjectType, toState]).sort()).toEqual([
    ['order', 'posted'],
    ['parcel', 'handed_over'],
  ])
  expect(await handOver(parcel.id)).toEqual(refuse('already_handed_over'))
  expect(await MailOutbox.count({ where: { subjectId: parcel.id } })).toBe(1)
})

test('twice at once is once', async () => {
  const { order, parcel } = await packed()
  const both = await Promise.all([handOver(parcel.id), handOver(parcel.id)])
  expect(both.filter((each) => each.ok)).toHaveLength(1)
  expect(await LedgerTransfer.count({ where: { sourceId: order.id, kind: 'order_posted' } })).toBe(1)
})

test('units go with the parcel', async () => {
  const { lines, parcel } = await world.queued([{ offer: world.runOffers.built, quantity: 1 }])
  const unit = await makeUnit(world.run)
  const input = { lines: [{ line: lines[0]!.id, quantity: 1, serials: [unit.serial] }], grams: 460 }
  const who = { actor: world.packer, workshopId: world.workshopId, parcelId: parcel.id, now: NOW }
  expect(await packParcel({ ...who, input })).toMatchObject({ ok: true })
  expect(await handOver(parcel.id)).toMatchObject({ ok: true })
  expect(await unit.reload()).toMatchObject({ state: 'posted', orderLineId: lines[0]!.id })
})

test('a free order books nothing and is posted all the same', async () => {
  const free = { goodsMinor: minor(0), postageMinor: minor(0), postageTaxMinor: minor(0), taxMinor: minor(0) }
  const sums = { totalMinor: minor(0), depositMinor: minor(0), balanceMinor: minor(0) }
  const entered = { kind: 'manual' as const, manualReason: 'Tester', enteredByPersonId: world.owner.id }
  const { order, parcel } = await packed(undefined, { ...free, ...sums, ...entered })
  expect(await handOver(parcel.id)).toMatchObject({ ok: true, value: { order: 'posted' } })
  expect((await bookedFor(order)).size).toBe(0)
})

describe('tracking', () => {
  test('a wrong check digit is refused at its field with a sentence', async () => {
    const { parcel } = await packed()
    const refused = await handOver(parcel.id, { service: 'Parcel', tracking: 'RR473124828GB' })
    expect(refused).toMatchObject({ reason: 'invalid' })
    expect('errors' in refused && refused.errors.tracking).toContain('check digit')
    expect((await parcel.reload()).state).toBe('packed')
  })

  test('another carrier’s number is taken, and known not to be verified', async () => {
    const { parcel } = await packed()
    await handOver(parcel.id, { service: 'Van', tracking: '0034 0434 1610' })
    expect(await parcel.reload()).toMatchObject({
      tracking: '003404341610',
      trackingKind: 'other',
      serviceId: null,
      serviceName: 'Van',
    })
  })

  test('a number that stands on another parcel is refused, also at the same moment', async () => {
    const [one, two, three] = [await packed(), await packed(), await packed()]
    const number = { service: 'Parcel', tracking: 'CP123456785DE' }
    const both = await Promise.all([handOver(one.parcel.id, number), handOver(two.parcel.id, number)])
    const refused = both.find((each) => !each.ok)
    expect(both.filter((each) => each.ok)).toHaveLength(1)
    expect(refused && 'errors' in refused && refused.errors.tracking).toMatch(/stands on parcel \d+ already/)
    expect(await handOver(three.parcel.id, number)).toMatchObject({ reason: 'invalid' })
    // The same number in another workshop is none of this one's business.
    const house = await packingWorld()
    const { lines, parcel } = await house.queued()
    const who = { actor: house.packer, workshopId: house.workshopId, parcelId: parcel.id, now: NOW }
    await packParcel({ ...who, input: { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 } })
    expect(await handOverParcel({ ...who, input: number })).toMatchObject({ ok: true })
  })

  test('the link of the service carries the number', async () => {
    const house = await packingWorld()
    await PostageService.update(
      { trackingUrl: 'https://post.example/follow?n={tracking}', claimWithinDays: 30 },
      { where: { workshopId: house.workshopId } },
    )
    const { lines, parcel } = await house.queued(undefined, { country: 'US' })
    const who = { actor: house.packer, workshopId: house.workshopId, parcelId: parcel.id, now: NOW }
    await packParcel({ ...who, input: { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 } })
    await handOverParcel({ ...who, input: { service: 'Parcel', tracking: 'CP123456785DE' } })
    const mail = await MailOutbox.findOne({ where: { subjectId: parcel.id }, rejectOnEmpty: true })
    expect(mail.props).toMatchObject({
      trackingUrl: 'https://post.example/follow?n=CP123456785DE',
      crossesCustoms: true,
    })
    expect((await parcel.reload()).claimByOn).toBe('2027-03-31')
  })
})

describe('service', () => {
  test('one of another zone, one that does not take the weight or the size are refused at their field', async () => {
    const { parcel } = await packed()
    const elsewhere = await PostageService.findOne({
      where: { zoneId: world.zones[2]!.id },
      rejectOnEmpty: true,
    })
    const errorsOf = async () => {
      const refused = await handOver(parcel.id, { service: 'Parcel' })
      return 'errors' in refused ? refused.errors.service : undefined
    }
    const refused = await handOver(parcel.id, { service: elsewhere.id })
    expect('errors' in refused && refused.errors.service).toContain('does not go to this country')
    await parcel.update({ grams: 40_000 })
    expect(await errorsOf()).toMatch(/at most 5\.000 kg.*weighs 40\.000 kg/)
    await parcel.update({ grams: 420, heightMm: 900 })
    expect(await errorsOf()).toContain('600 mm')
    await parcel.update({ heightMm: 60 })
    expect(await handOver(parcel.id)).toMatchObject({ ok: true })
  })
})

describe('what stops it', () => {
  test('an open parcel, a cancelled and a disputed order, a stranger', async () => {
    const open = await world.queued()
    expect(await handOver(open.parcel.id)).toEqual(refuse('not_packed'))
    const disputed = await packed()
    await disputed.order.update({ disputedAt: NOW })
    expect(await handOver(disputed.parcel.id)).toEqual(refuse('order_disputed'))
    expect((await disputed.parcel.reload()).state).toBe('packed')
    const cancelled = await packed()
    await cancelled.order.update({ state: 'cancelled', cancelledAt: NOW, cancelCause: 'run_called_off' })
    expect(await handOver(cancelled.parcel.id)).toEqual(refuse('order_cancelled'))
    const { parcel } = await packed()
    const stranger = await elsewhere()
    expect(await handOver(parcel.id, undefined, { actor: stranger.actor })).toEqual(refuse('forbidden'))
    expect(await handOver(parcel.id, undefined, stranger)).toEqual(refuse('not_found'))
  })

  test('undo is possible until the hand-over, and not after', async () => {
    const { parcel } = await packed()
    const undo = () =>
      reopenParcel({ actor: world.packer, workshopId: world.workshopId, parcelId: parcel.id, now: NOW })
    await handOver(parcel.id)
    expect(await undo()).toEqual(refuse('already_handed_over'))
  })
})

test('an order in two parcels is posted with the second; the mails say what is still to come', async () => {
  const { order, lines } = await world.paidOrder([{ offer: world.runOffers.kit, quantity: 2 }])
  const parcels = [await world.open(order)]
  // One of two goes ahead: the parcel is made smaller before it is packed, the rest enters the queue again.
  await parcels[0]!.update({ expectedGrams: 420 })
  await ParcelLine.update({ quantity: 1 }, { where: { parcelId: parcels[0]!.id } })
  parcels.push(await world.open(order))
  const who = { actor: world.packer, workshopId: world.workshopId, now: NOW }
  const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
  const [first, second] = parcels.map((parcel) => parcel!.id)
  expect(await packParcel({ ...who, parcelId: first!, input })).toMatchObject({ value: { order: 'paid' } })
  expect(await handOver(first!)).toMatchObject({ value: { order: 'paid', state: 'handed_over' } })
  expect((await bookedFor(order)).size).toBe(0)
  expect(await packParcel({ ...who, parcelId: second!, input })).toMatchObject({ value: { order: 'packed' } })
  expect(await handOver(second!)).toMatchObject({ value: { order: 'posted' } })
  const mails = await MailOutbox.findAll({ where: { subjectId: [first!, second!] }, order: ['queuedAt'] })
  const more = new Map(mails.map((mail) => [mail.subjectId, (mail.props as { more: boolean }).more]))
  expect(more).toEqual(
    new Map([
      [first, true],
      [second, false],
    ]),
  )
  expect((await bookedFor(order)).get('customer_deposits')).toBe(minor(order.totalMinor))
})
