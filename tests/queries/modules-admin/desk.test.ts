import { beforeAll, expect, test } from 'vitest'
import type { Actor } from '@/lib/core/policy/can'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { sequelize } from '@/lib/db/sequelize'
import { getStaffInvitation } from '@/lib/queries/members/get-staff-invitation'
import { listMembers } from '@/lib/queries/members/list-members'
import { getModuleDesk } from '@/lib/queries/modules-admin/get-module-desk'
import { getModulePreview } from '@/lib/queries/modules-admin/get-module-preview'
import { getPartsDesk } from '@/lib/queries/modules-admin/get-parts-desk'
import { getPlanDesk } from '@/lib/queries/modules-admin/get-plan-desk'
import { listModules } from '@/lib/queries/modules-admin/list-modules'
import { getModulePage } from '@/lib/queries/public/get-module-page'
import { getSettings } from '@/lib/queries/settings/get-settings'
import { getDesk } from '@/lib/queries/workshops/get-desk'
import { listWorkshops } from '@/lib/queries/host/list-workshops'
import {
  Destination,
  Lesson,
  Part,
  Quote,
  QuoteBreak,
  Revision,
  RevisionLine,
  StaffInvitation,
} from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let actor: Actor
let workshopId: string
beforeAll(async () => {
  world = await pier()
  actor = await actorOf(world.owner)
  workshopId = world.workshop.id
})

const everything = (who: Actor) => {
  const own = { actor: who, workshopId, now: NOW }
  const of = { ...own, module: 'rowlock' }
  return {
    desk: () => getDesk({ actor: who, slug: 'hollow-pier' }),
    settings: () => getSettings(own),
    people: () => listMembers(own),
    module: () => getModuleDesk(of),
    parts: () => getPartsDesk(of),
    plan: () => getPlanDesk(of),
    preview: () => getModulePreview(of),
  }
}

/** Statements sent while something is read. */
async function statements(read: () => Promise<unknown>): Promise<number> {
  let count = 0
  const send = sequelize.query.bind(sequelize)
  const counted = ((...given: Parameters<typeof send>) => {
    count += 1
    return send(...given)
  }) as typeof sequelize.query
  sequelize.query = counted
  try {
    await read()
  } finally {
    delete (sequelize as { query?: unknown }).query
  }
  return count
}

async function addMany(count: number) {
  const moduleId = world.module.id
  for (let i = 0; i < count; i += 1) {
    const letter = `B${String.fromCharCode(65 + (i % 26))}`
    if (i < 26) await Revision.create({ workshopId, moduleId, letter, createdAt: hoursAfter(NOW, i) })
    const part = await Part.create({ workshopId, code: `P-${i}`, value: '10k', createdAt: NOW })
    await RevisionLine.create({
      workshopId,
      revisionId: world.revision.id,
      partId: part.id,
      position: i,
      designators: `R${i + 1}`,
      perUnit: 1,
      placedBy: { kit: 'buyer' },
    })
    const quote = await Quote.create({
      workshopId,
      partId: part.id,
      supplier: 'West',
      currency: 'EUR',
      quotedOn: '2027-02-20',
    })
    await QuoteBreak.create({ workshopId, quoteId: quote.id, fromQuantity: 1, unitPrice: '1.25' })
    await Lesson.create({
      workshopId,
      moduleId,
      foundOnRevisionId: world.revision.id,
      symptom: `Hum ${i}.`,
      createdAt: NOW,
      createdByPersonId: world.owner.id,
    })
  }
}

test('strangers, packers and the host read nothing of a desk', async () => {
  const strangers = [
    await actorOf(world.fenLamp.owner),
    await actorOf(world.packer),
    await actorOf(world.hana, { host: true }),
    { kind: 'visitor' } as const,
  ]
  for (const who of strangers) {
    const answers = await Promise.all(Object.values(everything(who)).map((read) => read()))
    expect(answers).toEqual(answers.map(() => null))
    expect(await listModules({ actor: who, workshopId })).toEqual([])
  }
  expect(await getModuleDesk({ actor, workshopId, module: 'nothing' })).toBeNull()
  const theirs = { actor: await actorOf(world.fenLamp.owner), workshopId: world.fenLamp.workshop.id }
  expect(await getModuleDesk({ ...theirs, module: 'rowlock' })).toBeNull()
})

