import { s10CheckDigit } from '@/lib/core/post/s10'
import { orderWords } from '@/lib/messages/order-page'
import { paths } from '@/lib/paths'
import { expect, test } from '@/tests/support/e2e'
import { CARD, linkIn } from '@/tests/support/browser/sandbox'
import { order, payOnCardPage, registerInterest, seeOnOrder } from '../acts/buyers'
import { expectBooksAgree } from '../acts/books'
import { packAndHandOver, printPapers, takeFirstParcel } from '../acts/packer'
import { askForBalances, callOffRun, lockRun, openRun } from '../acts/run'
import {
  enterModule,
  enterSettings,
  invitePacker,
  openAsHost,
  startWorkshop,
  type House,
} from '../acts/set-up-workshop'
import { signInByMail } from '../acts/sign-in'

const HOUSE: House = {
  slug: 'wrack-line',
  module: 'strake',
  owner: 'mara@wrack-line.example',
  packer: 'lene@wrack-line.example',
}
const INES = 'ines@buyers.example'
const TOM = 'tom@buyers.example'
const happened = orderWords.events

// The second journey goes on in the workshop of the first.
test.describe.configure({ mode: 'serial' })

// Steps 1 to 9 of a run from a workshop made from nothing to the buyer's page that tells all of it, the provider
// doubling, losing, delaying and breaking what it can.
test('a run from nothing to the post', async ({ application, browserOf, sandbox }) => {
  test.setTimeout(300_000)
  const owner = await (await browserOf()).newPage()
  const packer = await (await browserOf()).newPage()
  const ines = await (await browserOf()).newPage()
  const tom = await (await browserOf()).newPage()
  const today = await sandbox.pass(0.001)
  let run = ''
  const orders: Record<string, string> = {}

  await test.step('1 a workshop, its account, its settings, its module, its packer', async () => {
    await startWorkshop(owner, sandbox, HOUSE)
    await openAsHost(await browserOf('host@brimline.example'), HOUSE)
    await enterSettings(owner, HOUSE)
    await enterModule(owner, HOUSE, today)
    await invitePacker(owner, sandbox, packer, HOUSE)
  })

  await test.step('2 interest, confirmed from the mail, counts', async () => {
    await registerInterest(ines, sandbox, HOUSE, INES)
    await registerInterest(tom, sandbox, HOUSE, TOM)
    await expect(async () => {
      const answer = await ines.request.get(paths.api.module(HOUSE.slug, HOUSE.module))
      expect(await answer.json()).toMatchObject({ interest: { confirmed: 2, units: 2 } })
      await ines.goto(paths.module(HOUSE.slug, HOUSE.module))
      await expect(ines.getByText(/2 people have said/).first()).toBeVisible({ timeout: 1_000 })
    }).toPass({ timeout: 15_000 })
  })

  await test.step('3 the run opens and both are invited', async () => {
    run = await openRun(owner, HOUSE, { minimum: 2, maximum: 2, today })
    for (const email of [INES, TOM]) await sandbox.mail(email, /deposits are open/)
  })

  await test.step('4 and 5 deposits are paid on the card page and count', async () => {
    for (const [page, email, card] of [
      [ines, INES, CARD.pays],
      [tom, TOM, CARD.asksAlways],
    ] as const) {
      await signInByMail(page, sandbox, email)
      await order(page, HOUSE, email === INES ? 'Ines Sommer' : 'Tom Ashby')
      orders[email] = await payOnCardPage(page, card)
      await seeOnOrder(page, sandbox, orders[email], happened.deposit_captured!)
      await sandbox.mail(email, /^Deposit received/)
    }
    const answer = await ines.request.get(paths.api.module(HOUSE.slug, HOUSE.module))
    expect(await answer.json()).toMatchObject({ run: { id: run, deposited: 2, held: 0, waiting: 0 } })
    await expect(async () => {
      await ines.goto(paths.module(HOUSE.slug, HOUSE.module))
      await expect(ines.getByText(/All 2 places are under deposit/).first()).toBeVisible({ timeout: 1_000 })
    }).toPass({ timeout: 15_000 })
  })

  await test.step('6 the owner reads the figures and locks', async () => {
    await owner.goto(paths.adminRun(HOUSE.slug, run))
    const figures = await owner.request.get(paths.api.adminRun(HOUSE.slug, run))
    expect(await figures.json()).toMatchObject({ figures: { deposited: 2, held: 0 } })
    await lockRun(owner, HOUSE, run)
    for (const email of [INES, TOM]) await sandbox.mail(email, /the run goes ahead/)
  })

  await test.step('7 balances: one on the saved card, one by link where the bank asks', async () => {
    const before = await sandbox.mailsTo(TOM)
    await askForBalances(owner, HOUSE, run)
    await sandbox.pass(7 * 24 + 2)
    await seeOnOrder(ines, sandbox, orders[INES]!, happened.balance_captured!)
    const asked = await sandbox.mail(TOM, /could not be charged/, before)
    await tom.goto(new URL(linkIn(asked, '/account/orders')).pathname)
    const pay = tom.locator(`form[action="${paths.api.orderPay(orders[TOM]!)}"]`).first()
    await pay.getByRole('button').click()
    await payOnCardPage(tom, CARD.pays)
    await seeOnOrder(tom, sandbox, orders[TOM]!, happened.balance_captured!)
  })

  await test.step('8 the packer prints, packs, weighs, hands over', async () => {
    for (const serial of ['41730017', '41730034']) {
      const parcel = await takeFirstParcel(packer, HOUSE)
      await printPapers(packer, HOUSE, parcel)
      const digit = s10CheckDigit(serial)
      await packAndHandOver(packer, HOUSE, parcel, {
        grams: '420',
        mistyped: `CP${serial}${(digit + 1) % 10}DE`,
        tracking: `CP${serial}${digit}DE`,
      })
    }
    for (const email of [INES, TOM]) await sandbox.mail(email, /parcel is on its way/)
  })

  await test.step('9 the order’s page tells all of it, and the books agree', async () => {
    for (const [page, email] of [
      [ines, INES],
      [tom, TOM],
    ] as const) {
      await page.goto(paths.accountOrder(orders[email]!))
      for (const event of [
        'place',
        'deposit_captured',
        'ask_balance',
        'balance_captured',
        'pack',
        'hand_over',
      ])
        await expect(page.getByText(happened[event]!, { exact: true }).first(), event).toBeVisible()
      await expect(page.getByText(/CP4173\d{5}DE/).first()).toBeVisible()
    }
    await sandbox.pass(1)
    await expectBooksAgree(application, { charges: 4, refunds: 0 })
  })
})

