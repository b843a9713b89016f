import { beforeEach, describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { listBatches } from '@/lib/queries/packing/list-batches'
import { listPackGroups } from '@/lib/queries/packing/list-pack-groups'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { holdParcel } from '@/lib/services/packing/hold-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { returnBatch } from '@/lib/services/packing/return-batch'
import { takeBatch } from '@/lib/services/packing/take-batch'
import { PackBatch, Parcel } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf, makePerson, makeUser } from '@/tests/support/worlds/person'
import { elsewhere, packingWorld } from './packing-world'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeEach(async () => {
  world = await packingWorld()
})

const packerOf = async (name: string) => {
  const person = await makePerson({ name })
  await makeUser({ person, workshopId: world.workshopId, role: 'packer' })
  return actorOf(person)
}
const take = (input: Partial<Parameters<typeof takeBatch>[0]['input']> = {}, actor = world.packer) =>
  takeBatch({ actor, workshopId: world.workshopId, input: { most: 20, ...input } as never, now: NOW })
const taken = async (...given: Parameters<typeof take>) => {
  const answer = await take(...given)
  if (!answer.ok) throw new Error(answer.reason)
  return answer.value.batch
}
const parcelsIn = (batchId: string) => Parcel.findAll({ where: { batchId } })
const packOf = (made: Awaited<ReturnType<typeof world.queued>>, actor = world.packer) =>
  packParcel({
    actor,
    workshopId: world.workshopId,
    parcelId: made.parcel.id,
    input: {
      lines: made.lines.map(({ id, quantity }) => ({ line: id, quantity })),
      grams: made.parcel.expectedGrams!,
    },
    now: NOW,
  })

test('the oldest promises are taken first, no more than asked, and leave the queue of everybody else', async () => {
  const made = [await world.queued(), await world.queued(), await world.queued()]
  await made[2]!.lines[0]!.update({ postedByOn: '2027-01-01' })
  const batch = await taken({ most: 2 })
  expect((await parcelsIn(batch)).map(({ id }) => id).sort()).toEqual(
    [made[2]!.parcel.id, made[0]!.parcel.id].sort(),
  )
  const other = await packerOf('Ole Brandt')
  const seen = await listPackQueue({ actor: other, workshopId: world.workshopId })
  expect(seen.items.map(({ parcel }) => parcel)).toEqual([made[1]!.parcel.id])
  const own = await listPackQueue({ actor: world.packer, workshopId: world.workshopId })
  expect(own.items).toHaveLength(3)
})

test('two packers who take at the same moment never get the same parcel, and none is forgotten', async () => {
  for (let i = 0; i < 9; i += 1) await world.queued()
  const ole = await packerOf('Ole Brandt')
  const [first, second] = await Promise.all([taken({ most: 5 }), taken({ most: 5 }, ole)])
  const [a, b] = [await parcelsIn(first), await parcelsIn(second)]
  expect([a.length, b.length].sort()).toEqual([4, 5])
  expect(new Set([...a, ...b].map(({ id }) => id)).size).toBe(9)
  expect(await take()).toEqual(refuse('nothing_to_pack'))
})

test('another packer’s parcel is refused by name; given back, anybody packs it', async () => {
  const made = await world.queued()
  const ole = await packerOf('Ole Brandt')
  const batch = await taken({}, ole)
  expect(await packOf(made)).toEqual(refuse('in_other_batch'))
  const back = { actor: ole, workshopId: world.workshopId, batchId: batch, now: NOW }
  expect(await returnBatch(back)).toEqual(ok({ returned: 1 }))
  expect(await returnBatch(back)).toEqual(refuse('batch_done'))
  expect(await packOf(made)).toMatchObject({ ok: true })
})

test('a batch counts what is packed and posted, and closes with its last parcel', async () => {
  const made = [await world.queued(), await world.queued()]
  const batch = await taken()
  const rowOf = async () => (await listBatches({ actor: world.packer, workshopId: world.workshopId }))[0]
  expect(await rowOf()).toMatchObject({ batch, packer: 'Lene Quast', isMine: true, total: 2, packed: 0 })
  for (const each of made) expect(await packOf(each)).toMatchObject({ ok: true })
  expect(await rowOf()).toMatchObject({ total: 2, packed: 2, posted: 0, closedAt: null })
  for (const [i, { parcel }] of made.entries()) {
    await handOverParcel({
      ...{ actor: world.packer, workshopId: world.workshopId, parcelId: parcel.id, now: NOW },
      input: { service: 'Letter' },
    })
    expect((await PackBatch.findByPk(batch))?.closedAt).toEqual(i === 0 ? null : NOW)
  }
  expect(await rowOf()).toMatchObject({ total: 2, packed: 0, posted: 2, closedAt: NOW.toISOString() })
})