test('a module’s desk holds what there is: offers, revisions, interest', async () => {
  const desk = (await getModuleDesk({ actor, workshopId, module: 'rowlock' }))!
  expect(desk.offers.map(({ offer, priceMinor, destinations }) => [offer, priceMinor, destinations])).toEqual(
    [
      ['boards', 4500, 5],
      ['kit', 9500, 5],
      ['built', 16500, 5],
    ],
  )
  expect(desk.revisions).toMatchObject([
    { letter: 'A', state: 'proven', firstGood: { at: NOW.toISOString() } },
  ])
  // Ines and Tom are confirmed, with one unit each.
  const [row] = await listModules({ actor, workshopId })
  expect(row).toMatchObject({
    slug: 'rowlock',
    signUps: 2,
    units: 2,
    runs: 1,
    offers: ['boards', 'kit', 'built'],
  })
  await Destination.update(
    { state: 'paused', reason: 'Customs.' },
    { where: { offerId: world.offers.kit.id, country: 'US' } },
  )
  const settings = (await getSettings({ actor, workshopId, now: NOW }))!
  expect(settings.closedDestinations).toEqual([
    { module: 'Rowlock', offer: 'kit', country: 'US', state: 'paused', reason: 'Customs.' },
  ])
  expect(settings.homeRate).toMatchObject({ country: 'DE', basisPoints: 1900 })
  expect(settings.zones.map(({ name }) => name)).toEqual(['At home', 'Neighbours', 'Everywhere else'])
})

test('a draft can be previewed by those who work on it, and by nobody else', async () => {
  await world.module.update({ state: 'draft' })
  const page = await getModulePreview({ actor, workshopId, module: 'rowlock', now: NOW })
  expect(page).toMatchObject({ module: { name: 'Rowlock' }, maker: { legalName: 'Mara Quill' } })
  expect(page?.offers.map(({ offer }) => offer)).toEqual(['boards', 'kit', 'built'])
  const bench = await actorOf(world.bench)
  expect(await getModulePreview({ actor: bench, workshopId, module: 'rowlock', now: NOW })).toEqual(page)
  expect(await getModulePage({ workshop: 'hollow-pier', module: 'rowlock', now: NOW })).toBeNull()
  await world.module.update({ state: 'published' })
})

test('the number of statements does not grow with what there is', async () => {
  await addMany(5)
  const read = everything(actor)
  const few = await Promise.all(Object.values(read).map(async (one) => one()))
  expect(few.every((answer) => answer !== null)).toBe(true)
  const before: number[] = []
  for (const one of Object.values(read)) before.push(await statements(one))
  expect(Math.min(...before)).toBeGreaterThan(0)
  await Part.update({ code: sequelize.literal(`'old-' || code`) as never }, { where: { workshopId } })
  await RevisionLine.destroy({ where: { revisionId: world.revision.id } })
  await Revision.destroy({ where: { moduleId: world.module.id, state: 'draft' } })
  await addMany(50)
  const after: number[] = []
  for (const one of Object.values(read)) after.push(await statements(one))
  expect(after).toEqual(before)
  const parts = (await getPartsDesk({ actor, workshopId, module: 'rowlock', revision: 'A' }))!
  expect(parts.lines).toHaveLength(50)
  expect(parts.revisions.slice(0, 2)).toEqual(['BZ', 'BY'])
})

test('an invitation is shown while its link works, and the host sees traders and totals only', async () => {
  const token = makeToken()
  const tokenHash = hashToken(token)
  const row = await StaffInvitation.create({
    workshopId,
    emailNormal: 'new@example.org',
    role: 'packer',
    tokenHash,
    createdAt: NOW,
    createdByPersonId: world.owner.id,
    expiresAt: hoursAfter(NOW, 1),
  })
  const shown = {
    workshop: 'Hollow Pier Modular',
    slug: 'hollow-pier',
    role: 'packer',
    email: 'new@example.org',
  }
  expect(await getStaffInvitation({ tokenHash, now: NOW })).toEqual(shown)
  expect(await getStaffInvitation({ tokenHash, now: hoursAfter(NOW, 1) })).toBeNull()
  expect((await listMembers({ actor, workshopId, now: NOW }))?.invitations).toMatchObject([
    { email: 'new@example.org' },
  ])
  await row.update({ withdrawnAt: NOW })
  expect(await getStaffInvitation({ tokenHash, now: NOW })).toBeNull()

  expect(await listWorkshops({ actor })).toEqual([])
  const seen = await listWorkshops({ actor: await actorOf(world.hana, { host: true }) })
  const pierRow = seen.find(({ slug }) => slug === 'hollow-pier')
  expect(pierRow).toMatchObject({ legalName: 'Mara Quill', runs: 1, units: 1, chargesEnabled: true })
  expect(JSON.stringify(seen)).not.toContain('ines@example.org')
})
