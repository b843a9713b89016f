import { createElement } from 'react'
import { beforeAll, expect, test } from 'vitest'
import { FactsForm } from '@/app/(admin)/admin/[workshop]/modules/[module]/_parts/facts-form'
import { FirstUnitForm } from '@/app/(admin)/admin/[workshop]/modules/[module]/_parts/first-unit-form'
import { OfferForm } from '@/app/(admin)/admin/[workshop]/modules/[module]/_parts/offer-form'
import { offerForm } from '@/app/(admin)/admin/[workshop]/modules/[module]/_parts/offer-values'
import { ImportForm } from '@/app/(admin)/admin/[workshop]/modules/[module]/parts/import/_parts/import-form'
import { PlanForm } from '@/components/plan/plan-form'
import { RevisionForm } from '@/app/(admin)/admin/[workshop]/modules/[module]/_parts/revision-form'
import { DetailsForm } from '@/app/(admin)/admin/[workshop]/settings/_parts/details-form'
import { ZoneForm } from '@/app/(admin)/admin/[workshop]/settings/postage/_parts/zone-form'
import { StartForm } from '@/app/(public)/start/_parts/start-form'
import { POST as postFacts } from '@/app/api/admin/[workshop]/modules/[module]/route'
import { POST as postFirstUnit } from '@/app/api/admin/[workshop]/modules/[module]/first-unit/route'
import { POST as postOffer } from '@/app/api/admin/[workshop]/modules/[module]/offers/route'
import { POST as postConfirm } from '@/app/api/admin/[workshop]/modules/[module]/parts/import/confirm/route'
import { POST as postImport } from '@/app/api/admin/[workshop]/modules/[module]/parts/import/route'
import { POST as postPlan } from '@/app/api/admin/[workshop]/modules/[module]/plan/route'
import { POST as postPublish } from '@/app/api/admin/[workshop]/modules/[module]/publish/route'
import { POST as postRevision } from '@/app/api/admin/[workshop]/modules/[module]/revisions/route'
import { POST as postModule } from '@/app/api/admin/[workshop]/modules/route'
import { POST as postDetails } from '@/app/api/admin/[workshop]/settings/details/route'
import { POST as postPostage } from '@/app/api/admin/[workshop]/settings/postage/route'
import { POST as postTerms } from '@/app/api/admin/[workshop]/settings/terms/route'
import { POST as postWorkshop } from '@/app/api/workshops/route'
import { keptForm } from '@/components/forms/kept-form'
import type { PlanDesk } from '@/lib/contracts/module-desk'
import { formValues } from '@/lib/contracts/form-values'
import { settingsWords } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getModuleDesk } from '@/lib/queries/modules-admin/get-module-desk'
import { getPartsDesk } from '@/lib/queries/modules-admin/get-parts-desk'
import { getPlanDesk } from '@/lib/queries/modules-admin/get-plan-desk'
import { getSettings } from '@/lib/queries/settings/get-settings'
import { getDesk } from '@/lib/queries/workshops/get-desk'
import { Offer, type Person, Plan, PostageZone, Workshop } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { send, typedForm } from './typed-form'

// From a person with nothing to a module ready for a run, through the forms as the pages show them, without script.
const slug = 'wrack-line'
const at = { workshop: slug, module: 'kedge' }
const own = { slug, module: 'kedge' }
const currency = 'EUR'
let mara: Person
let workshopId: string
const actor = () => actorOf(mara)
const desk = async () => (await getModuleDesk({ actor: await actor(), workshopId, module: 'kedge' }))!

beforeAll(async () => {
  await setBusinessTime(NOW)
  mara = (await makeUser()).person
})

test('a mistake loses nothing typed; mended, the workshop is there', async () => {
  const typed = {
    name: 'Wrack Line Works',
    slug: 'sandbox',
    legalName: 'Mara Quill',
    country: 'DE',
    currency,
    timeZone: 'Europe/Berlin',
  }
  const wrong = await send(
    postWorkshop,
    mara,
    typedForm(createElement(StartForm, { email: 'mara@example.org' }), typed),
  )
  expect(wrong).toMatchObject({ status: 303, to: expect.stringMatching(/^\/start\?draft=/) })
  const kept = keptForm(await getFormDraft(wrong.to.split('draft=')[1], 'workshop'))
  expect(kept?.errors).toEqual({ slug: expect.stringContaining('kept for the site') })
  const again = typedForm(createElement(StartForm, { email: '', ...(kept && { form: kept }) }), { slug })
  expect(await send(postWorkshop, mara, again)).toEqual({ status: 303, to: `/admin/${slug}` })
  workshopId = (await Workshop.findOne({ where: { slug }, rejectOnEmpty: true })).id
})

