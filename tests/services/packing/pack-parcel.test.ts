import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, test } from 'vitest'
import type { PackInput } from '@/lib/contracts/packing'
import { ok, refuse } from '@/lib/core/result'
import { notePrinted } from '@/lib/services/packing/note-printed'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { reopenParcel } from '@/lib/services/packing/reopen-parcel'
import { AuditEntry, Destination, type Order, ParcelLine } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makeUnit } from '@/tests/support/worlds/parcel'
import { elsewhere, packingWorld } from './packing-world'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeAll(async () => {
  world = await packingWorld()
})

const pack = (parcelId: string, input: PackInput, over: Partial<Parameters<typeof packParcel>[0]> = {}) =>
  packParcel({ actor: world.packer, workshopId: world.workshopId, parcelId, input, now: NOW, ...over })
const reopen = (parcelId: string) =>
  reopenParcel({ actor: world.packer, workshopId: world.workshopId, parcelId, now: NOW })

const twoLines = () =>
  world.queued([
    { offer: world.runOffers.kit, quantity: 2 },
    { offer: world.runOffers.boards, quantity: 1 },
  ])

test('packed with every line once: the parcel is weighed and the order packed, with a trail', async () => {
  const { order, lines, parcel } = await twoLines()
  const input = {
    lines: lines.map(({ id, quantity }) => ({ line: id, quantity })),
    grams: 1000,
    lengthMm: 300,
  }
  expect(await pack(parcel.id, input)).toEqual(ok({ parcel: parcel.id, state: 'packed', order: 'packed' }))
  expect(await parcel.reload()).toMatchObject({
    grams: 1000,
    lengthMm: 300,
    widthMm: null,
    expectedGrams: 990,
    weightConfirmedAt: null,
    packedAt: NOW,
    packedByPersonId: world.lene.id,
  })
  expect(await order.reload()).toMatchObject({ state: 'packed', packedAt: NOW })
  expect((await ParcelLine.findAll({ where: { parcelId: parcel.id } })).map((line) => line.tickedAt)).toEqual(
    [NOW, NOW],
  )
  const trail = await AuditEntry.findAll({ where: { subjectId: [parcel.id, order.id], event: 'pack' } })
  expect(trail.map((entry) => [entry.subjectType, entry.byPersonId]).sort()).toEqual([
    ['order', world.lene.id],
    ['parcel', world.lene.id],
  ])
  expect(await pack(parcel.id, input)).toEqual(refuse('already_packed'))
})

describe('lines', () => {
  test('a line of another order, one twice, too few and one left out are refused at their fields, without a trace', async () => {
    const { order, lines, parcel } = await twoLines()
    const [kit, boards] = lines.map(({ id, quantity }) => ({ line: id, quantity }))
    const foreign = await world.queued()
    const errorsOf = async (given: PackInput['lines']) => {
      const refused = await pack(parcel.id, { lines: given, grams: 990 })
      expect(refused).toMatchObject({ ok: false, reason: 'invalid' })
      return Object.keys('errors' in refused ? refused.errors : {})
    }
    expect(await errorsOf([kit!, boards!, { line: foreign.lines[0]!.id, quantity: 1 }])).toEqual([
      'lines.2.line',
    ])
    expect(await errorsOf([kit!, boards!, { line: randomUUID(), quantity: 1 }])).toEqual(['lines.2.line'])
    expect(await errorsOf([kit!, kit!, boards!])).toEqual(['lines.1.line'])
    expect(await errorsOf([{ ...kit!, quantity: 1 }, boards!])).toEqual(['lines.0.quantity'])
    expect(await errorsOf([{ ...kit!, quantity: 3 }, boards!])).toEqual(['lines.0.quantity'])
    expect(await errorsOf([kit!])).toEqual(['lines'])
    expect(await parcel.reload()).toMatchObject({ state: 'open', grams: null })
    expect((await order.reload()).state).toBe('paid')
  })
})

