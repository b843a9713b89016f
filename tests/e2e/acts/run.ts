import { expect, type Page } from '@playwright/test'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { formTo } from '@/tests/support/browser/forms'
import type { House } from './set-up-workshop'

/** Drafts a run of kits and opens it. Gives back its id. */
export async function openRun(
  page: Page,
  { slug, module }: House,
  given: { minimum: number; maximum: number; today: Date },
): Promise<string> {
  const day = (days: number) => new Date(given.today.getTime() + days * 86_400_000).toISOString().slice(0, 10)
  await page.goto(`${paths.adminRunNew(slug)}?module=${module}`)
  const draft = await formTo(page, paths.api.adminRuns(slug)).fill({
    minimum: String(given.minimum),
    maximum: String(given.maximum),
    decideBy: day(30),
    balanceWhen: 'before_packing',
    'offers.0.postedBy': day(170),
  })
  await draft.press(runWords.draft, /\/runs\/[0-9a-f-]{36}$/)
  const run = new URL(page.url()).pathname.split('/').at(-1)!
  await page.goto(paths.adminRunDeed(slug, run, 'open'))
  await formTo(page, paths.api.adminRunDeed(slug, run, 'open')).press(
    runWords.openButton,
    new RegExp(`${run}$`),
  )
  await expect(page.getByText(runWords.states.taking_deposits).first()).toBeVisible()
  return run
}

/** Reads the check page and types the words: the go. Every line of the readiness list must be ready by itself. */
export async function lockRun(page: Page, { slug, module }: House, run: string): Promise<void> {
  await page.goto(paths.adminRunDeed(slug, run, 'lock'))
  await expect(page.locator('input[name$=".reason"]'), 'lines that are not ready').toHaveCount(0)
  const form = await formTo(page, paths.api.adminRunDeed(slug, run, 'lock')).fill({
    typed: runWords.confirmLock(module),
  })
  await form.press(/^Lock the run with/, /\/bulk\//)
}

/** Announces the balances; a week later the cards are charged. */
export async function askForBalances(page: Page, { slug, module }: House, run: string): Promise<void> {
  await page.goto(paths.adminRunDeed(slug, run, 'ask-balances'))
  const form = await formTo(page, paths.api.adminRunDeed(slug, run, 'ask-balances')).fill({
    typed: runWords.confirmAsk(module),
  })
  await form.press(/^Announce/, /\/bulk\//)
}

/** The no-go. */
export async function callOffRun(
  page: Page,
  { slug, module }: House,
  run: string,
  reason: string,
): Promise<void> {
  await page.goto(paths.adminRunDeed(slug, run, 'call-off'))
  const form = await formTo(page, paths.api.adminRunDeed(slug, run, 'call-off')).fill({
    reason,
    typed: runWords.confirmCallOff(module),
  })
  await form.press(/^Call off, end/, /\/bulk\//)
}
