import { expect, type BrowserContext, type Page } from '@playwright/test'
import { modulesAdminWords } from '@/lib/messages/modules-admin'
import { importWords } from '@/lib/messages/part-imports'
import { settingsWords } from '@/lib/messages/settings'
import { workshopWords } from '@/lib/messages/workshops'
import { paths } from '@/lib/paths'
import { formTo } from '@/tests/support/browser/forms'
import { linkIn, type Sandbox } from '@/tests/support/browser/sandbox'
import { setUpSecondFactor, signInByMail } from './sign-in'

/** A workshop of the journeys; each has its own address, since workers keep theirs. */
export type House = { slug: string; module: string; owner: string; packer: string }

const SAVED = /saved=1/

/** Somebody with an e-mail address starts a workshop, and connects the payment account with some money on it. */
export async function startWorkshop(page: Page, sandbox: Sandbox, { slug, owner }: House): Promise<void> {
  await signInByMail(page, sandbox, owner)
  await page.goto(paths.start)
  const form = await formTo(page, paths.api.workshops).fill({
    name: 'Wrack Line Works',
    slug,
    legalName: 'Mara Quill',
    country: 'DE',
    currency: 'EUR',
    timeZone: 'Europe/Berlin',
  })
  await form.press(workshopWords.start, new RegExp(`/admin/${slug}$`))

  await page.goto(paths.adminPaymentAccount(slug))
  await formTo(page, paths.api.adminAccount(slug)).press(workshopWords.accountConnect, /\/account\/code/)
  await setUpSecondFactor(page, new RegExp(paths.adminPaymentAccount(slug)))
  await formTo(page, paths.api.adminAccount(slug)).press(workshopWords.accountConnect, /\/onboarding\//)
  await page.getByRole('button', { name: /float/ }).click()
  await page.waitForURL(new RegExp(paths.adminPaymentAccount(slug)))
  await expect(page.getByText(workshopWords.accountReady)).toBeVisible()
}

/** The host looks at it and opens it. */
export async function openAsHost(host: BrowserContext, { slug }: House): Promise<void> {
  const page = await host.newPage()
  await page.goto(paths.host)
  await formTo(page, paths.api.hostWorkshop(slug, 'open')).press(workshopWords.open, /\/host/)
  await expect(formTo(page, paths.api.hostWorkshop(slug, 'suspend')).itself).toBeVisible()
  await page.close()
}

/** Address, tax, postage, terms. */
export async function enterSettings(page: Page, { slug }: House): Promise<void> {
  await page.goto(paths.adminSettings(slug))
  const details = await formTo(page, paths.api.adminSettings(slug, 'details')).fill({
    about: 'A bench above the tide line.',
    'postalAddress.name': 'Mara Quill',
    'postalAddress.lines.0': 'Am Kai 3',
    'postalAddress.postcode': '20457',
    'postalAddress.city': 'Hamburg',
    'postalAddress.country': 'DE',
    taxMode: 'home_rate',
    pricesIncludeTax: true,
  })
  await details.press(settingsWords.save, SAVED)
  for (const [name, countries, price] of [
    ['Home and Union', 'DE, EU', '4.90'],
    ['Everywhere else', '*', '17.90'],
  ] as const) {
    await page.goto(`/admin/${slug}/settings/postage`)
    const zone = await formTo(page, paths.api.adminSettings(slug, 'postage')).fill({
      name,
      countries,
      'services.0.name': name === 'Everywhere else' ? 'Parcel abroad' : 'Parcel',
      'services.0.maxGrams': '5000',
      'services.0.maxMm': '600',
      'services.0.bands.0.upTo': '5000',
      'services.0.bands.0.priceMinor': price,
    })
    await zone.press(settingsWords.save, SAVED)
  }
  await page.goto(`/admin/${slug}/settings/terms`)
  const terms = await formTo(page, paths.api.adminSettings(slug, 'terms')).fill({
    body: 'Until the run is locked everyone who cancels gets everything back. After that we build, then we post.',
  })
  await terms.press(settingsWords.termsPublish, SAVED)
}

/** A packer is invited by mail and joins. */
export async function invitePacker(
  page: Page,
  sandbox: Sandbox,
  packer: Page,
  { slug, packer: email }: House,
): Promise<void> {
  await page.goto(`/admin/${slug}/settings/members`)
  const invitation = await formTo(page, paths.api.adminSettings(slug, 'members')).fill({
    email,
    role: 'packer',
  })
  await invitation.press(settingsWords.invite, SAVED)
  const mail = await sandbox.mail(email, /./)
  await signInByMail(packer, sandbox, email)
  await packer.goto(new URL(linkIn(mail, '/join')).pathname)
  await formTo(packer, paths.api.join).press(settingsWords.joinAccept, new RegExp(`/packing/${slug}`))
}

/** A module with its page, one offer, a revision, parts, a first unit and a plan; published. */
export async function enterModule(page: Page, { slug, module }: House, today: Date): Promise<void> {
  const desk = paths.adminModule(slug, module)
  const on = (part: Parameters<typeof paths.api.adminModulePart>[2]) =>
    paths.api.adminModulePart(slug, module, part)
  const day = (days: number) => new Date(today.getTime() + days * 86_400_000).toISOString().slice(0, 10)
  await page.goto(paths.adminModuleNew(slug))
  const begun = await formTo(page, paths.api.adminModules(slug)).fill({
    ...{ name: 'Strake', slug: module, oneLine: 'Voltage-controlled tilt', widthHp: '6', depthMm: '24' },
  })
  await begun.press(modulesAdminWords.begin, new RegExp(`${desk}$`))

  await page.goto(`${desk}/facts`)
  const facts = await formTo(page, paths.api.adminModule(slug, module)).fill({
    story: 'Leans a sound towards its low or its high end, by hand or by voltage.',
    ...{ plus12Ma: '18', minus12Ma: '17' },
    ...{ 'controls.0.kind': 'knob', 'controls.0.label': 'Tilt', 'controls.0.xMm': '15' },
    ...{ 'controls.0.yMm': '40', 'controls.0.sizeMm': '16' },
    ...{ 'controls.1.kind': 'jack', 'controls.1.label': 'In', 'controls.1.xMm': '15' },
    ...{ 'controls.1.yMm': '100', 'controls.1.sizeMm': '6' },
  })
  await facts.press(modulesAdminWords.save, SAVED)

  await page.goto(`${desk}/offers?offer=kit`)
  const offer = await formTo(page, on('offers')).fill({
    ...{ priceMinor: '95.00', depositMinor: '25.00', contents: 'Everything but solder.' },
    ...{ netWeightG: '280', packedWeightG: '420', lengthMm: '200', widthMm: '140', heightMm: '60' },
    ...{
      customsDescription: 'Clock divider for audio racks, kit of parts',
      customsCode: '920710',
      customsOrigin: 'DE',
    },
  })
  await offer.press(modulesAdminWords.save, SAVED)

  await page.goto(`${desk}/revisions`)
  await formTo(page, on('revisions')).press(modulesAdminWords.beginRevision, SAVED)
  await page.goto(`${desk}/revisions`)
  const unit = await formTo(page, on('first-unit')).fill({ how: 'Every step of the test plan passed.' })
  await unit.press(modulesAdminWords.record, SAVED)

  await page.goto(`${desk}/parts/import`)
  const parts = await formTo(page, on('parts/import')).fill({
    text: [
      'code,value,designators,per_unit,kit,needs_sample,supplier,currency,breaks,quoted_on,stock_seen,stock_seen_on',
      `R-100K,100k,R1-R4,4,buyer,no,Brasswick,EUR,1: 0.02; 100: 0.01,${day(-2)},9000,${day(-1)}`,
      `POT-B100K,100k,RV1,1,buyer,yes,Brasswick,EUR,1: 1.40; 50: 1.10,${day(-2)},700,${day(-1)}`,
    ].join('\n'),
  })
  await parts.press(importWords.look, /import=/)
  await formTo(page, on('parts/import/confirm')).press(importWords.confirm(2, false), SAVED)
  await page.goto(`${desk}/parts`)
  const sample = formTo(page, on('samples'))
  await sample.itself.locator('[name="part"]').selectOption({ index: 1 })
  await (await sample.fill({ fits: 'yes' })).press(modulesAdminWords.record, SAVED)

  await page.goto(`${desk}/plan`)
  const plan = await formTo(page, on('plan')).fill({
    ...{ labourPerHourMinor: '18.00', yieldPercent: '95' },
    ...{ 'boards.0.name': 'Main board', 'boards.0.supplier': 'Northmole Circuits' },
    ...{ 'boards.0.breaks': '1: 4.00; 20: 2.50', 'boards.0.setup': '30', 'boards.0.kit': true },
  })
  await plan.press(modulesAdminWords.save, SAVED)
  await page.goto(desk)
  await formTo(page, on('publish')).press(modulesAdminWords.publish, SAVED)
}