describe('weight', () => {
  test('a surprise asks, and nothing happens until somebody says the parcel is right', async () => {
    const { order, lines, parcel } = await world.queued([{ offer: world.runOffers.kit, quantity: 2 }])
    const input = { lines: [{ line: lines[0]!.id, quantity: 2 }], grams: 420 } // one of two is missing
    expect(await pack(parcel.id, input)).toEqual(refuse('weight_surprise'))
    expect((await parcel.reload()).state).toBe('open')
    expect(await pack(parcel.id, { ...input, weightConfirmed: true })).toMatchObject({ ok: true })
    expect(await parcel.reload()).toMatchObject({ state: 'packed', grams: 420, weightConfirmedAt: NOW })
    expect((await order.reload()).state).toBe('packed')
  })

  test('confirming a weight that surprises nobody is not kept as a surprise', async () => {
    const { lines, parcel } = await world.queued()
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 430, weightConfirmed: true }
    expect(await pack(parcel.id, input)).toMatchObject({ ok: true })
    expect((await parcel.reload()).weightConfirmedAt).toBeNull()
  })

  test('an offer never weighed cannot surprise', async () => {
    const house = await packingWorld()
    await house.offers.kit.update({ packedWeightG: null })
    const { lines, parcel } = await house.queued()
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 9000 }
    const cmd = { actor: house.packer, workshopId: house.workshopId, parcelId: parcel.id, input, now: NOW }
    expect(await packParcel(cmd)).toMatchObject({ ok: true })
  })
})

describe('what stops a parcel', () => {
  test.each<[string, Partial<Order>]>([
    ['order_cancelled', { state: 'cancelled', cancelledAt: NOW, cancelCause: 'withdrawal' }],
    ['order_disputed', { disputedAt: NOW }],
    ['order_not_paid', { state: 'balance_due' }],
  ])('%s', async (reason, change) => {
    const { order, lines, parcel } = await world.queued()
    await order.update(change)
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
    expect(await pack(parcel.id, input)).toEqual(refuse(reason))
    expect((await parcel.reload()).state).toBe('open')
  })

  test('a paused destination and a hold', async () => {
    const house = await packingWorld()
    const { lines, parcel } = await house.queued(undefined, { country: 'US' })
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
    const cmd = { actor: house.packer, workshopId: house.workshopId, parcelId: parcel.id, input, now: NOW }
    await parcel.update({ onHoldReason: 'The owner asks about the colour.' })
    expect(await packParcel(cmd)).toEqual(refuse('on_hold'))
    await Destination.update(
      { state: 'paused', reason: 'No parcels at present.' },
      { where: { workshopId: house.workshopId, country: 'US' } },
    )
    expect(await packParcel(cmd)).toEqual(refuse('destination_paused'))
  })

  test('a label that became wrong, until the papers are printed again', async () => {
    const { lines, parcel } = await world.queued()
    await parcel.update({ printedAt: NOW, labelVoidAt: NOW })
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
    expect(await pack(parcel.id, input)).toEqual(refuse('label_void'))
    const asked = { workshopId: world.workshopId, parcelIds: [parcel.id], now: NOW }
    expect(await notePrinted({ actor: { kind: 'visitor' }, ...asked })).toEqual(refuse('forbidden'))
    const { actor: stranger } = await elsewhere()
    expect(await notePrinted({ actor: stranger, ...asked })).toEqual(refuse('forbidden'))
    expect(await pack(parcel.id, input)).toEqual(refuse('label_void'))
    expect(await notePrinted({ actor: world.packer, ...asked })).toEqual(ok({ printed: 1 }))
    expect(await parcel.reload()).toMatchObject({ printedAt: NOW, labelVoidAt: null })
    expect(await pack(parcel.id, input)).toMatchObject({ ok: true })
  })

  test('a foreign workshop, its packer and the bench find nothing', async () => {
    const { lines, parcel } = await world.queued()
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
    const stranger = await elsewhere()
    expect(await pack(parcel.id, input, { actor: stranger.actor })).toEqual(refuse('forbidden'))
    expect(await pack(parcel.id, input, stranger)).toEqual(refuse('not_found'))
    expect(await pack(randomUUID(), input)).toEqual(refuse('not_found'))
    expect(await pack(parcel.id, input, { actor: { kind: 'visitor' } })).toEqual(refuse('forbidden'))
  })

  test('two packers at once: one packs, the other is told', async () => {
    const { lines, parcel } = await world.queued()
    const input = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
    const both = await Promise.all([pack(parcel.id, input), pack(parcel.id, input)])
    expect(both.filter((each) => each.ok)).toHaveLength(1)
    expect(both.find((each) => !each.ok)).toEqual(refuse('already_packed'))
    expect(await AuditEntry.count({ where: { subjectId: parcel.id, event: 'pack' } })).toBe(1)
  })
})