test('details, terms and postage', async () => {
  const settings = (await getSettings({ actor: await actor(), workshopId, now: NOW }))!
  const page = createElement(DetailsForm, {
    slug,
    form: { values: formValues(settings.details) },
    homeRate: settings.homeRate,
  })
  const address = {
    'postalAddress.name': 'Mara Quill',
    'postalAddress.lines.0': 'Am Kai 3',
    'postalAddress.postcode': '20457',
    'postalAddress.city': 'Hamburg',
    'postalAddress.country': 'DE',
  }
  const fields = { ...typedForm(page, address), taxMode: 'home_rate' }
  expect(await send(postDetails, mara, fields, { workshop: slug })).toEqual({
    status: 303,
    to: `/admin/${slug}/settings?saved=1`,
  })
  const body = settingsWords.termsBeginning('Wrack Line Works')
  expect((await send(postTerms, mara, { body }, { workshop: slug })).to).toBe(
    `/admin/${slug}/settings/terms?saved=1`,
  )

  const empty = createElement(ZoneForm, { slug, form: {}, currency })
  const zone = {
    name: 'Union',
    countries: 'DE, EU',
    'services.0.name': 'Parcel',
    'services.0.maxGrams': '5000',
    'services.0.maxMm': '600',
    'services.0.bands.0.upTo': '1000',
    'services.0.bands.0.priceMinor': '4,90',
  }
  const half = await send(
    postPostage,
    mara,
    typedForm(empty, { ...zone, 'services.0.bands.0.priceMinor': 'cheap' }),
    { workshop: slug },
  )
  const kept = keptForm(await getFormDraft(half.to.split('draft=')[1], 'postage'))
  expect(Object.keys(kept?.errors ?? {})).toEqual(['services.0.bands.0.priceMinor'])
  const mended = typedForm(createElement(ZoneForm, { slug, form: kept!, currency }), {
    'services.0.bands.0.priceMinor': '4,90',
  })
  expect((await send(postPostage, mara, mended, { workshop: slug })).to).toBe(
    `/admin/${slug}/settings/postage?saved=1`,
  )
  const row = await PostageZone.findOne({ where: { workshopId }, rejectOnEmpty: true })
  expect(row.countries).toHaveLength(27)

  const stored = (await getSettings({ actor: await actor(), workshopId, now: NOW }))!.zones[0]!
  const values = formValues({ ...stored, countries: stored.countries.join(', ') }, currency)
  const shown = typedForm(createElement(ZoneForm, { slug, form: { values }, zone: stored.id, currency }))
  expect((await send(postPostage, mara, shown, { workshop: slug })).to).toContain('saved=1')
  const kept2 = (await getSettings({ actor: await actor(), workshopId, now: NOW }))!.zones
  expect(kept2).toEqual([stored])
})

test('a module with its facts and an offer', async () => {
  const fields = { name: 'Kedge', slug: 'kedge', oneLine: 'Dual slew limiter', widthHp: '8', depthMm: '25' }
  expect((await send(postModule, mara, fields, { workshop: slug })).to).toBe(`/admin/${slug}/modules/kedge`)
  const values = formValues((await desk()).module)
  const facts = typedForm(createElement(FactsForm, { ...own, form: { values } }), {
    plus12Ma: '40',
    'controls.0.kind': 'knob',
    'controls.0.label': 'Rise',
    'controls.0.xMm': '20.2',
    'controls.0.yMm': '30',
    'controls.0.sizeMm': '16',
  })
  expect((await send(postFacts, mara, facts, at)).to).toContain('saved=1')
  const { module } = await desk()
  expect(module.controls).toEqual([{ kind: 'knob', label: 'Rise', xMm: 20.2, yMm: 30, sizeMm: 16 }])
  const shown = typedForm(createElement(FactsForm, { ...own, form: { values: formValues(module) } }))
  expect((await send(postFacts, mara, shown, at)).to).toContain('saved=1')
  expect((await desk()).module).toEqual(module)

  const form = offerForm(await desk(), 'kit', { currency, country: 'DE' })
  const kit = createElement(OfferForm, { ...own, offer: 'kit', currency, form })
  const dear = await send(postOffer, mara, typedForm(kit, { priceMinor: '95.00', depositMinor: '95.01' }), at)
  expect(dear.to).toContain('offers?offer=kit&draft=')
  const price = { priceMinor: '95', depositMinor: '25,00', packedWeightG: '420', customsCode: '920710' }
  expect((await send(postOffer, mara, typedForm(kit, price), at)).to).toContain('saved=1')
  const [offer] = await Offer.findAll({ where: { workshopId } })
  expect(offer).toMatchObject({
    priceMinor: 9500,
    depositMinor: 2500,
    customsOrigin: 'DE',
    taxClass: 'standard',
  })
})

