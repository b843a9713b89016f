import { beforeEach, expect, test } from 'vitest'
import { DetailsInput, DestinationInput, PostageInput, TermsInput } from '@/lib/contracts/settings'
import { refuseFields } from '@/lib/contracts/problem'
import type { Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { publishTerms } from '@/lib/services/settings/publish-terms'
import { removePostageZone } from '@/lib/services/settings/remove-postage-zone'
import { saveDestination } from '@/lib/services/settings/save-destination'
import { savePostage } from '@/lib/services/settings/save-postage'
import { saveWorkshopDetails } from '@/lib/services/settings/save-workshop-details'
import { Destination, PostageService, PostageZone, TermsVersion, Workshop } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let owner: Actor
let workshopId: string

beforeEach(async () => {
  if (world) return
  world = await pier()
  owner = await actorOf(world.owner)
  workshopId = world.workshop.id
})

const DETAILS = {
  name: 'Hollow Pier Modular',
  legalName: 'Mara Quill',
  replyTo: 'hello@hollow-pier.example',
  postalAddress: {
    country: 'DE',
    name: 'Mara Quill',
    lines: ['Am Kai 3'],
    postcode: '20457',
    city: 'Hamburg',
  },
  about: 'Two people and a bench.',
  taxMode: 'home_rate',
  pricesIncludeTax: 'on',
  headStartHours: '24',
  limitPerPerson: '3',
  lapseAfterDays: '14',
}
const details = (over: object = {}) => DetailsInput.parse({ ...DETAILS, ...over })
const zone = (over: object = {}) =>
  PostageInput.parse({
    name: 'Oceania',
    countries: 'AU, New Zealand',
    services: [
      {
        name: 'Parcel',
        kind: 'parcel',
        maxGrams: '2000',
        maxMm: '600',
        bands: [{ upTo: '2000', priceMinor: 2400 }],
      },
    ],
    ...over,
  })

test('details are saved as they stand, and what is left out is taken away', async () => {
  const saved = await saveWorkshopDetails({
    actor: owner,
    workshopId,
    input: details({ phone: '+49 40 000' }),
    now: NOW,
  })
  expect(saved).toEqual(ok({ workshop: 'hollow-pier' }))
  await saveWorkshopDetails({ actor: owner, workshopId, input: details(), now: NOW })
  const row = await Workshop.findByPk(workshopId, { rejectOnEmpty: true })
  expect(row).toMatchObject({ phone: null, headStartHours: 24, limitPerPerson: 3, pricesIncludeTax: true })
  expect(row.postalAddress).toMatchObject({ city: 'Hamburg', lines: ['Am Kai 3'] })
})

test('an address the post could not use is refused at its field and changes nothing', async () => {
  const input = details({
    name: 'Another name',
    postalAddress: { country: 'DE', name: 'M', lines: ['Am Kai 3'], city: 'Hamburg' },
  })
  const answer = await saveWorkshopDetails({ actor: owner, workshopId, input, now: NOW })
  expect(answer).toMatchObject({
    ok: false,
    errors: { 'postalAddress.postcode': expect.stringContaining('Fill it in') },
  })
  expect((await Workshop.findByPk(workshopId, { rejectOnEmpty: true })).name).toBe('Hollow Pier Modular')
})

test('nobody but an owner of this very workshop changes its settings', async () => {
  const stranger = await actorOf(world.fenLamp.owner)
  const packer = await actorOf(world.packer)
  for (const actor of [stranger, packer, { kind: 'visitor' } as const]) {
    expect(await saveWorkshopDetails({ actor, workshopId, input: details(), now: NOW })).toEqual(
      refuse('forbidden'),
    )
    expect(await savePostage({ actor, workshopId, input: zone(), now: NOW })).toEqual(refuse('forbidden'))
    const input = TermsInput.parse({ body: 'x'.repeat(60) })
    expect(await publishTerms({ actor, workshopId, input, now: NOW })).toEqual(refuse('forbidden'))
  }
})

test('a new zone opens its countries for every offer; removed, it closes them again', async () => {
  // The small world posts everywhere by a zone of '*', so that zone goes first.
  const everywhere = world.zones.find(({ countries }) => countries.includes('*'))!
  expect((await removePostageZone({ actor: owner, workshopId, zone: everywhere.id })).ok).toBe(true)
  const offerId = world.offers.kit.id
  expect(await Destination.count({ where: { offerId, country: 'JP' } })).toBe(0)

  const added = await savePostage({ actor: owner, workshopId, input: zone(), now: NOW })
  if (!added.ok) throw new Error('not added')
  const opened = await Destination.findAll({ where: { offerId, country: ['AU', 'NZ'] } })
  expect(opened.map(({ state }) => state)).toEqual(['open', 'open'])

  expect(await removePostageZone({ actor: owner, workshopId, zone: added.value.zone })).toMatchObject({
    ok: true,
  })
  expect(await Destination.count({ where: { offerId, country: ['AU', 'NZ'] } })).toBe(0)
  expect(await removePostageZone({ actor: owner, workshopId, zone: added.value.zone })).toEqual(
    refuse('not_found'),
  )
})

test('what an owner closed stays closed when zones change', async () => {
  const input = DestinationInput.parse({
    module: 'rowlock',
    country: 'fr',
    state: 'paused',
    reason: 'The post is on strike.',
  })
  const added = await savePostage({
    actor: owner,
    workshopId,
    input: zone({ name: 'Isles', countries: 'IS' }),
    now: NOW,
  })
  expect(added.ok).toBe(true)
  expect(await saveDestination({ actor: owner, workshopId, input, now: NOW })).toEqual(ok({ changed: 3 }))
  await savePostage({ actor: owner, workshopId, input: zone({ name: 'Faroes', countries: 'FO' }), now: NOW })
  const rows = await Destination.findAll({ where: { offerId: world.offers.kit.id, country: 'FR' } })
  expect(rows.map(({ state, reason }) => [state, reason])).toEqual([['paused', 'The post is on strike.']])
  const unknown = DestinationInput.parse({ country: 'MN', state: 'closed', reason: 'Too far.' })
  expect(await saveDestination({ actor: owner, workshopId, input: unknown, now: NOW })).toMatchObject({
    errors: { country: expect.any(String) },
  })
})

test('changing a zone ends its services and puts new ones in their place', async () => {
  const home = world.zones.find(({ countries }) => countries.includes('DE'))!
  const before = await PostageService.findAll({ where: { zoneId: home.id } })
  const input = zone({ zone: home.id, name: 'Germany', countries: 'DE' })
  expect(await savePostage({ actor: owner, workshopId, input, now: NOW })).toEqual(ok({ zone: home.id }))
  const after = await PostageService.findAll({ where: { zoneId: home.id, endedAt: null } })
  expect(after.map(({ name, bands }) => [name, bands])).toEqual([
    ['Parcel', [{ upTo: 2000, priceMinor: 2400 }]],
  ])
  const old = await PostageService.findAll({ where: { id: before.map(({ id }) => id) } })
  expect(old.every(({ endedAt }) => endedAt !== null)).toBe(true)
})

test('a country stands in one zone, EU means what is left of it, and a foreign zone does not exist', async () => {
  const taken = await savePostage({ actor: owner, workshopId, input: zone({ countries: 'AT' }), now: NOW })
  expect(taken).toMatchObject({ errors: { countries: 'AT stands in the zone “Neighbours” already.' } })
  const union = await savePostage({
    actor: owner,
    workshopId,
    input: zone({ name: 'Union', countries: 'EU' }),
    now: NOW,
  })
  if (!union.ok) throw new Error('not added')
  const row = await PostageZone.findByPk(union.value.zone, { rejectOnEmpty: true })
  // 27 member states less DE, AT, FR and NL, which stand in other zones of the small world.
  expect(row.countries).toHaveLength(23)
  const again = await savePostage({ actor: owner, workshopId, input: zone({ countries: 'EU' }), now: NOW })
  expect(again).toMatchObject({ errors: { countries: expect.any(String) } })
  const foreign = world.fenLamp.zones[0]!
  expect(
    await savePostage({ actor: owner, workshopId, input: zone({ zone: foreign.id }), now: NOW }),
  ).toEqual(refuse('not_found'))
  expect(await removePostageZone({ actor: owner, workshopId, zone: foreign.id })).toEqual(refuse('not_found'))
})

test('postage the provider cannot write is refused at its field', async () => {
  await Workshop.update({ currency: 'KWD' }, { where: { id: world.fenLamp.workshop.id } })
  const actor = await actorOf(world.fenLamp.owner)
  const input = zone({
    services: [
      {
        name: 'P',
        kind: 'parcel',
        maxGrams: 2000,
        maxMm: 600,
        bands: [
          { upTo: 500, priceMinor: 5120 },
          { upTo: 900, priceMinor: 5125 },
        ],
      },
    ],
  })
  // Three-decimal amounts end in 0 at the provider (check-values.md).
  const answer = await savePostage({ actor, workshopId: world.fenLamp.workshop.id, input, now: NOW })
  expect(answer).toEqual(refuseFields({ 'services.0.bands.1.priceMinor': expect.any(String) as string }))
})

test('each version of the terms stays; the same text again makes none', async () => {
  const body = 'Deposits go back in full until the run is locked, and after it as the law says.'
  const first = await publishTerms({ actor: owner, workshopId, input: TermsInput.parse({ body }), now: NOW })
  expect(first).toEqual(ok({ number: 2 }))
  expect(
    await publishTerms({ actor: owner, workshopId, input: TermsInput.parse({ body }), now: NOW }),
  ).toEqual(first)
  const changed = TermsInput.parse({ body, lapseKeepsDeposit: 'on' })
  expect(await publishTerms({ actor: owner, workshopId, input: changed, now: NOW })).toEqual(
    ok({ number: 3 }),
  )
  const rows = await TermsVersion.findAll({ where: { workshopId }, order: [['number', 'ASC']] })
  expect(rows.map(({ lapseKeepsDeposit }) => lapseKeepsDeposit)).toEqual([false, false, true])
})