test('orders of the same contents are counted together and taken by it', async () => {
  const { kit, built } = world.runOffers
  for (let i = 0; i < 3; i += 1) await world.queued([{ offer: kit, quantity: 1 }])
  await world.queued([{ offer: kit, quantity: 2 }])
  await world.queued([
    { offer: built, quantity: 1 },
    { offer: kit, quantity: 1 },
  ])
  await world.queued([
    { offer: kit, quantity: 1 },
    { offer: built, quantity: 1 },
  ])
  const asked = { actor: world.packer, workshopId: world.workshopId }
  const groups = await listPackGroups(asked)
  expect(groups.map(({ count }) => count)).toEqual([3, 2, 1])
  expect(groups[0]?.lines).toMatchObject([{ offer: 'kit', quantity: 1 }])
  const batch = await taken({ group: groups[0]!.group })
  expect(await parcelsIn(batch)).toHaveLength(3)
  expect((await listPackGroups(asked)).map(({ count }) => count)).toEqual([2, 1])
})

test('the queue is narrowed by country, offer, choice and quoted service', async () => {
  const { kit, built } = world.runOffers
  const us = await world.queued([{ offer: built, quantity: 1 }], { country: 'US' })
  const sand = await world.queued([{ offer: kit, quantity: 1 }])
  const answer = { choiceId: 'a', answerId: 'b', surchargeMinor: 0 as never, isDefault: false }
  await sand.lines[0]!.update({ choices: [{ ...answer, question: 'Front panel finish', label: 'sand' }] })
  const quote = { zoneId: 'z', serviceId: 's', grams: 420, priceMinor: 500 as never }
  await us.order.update({ postageQuote: { ...quote, serviceName: 'Slow boat' } })
  const numbers = async (query: object) =>
    (await listPackQueue({ actor: world.packer, workshopId: world.workshopId, query })).items.map(
      ({ parcel }) => parcel,
    )
  expect(await numbers({ country: 'US' })).toEqual([us.parcel.id])
  expect(await numbers({ offer: 'kit' })).toEqual([sand.parcel.id])
  expect(await numbers({ choice: 'Front panel finish: sand' })).toEqual([sand.parcel.id])
  expect(await numbers({ choice: 'Front panel finish: slate' })).toEqual([])
  expect(await numbers({ service: 'Slow boat' })).toEqual([us.parcel.id])
})

describe('who may', () => {
  test('somebody who does not pack here gets no batch, and takes none', async () => {
    await world.queued()
    const stranger = await elsewhere()
    expect(await take({}, stranger.actor)).toEqual(refuse('forbidden'))
    expect(await take({ packer: stranger.owner.id })).toMatchObject({
      reason: 'invalid',
      errors: { packer: 'Choose somebody who packs in this workshop.' },
    })
    const owner = await actorOf(world.owner)
    const batch = await taken({ packer: world.lene.id }, owner)
    expect((await PackBatch.findByPk(batch))?.packerPersonId).toBe(world.lene.id)
  })
})

test('on hold it leaves the queue and its batch with a reason; let go, it is back', async () => {
  const made = await world.queued()
  const batch = await taken()
  const hold = (reason: string | null) =>
    holdParcel({
      ...{ actor: world.packer, workshopId: world.workshopId, parcelId: made.parcel.id, now: NOW },
      reason,
    })
  expect(await hold('The pot is missing')).toMatchObject({ ok: true })
  expect(await parcelsIn(batch)).toEqual([])
  expect(await packOf(made)).toEqual(refuse('on_hold'))
  const asked = { actor: world.packer, workshopId: world.workshopId }
  expect((await listPackQueue(asked)).items).toEqual([])
  expect(await hold(null)).toMatchObject({ ok: true })
  expect((await listPackQueue(asked)).items).toHaveLength(1)
})
