import { expect, type Page } from '@playwright/test'
import { packingWords } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { formTo } from '@/tests/support/browser/forms'
import type { House } from './set-up-workshop'

/** Opens the first parcel of the queue. Gives back its id. */
export async function takeFirstParcel(page: Page, { slug }: House): Promise<string> {
  await page.goto(paths.packing(slug))
  await page
    .locator(`a[href^="${paths.packing(slug)}/parcels/"]`)
    .first()
    .click()
  await page.waitForURL(/\/parcels\/[0-9a-f-]{36}$/)
  return new URL(page.url()).pathname.split('/').at(-1)!
}

/** Looks at the papers on the page that prints and as PDF. */
export async function printPapers(page: Page, { slug }: House, parcel: string): Promise<void> {
  for (const path of [paths.packingPapers(slug, 'list'), paths.packingSlip(slug, parcel)]) {
    await page.goto(path)
    await expect(page.locator('h1, h2, caption').first()).toBeVisible()
  }
  for (const path of [paths.api.packingList(slug), paths.api.packingSlip(slug, parcel)]) {
    const pdf = await page.request.get(path)
    expect(pdf.status(), path).toBe(200)
    expect((await pdf.body()).subarray(0, 5).toString(), path).toBe('%PDF-')
  }
}

/** Ticks every line, weighs, and hands over with a tracking number. */
export async function packAndHandOver(
  page: Page,
  { slug }: House,
  parcel: string,
  given: { grams: string; mistyped: string; tracking: string },
): Promise<void> {
  const here = new RegExp(`${paths.packingParcel(slug, parcel)}([?#].*)?$`)
  await page.goto(paths.packingParcel(slug, parcel))
  const pack = await formTo(page, paths.api.packingParcel(slug, parcel, 'pack')).fill({
    ...{ 'lines.0.line': true, grams: given.grams },
  })
  await pack.press(packingWords.packed, here)
  const handOver = formTo(page, paths.api.packingParcel(slug, parcel, 'hand-over'))
  await expect(handOver.itself).toBeVisible()
  await (await handOver.fill({ tracking: given.mistyped })).press(packingWords.handOverButton, /draft=/)
  await expect(page.locator('[name=tracking]')).toHaveValue(given.mistyped)
  await expect(page.getByText(/check digit/).first()).toBeVisible()
  const again = formTo(page, paths.api.packingParcel(slug, parcel, 'hand-over'))
  await (await again.fill({ tracking: given.tracking })).press(packingWords.handOverButton, here)
  await expect(page.getByText(packingWords.states.handed_over).first()).toBeVisible()
}
