import { beforeAll, expect, test } from 'vitest'
import { getParcelPapers } from '@/lib/queries/packing/get-parcel-papers'
import { getParcelPage } from '@/lib/queries/packing/get-parcel-page'
import { listPackedParcels } from '@/lib/queries/packing/list-packed-parcels'
import { listBags } from '@/lib/queries/packing/list-bags'
import { Offer, Part, RevisionLine } from '@/models'
import { elsewhere, packingWorld } from '@/tests/services/packing/packing-world'
import { NOW } from '@/tests/support/worlds/base'
import { makeAddress } from '@/tests/support/worlds/order'
import { makePerson } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeAll(async () => {
  world = await packingWorld()
  await Offer.update(
    {
      customsDescription: 'Kit for an audio signal mixer module',
      customsCode: '8543709000',
      customsOrigin: 'DE',
      netWeightG: 380,
    },
    { where: { moduleId: world.module.id } },
  )
  await world.workshop.update({
    postalAddress: {
      country: 'DE',
      name: 'Mara Quill',
      lines: ['Am Kai 3'],
      city: 'Hamburg',
      postcode: '20457',
    },
    phone: '+49 40 5550 010',
  })
})

const papersOf = async (parcelIds: string[]) => {
  const papers = await getParcelPapers({
    actor: world.packer,
    workshopId: world.workshopId,
    parcelIds,
    now: NOW,
  })
  if (!papers) throw new Error('no papers')
  return papers.parcels
}

test('abroad: both scripts, the full form, one line per kit at what was paid for it, nothing missing', async () => {
  const person = await makePerson({ name: '森 花子' })
  const address = await makeAddress(world.workshopId, person, {
    country: 'JP',
    name: '森 花子',
    lines: ['本町1-2'],
    city: '港区',
    region: '東京都',
    postcode: '105-0001',
    phone: '+81 3 5550 0101',
    latin: { name: 'Hanako Mori', lines: ['1-2 Honmachi'], city: 'Minato-ku', region: 'Tokyo' },
  })
  const { parcel, lines } = await world.queued([{ offer: world.runOffers.kit, quantity: 2 }], {
    country: 'JP',
    person,
    address,
  })
  const [paper] = await papersOf([parcel.id])
  expect(paper?.to.join('\n')).toContain('Hanako Mori')
  expect(paper?.toOwnScript?.join('\n')).toContain('森 花子')
  expect(paper).toMatchObject({ country: 'JP', phone: '+81 3 5550 0101', grams: 840 })
  const each = lines[0]!.unitPriceMinor + lines[0]!.unitSurchargeMinor
  expect(paper?.customs).toMatchObject({
    form: 'CN23',
    valueMinor: 2 * each,
    lines: [{ quantity: 2, value: 2 * each, grams: 760, code: '8543709000', origin: 'DE' }],
  })
  expect(paper?.customs.problems.filter(({ severity }) => severity === 'error')).toEqual([])
})

test('inside the customs area no form, abroad without a code an error at its field', async () => {
  const home = await world.queued()
  const there = await world.queued([{ offer: world.runOffers.boards, quantity: 1 }], { country: 'CH' })
  await Offer.update({ customsCode: '' }, { where: { id: world.runOffers.boards.offerId } })
  const [inside, outside] = await papersOf([home.parcel.id, there.parcel.id])
  expect(inside?.customs).toMatchObject({ form: 'none', problems: [] })
  expect(outside?.customs.problems).toContainEqual({
    field: 'lines.0.code',
    problem: 'missing',
    severity: 'error',
  })
})

test('a free piece is declared at what it sells for, never at nothing', async () => {
  const { parcel, lines } = await world.queued(undefined, { country: 'NO' })
  const nothing = {
    unitPriceMinor: 0,
    unitSurchargeMinor: 0,
    unitDepositMinor: 0,
    totalMinor: 0,
    taxMinor: 0,
  }
  await lines[0]!.update(nothing as never)
  const [paper] = await papersOf([parcel.id])
  expect(paper?.customs.valueMinor).toBe(world.runOffers.kit.priceMinor)
  expect(paper?.customs.valueMinor).toBeGreaterThan(0)
})

test('a bag holds what the buyer places, once per kit', async () => {
  const { parcel } = await world.queued([{ offer: world.runOffers.kit, quantity: 3 }])
  const part = await Part.create({
    ...{ workshopId: world.workshopId, code: 'POT-1', description: 'Potentiometer', createdAt: NOW },
    storagePlace: 'Drawer 3',
  })
  const smt = await Part.create({ workshopId: world.workshopId, code: 'SMT-1', createdAt: NOW })
  const line = { workshopId: world.workshopId, revisionId: world.run.revisionId }
  await RevisionLine.create({
    ...{ ...line, partId: part.id, position: 0, perUnit: 4, designators: 'RV1-RV4' },
    placedBy: { kit: 'buyer', built: 'maker' },
  })
  await RevisionLine.create({
    ...{ ...line, partId: smt.id, position: 1, perUnit: 9 },
    placedBy: { kit: 'assembler' },
  })
  const asked = { workshopId: world.workshopId, parcelIds: [parcel.id], offerName: (kind: string) => kind }
  expect(await listBags({ actor: world.packer, ...asked })).toMatchObject([
    { bags: 3, parts: [{ quantity: 4, name: 'Potentiometer', place: 'Drawer 3', designators: 'RV1-RV4' }] },
  ])
  expect(await listBags({ actor: (await elsewhere()).actor, ...asked })).toEqual([])
})

test('another workshop’s parcels do not exist, and a stranger prints nothing', async () => {
  const { parcel } = await world.queued()
  const stranger = await elsewhere()
  const theirs = { actor: stranger.actor, workshopId: stranger.workshopId, parcelIds: [parcel.id], now: NOW }
  expect((await getParcelPapers(theirs))?.parcels).toEqual([])
  expect(await getParcelPapers({ ...theirs, workshopId: world.workshopId })).toBeNull()
})

test('thirty days after it arrived neither screen nor paper says where a parcel went', async () => {
  const { parcel } = await world.queued()
  const by = {
    packedAt: NOW,
    packedByPersonId: world.lene.id,
    handedOverAt: NOW,
    handedOverByPersonId: world.lene.id,
  }
  await parcel.update({ ...by, state: 'delivered', grams: 420, serviceName: 'Letter', deliveredAt: NOW })
  const asked = { actor: world.packer, workshopId: world.workshopId }
  const at = async (day: number) => {
    const now = new Date(NOW.getTime() + day * 86_400_000)
    const page = await getParcelPage({ ...asked, parcelId: parcel.id, now })
    const papers = await getParcelPapers({ ...asked, parcelIds: [parcel.id], now })
    const { items } = await listPackedParcels({ ...asked, show: 'handed_over', now })
    const named = items.find((item) => item.parcel === parcel.id)?.name
    return [page!.to.length > 0, papers!.parcels.length, named !== '']
  }
  expect(await at(30)).toEqual([true, 1, true])
  expect(await at(31)).toEqual([false, 0, false])
})