describe('serial numbers', () => {
  test('each unit is allocated to its line; unpacking frees it', async () => {
    const { order, lines, parcel } = await world.queued([{ offer: world.runOffers.built, quantity: 2 }])
    const units = [await makeUnit(world.run), await makeUnit(world.run)]
    const line = lines[0]!.id
    const serials = units.map((unit) => unit.serial.toLowerCase())
    expect(await pack(parcel.id, { lines: [{ line, quantity: 2, serials }], grams: 920 })).toMatchObject({
      ok: true,
    })
    const rows = await ParcelLine.findAll({ where: { parcelId: parcel.id } })
    expect(rows.map((row) => [row.quantity, row.unitId]).sort()).toEqual(
      units.map((unit) => [1, unit.id]).sort(),
    )
    for (const unit of units)
      expect(await unit.reload()).toMatchObject({ state: 'allocated', orderLineId: line })

    expect(await reopen(parcel.id)).toEqual(ok({ parcel: parcel.id, state: 'open', order: 'paid' }))
    for (const unit of units)
      expect(await unit.reload()).toMatchObject({ state: 'passed', orderLineId: null })
    const [row, ...more] = await ParcelLine.findAll({ where: { parcelId: parcel.id } })
    expect(more).toEqual([])
    expect(row).toMatchObject({ orderLineId: line, quantity: 2, unitId: null, tickedAt: null })
    expect(await order.reload()).toMatchObject({ state: 'paid', packedAt: null })
    expect(await reopen(parcel.id)).toEqual(refuse('not_packed'))
  })

  test('an unknown number, one of another form, of another order, one twice, one not passed, and a wrong count', async () => {
    const house = await packingWorld()
    const { lines, parcel } = await house.queued([{ offer: house.runOffers.built, quantity: 2 }])
    const other = await house.queued([{ offer: house.runOffers.built, quantity: 1 }])
    const good = await makeUnit(house.run)
    const kit = await makeUnit(house.run, { offerKind: 'kit' })
    const rework = await makeUnit(house.run, { state: 'rework' })
    const taken = await makeUnit(house.run, { state: 'allocated', orderLineId: other.lines[0]!.id })
    const first = await makeUnit(house.run, { runId: null })
    const attempt = async (serials: string[]) => {
      const input = { lines: [{ line: lines[0]!.id, quantity: 2, serials }], grams: 920 }
      const cmd = { actor: house.packer, workshopId: house.workshopId, parcelId: parcel.id, input, now: NOW }
      const refused = await packParcel(cmd)
      return 'errors' in refused ? refused.errors['lines.0.serials'] : refused
    }
    expect(await attempt([good.serial, 'X-9'])).toContain('no unit X-9')
    expect(await attempt([good.serial, kit.serial])).toContain('no unit')
    expect(await attempt([good.serial, first.serial])).toContain('no unit')
    expect(await attempt([good.serial, rework.serial])).toContain('has not passed')
    expect(await attempt([good.serial, taken.serial])).toContain('another order')
    expect(await attempt([good.serial, good.serial])).toContain('twice')
    expect(await attempt([good.serial])).toContain('2 serial numbers')
    expect(await good.reload()).toMatchObject({ state: 'passed', orderLineId: null })
  })
})
