import { expect, type Page } from '@playwright/test'
import { orderFormWords } from '@/lib/messages/orders'
import { signUpWords } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'
import { formTo } from '@/tests/support/browser/forms'
import { linkIn, type Sandbox } from '@/tests/support/browser/sandbox'
import type { House } from './set-up-workshop'

/** Registers interest on the module's page and confirms it from the mail. */
export async function registerInterest(
  page: Page,
  sandbox: Sandbox,
  { slug, module }: House,
  email: string,
): Promise<void> {
  const before = await sandbox.mailsTo(email)
  await page.goto(paths.module(slug, module))
  const form = await formTo(page, paths.api.signUps).fill({
    ...{ offer: 'kit', quantity: '1', country: 'DE', certainty: 'certain', email },
  })
  await form.press(signUpWords.send, new RegExp(paths.signUpSent(slug, module)))
  const mail = await sandbox.mail(email, /confirm/i, before)
  await page.goto(new URL(linkIn(mail, '/confirm')).pathname)
  await formTo(page, paths.api.signUpConfirm).press(signUpWords.confirm, /done=1/)
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(signUpWords.confirmedTitle)
}

/** Fills in the order form, reads the check page, orders with obligation to pay; ends on the card page. */
export async function order(page: Page, { slug, module }: House, name: string): Promise<void> {
  await page.goto(paths.module(slug, module))
  await page
    .locator(`a[href="${paths.orderForm(slug, module)}"]`)
    .first()
    .click()
  await page.waitForURL(new RegExp(paths.orderForm(slug, module)))
  const form = await formTo(page, paths.api.orderDraft).fill({
    ...{ 'lines.0.quantity': '1', 'address.country': 'DE', 'address.name': name },
    ...{ 'address.lines.0': 'Hof 1', 'address.postcode': '89073', 'address.city': 'Ulm' },
  })
  await form.press(orderFormWords.next, /\/check\?draft=/)
  await formTo(page, paths.api.orders).press(/obligation to pay: 25\.00 € now, 74\.90 € when/, /\/pay\//)
}

/** Types a test card on the sandbox's card page; where the bank asks, says yes. Ends on the order's page. */
export async function payOnCardPage(page: Page, card: string): Promise<string> {
  if (/\/pay\//.test(page.url())) {
    await page.locator('#number').fill(card)
    await page.getByRole('button', { name: /^Pay / }).click()
  }
  await page.waitForURL(/\/account\/orders\/|\/authenticate\//)
  if (/\/authenticate\//.test(page.url())) {
    await page.getByRole('button').first().click()
    await page.waitForURL(/\/account\/orders\//)
  }
  return new URL(page.url()).pathname.split('/').at(-1)!
}

/** Waits until the order's page says so; events may be lost, so business time goes on until somebody has looked. */
export async function seeOnOrder(
  page: Page,
  sandbox: Sandbox,
  orderId: string,
  words: string,
): Promise<void> {
  await expect(async () => {
    await page.goto(paths.accountOrder(orderId))
    const isThere = await page.getByText(words, { exact: true }).first().isVisible()
    if (!isThere) await sandbox.pass(0.05)
    expect(isThere, words).toBe(true)
  }).toPass({ timeout: 90_000, intervals: [500, 1000, 2000] })
}