test('a revision with its parts list and first good unit', async () => {
  expect((await send(postRevision, mara, typedForm(createElement(RevisionForm, own)), at)).to).toContain(
    'saved=1',
  )
  const people = [
    { id: '', personId: mara.id, email: 'm', name: null, role: 'owner' as const, since: NOW.toISOString() },
  ]
  const unit = createElement(FirstUnitForm, { ...own, revisions: ['A'], people, today: '2027-03-01' })
  expect((await send(postFirstUnit, mara, typedForm(unit, { how: 'Every step passed.' }), at)).to).toContain(
    'saved=1',
  )

  const parts = async () => (await getPartsDesk({ actor: await actor(), workshopId, module: 'kedge' }))!
  const take = async (text?: string) => {
    const form = createElement(ImportForm, {
      ...{ ...own, parts: await parts(), kind: 'lines', form: undefined },
    })
    const { file: _, ...typed } = typedForm(form, text === undefined ? {} : { text })
    const sent = await send(postImport, mara, { ...typed, kind: 'lines' }, at)
    const id = new URL(sent.to, 'http://localhost').searchParams.get('import') ?? ''
    return (await send(postConfirm, mara, { import: id }, at)).to
  }
  const csv =
    'code,designators,value,per_unit,kit,supplier,currency,breaks,quoted_on\nR-10K,"R1, R2",10k,2,buyer,Counter West,EUR,1: 0.0125,2027-02-28'
  expect(await take(csv)).toContain('saved=1')
  const before = await parts()
  expect(before.lines).toMatchObject([
    { code: 'R-10K', perUnit: 2, quotedOn: '2027-02-28', sample: 'not_needed' },
  ])
  expect(before.findings).toEqual([])
  // The list as it is shown to be edited, sent again.
  expect(await take()).toContain('saved=1')
  expect({ ...(await parts()), lines: [] }).toEqual({ ...before, lines: [] })
})

const planForm = ({ currency, offers, values }: PlanDesk) => ({
  action: paths.api.adminModulePart(slug, 'kedge', 'plan'),
  ...{ currency, offers, form: { values } },
})

test('the plan as it begins can be saved, and shows itself as it was saved', async () => {
  const plan = async () =>
    (await getPlanDesk({ actor: await actor(), workshopId, module: 'kedge', now: NOW }))!
  const begun = await plan()
  expect(begun).toMatchObject({ isSaved: false, offers: ['kit'], parts: 0 })
  const first = typedForm(createElement(PlanForm, planForm(begun)))
  expect((await send(postPlan, mara, first, at)).to).toBe(`/admin/${slug}/modules/kedge/plan?saved=1`)
  const stored = await Plan.findOne({ where: { workshopId }, rejectOnEmpty: true })
  // Germany's standard rate (check-values.md) is what the beginning proposes.
  expect(stored.plan).toMatchObject({ tax: { mode: 'home_rate', rates: [{ basisPoints: 1900, weight: 1 }] } })
  expect(stored.steps).toHaveLength(4)

  const shown = await plan()
  expect(shown).toMatchObject({ isSaved: true, missing: [], parts: 1 })
  // Two resistors at 1.25 c and ten minutes unpaid: twenty kits cost 50 c of parts.
  expect(shown.trial[0]).toEqual({ units: 20, costMinor: 50, unpriced: [] })
  const again = typedForm(createElement(PlanForm, planForm(shown)))
  expect((await send(postPlan, mara, again, at)).to).toContain('saved=1')
  const after = await Plan.findOne({ where: { workshopId }, rejectOnEmpty: true })
  expect([after.plan, after.steps]).toEqual([stored.plan, stored.steps])
})

test('the desk says what is left; publishing waits for the host', async () => {
  const refused = await send(postPublish, mara, {}, at)
  expect((await getFormDraft(refused.to.split('draft=')[1], 'module-deed'))?.reason).toBe('workshop_pending')
  const { steps, firstModule } = (await getDesk({ actor: await actor(), slug }))!
  expect(firstModule).toBe('kedge')
  expect(steps.filter(({ done }) => !done).map(({ key }) => key)).toEqual(['account', 'packer', 'publish'])
  await Workshop.update({ state: 'open', openedAt: NOW }, { where: { id: workshopId } })
  expect((await send(postPublish, mara, {}, at)).to).toBe(`/admin/${slug}/modules/kedge?saved=1`)
  expect((await desk()).module.state).toBe('published')
})