test('a run called off pays everyone back and writes to them', async ({
  application,
  browserOf,
  sandbox,
}) => {
  test.setTimeout(240_000)
  const owner = await (await browserOf(HOUSE.owner)).newPage()
  const today = await sandbox.pass(0.001)
  const run = await openRun(owner, HOUSE, { minimum: 5, maximum: 8, today })
  const buyers = [INES, 'hana@buyers.example']
  await sandbox.pass(49)
  const pages = await Promise.all(buyers.map(async (email) => (await browserOf(email)).newPage()))
  const orders: string[] = []
  for (const page of pages) {
    await order(page, HOUSE, 'Ines Sommer')
    orders.push(await payOnCardPage(page, CARD.pays))
  }
  for (const [index, page] of pages.entries())
    await seeOnOrder(page, sandbox, orders[index]!, happened.deposit_captured!)

  await callOffRun(owner, HOUSE, run, 'Too few, this time.')
  await expect(async () => {
    await owner.reload()
    await expect(owner.getByText(/2 of 2/).first()).toBeVisible({ timeout: 1_000 })
  }).toPass({ timeout: 60_000 })
  await sandbox.pass(2)
  for (const [index, page] of pages.entries()) {
    const email = buyers[index]!
    await seeOnOrder(page, sandbox, orders[index]!, happened.refunded!)
    await expect(page.getByText(happened.run_called_off!, { exact: true }).first()).toBeVisible()
    const mail = await sandbox.mail(email, /the run is called off/)
    expect(mail.text).toContain('Too few, this time.')
    await sandbox.mail(email, /25\.00.* is on its way back/)
  }
  const { run: shown } = (await (
    await owner.request.get(paths.api.module(HOUSE.slug, HOUSE.module))
  ).json()) as { run: { id: string } | null }
  expect(shown?.id).not.toBe(run)
  await sandbox.pass(1)
  await expectBooksAgree(application, { charges: 6, refunds: 2 })
})
