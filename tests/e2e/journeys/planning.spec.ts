import { importWords } from '@/lib/messages/part-imports'
import { planAdminWords } from '@/lib/messages/plan-admin'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { formTo } from '@/tests/support/browser/forms'
import { expect, test } from '@/tests/support/e2e'
import { believableList, plantFaults } from '../acts/believable-list'
import { enterModule, enterSettings, openAsHost, startWorkshop, type House } from '../acts/set-up-workshop'

const HOUSE: House = {
  slug: 'tide-table',
  module: 'strake',
  owner: 'mara@tide-table.example',
  packer: 'lene@tide-table.example',
}
const SAVED = /saved=1/
const desk = paths.adminModule(HOUSE.slug, HOUSE.module)
const on = (part: Parameters<typeof paths.api.adminModulePart>[2]) =>
  paths.api.adminModulePart(HOUSE.slug, HOUSE.module, part)

// The later journeys plan in the workshop the first one makes.
test.describe.configure({ mode: 'serial' })

test('a module from nothing to a published page', async ({ page, browserOf, sandbox }) => {
  const today = await sandbox.pass(0.001)
  await startWorkshop(page, sandbox, HOUSE)
  await openAsHost(await browserOf('host@brimline.example'), HOUSE)
  await enterSettings(page, HOUSE)
  await enterModule(page, HOUSE, today)
  await page.goto(paths.module(HOUSE.slug, HOUSE.module))
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Strake')
})

test('a list of 120 lines with ten faults is mended on screen, and a second one compared', async ({
  browserOf,
}) => {
  const page = await (await browserOf(HOUSE.owner)).newPage()
  const good = believableList(120)
  const { text, faults } = plantFaults(good)
  expect(faults).toHaveLength(10)

  await page.goto(`${desk}/parts/import`)
  await (await formTo(page, on('parts/import')).fill({ text })).press(importWords.look, /import=/)
  for (const { line, words } of faults)
    await expect(
      page
        .locator('li', { hasText: importWords.line(line) })
        .filter({ hasText: words })
        .first(),
      `line ${line}`,
    ).toBeVisible()
  await expect(page.getByRole('button', { name: /^Replace the parts list/ })).toHaveCount(0)

  const mended = await formTo(page, on('parts/import')).fill({ text: good })
  await mended.press(importWords.lookAgain, /import=/)
  await expect(page.getByText(importWords.noMistakes)).toBeVisible()
  await expect(page.getByText('120 lines added, 2 removed, 0 changed, 0 as they are.')).toBeVisible()
  await formTo(page, on('parts/import/confirm')).press(importWords.confirm(120, false), SAVED)

  const lines = good.split('\n')
  // One line out, one in, the pieces of a third doubled.
  const [code = '', value = ''] = (lines[50] ?? '').split(',')
  const next = [...lines.slice(0, 100), ...lines.slice(101), 'X-NEW,1k,R999,1,buyer,']
  next[50] = [code, value, '"R9001, R9002"', '2', 'buyer', ''].join(',')
  await page.goto(`${desk}/parts/import`)
  const again = await formTo(page, on('parts/import')).fill({ text: next.join('\n') })
  await again.press(importWords.look, /import=/)
  await expect(page.getByText('1 line added, 1 removed, 1 changed, 118 as they are.')).toBeVisible()
})

/** What one kit brings: 95.00 with 19 % tax in it, rounded once for the run. */
const revenue = (units: number) => 9500 * units - Math.round((9500 * units * 19) / 119)
/** Boards in frames of twenty at 2,000 USD each, at 0.5: 1,000.00 a frame. */
const inFrames = (units: number) => Math.ceil(units / 20) * 100_000
/** The same boards singly, at 100 USD each. */
const singly = (units: number) => units * 5000

/** Least units without loss, and the stretches above it that lose again: counted one by one. */
function countByHand(cost: (units: number) => number, most: number) {
  const loses = Array.from({ length: most }, (_, i) => revenue(i + 1) - cost(i + 1) < 0)
  const first = loses.indexOf(false) + 1
  const again = loses.flatMap((lost, i) => (lost && i + 1 > first ? [i + 1] : []))
  return {
    first,
    gap: again.length > 0 ? ([again[0], again.at(-1)] as const) : null,
    safe: loses.lastIndexOf(true) + 2,
  }
}

test('purchases in dollars make a run lose again; bought singly the gap is gone, and a slip moves its dates', async ({
  browserOf,
  sandbox,
}) => {
  const page = await (await browserOf(HOUSE.owner)).newPage()
  const today = await sandbox.pass(0.001)
  const day = (days: number) => new Date(today.getTime() + days * 86_400_000).toISOString().slice(0, 10)
  await page.goto(`${desk}/parts/import`)
  // Nothing to buy but boards, so that every figure can be counted by hand.
  const bare = await formTo(page, on('parts/import')).fill({ text: 'code,per_unit,kit\nNOTHING,1,buyer' })
  await bare.press(importWords.look, /import=/)
  await formTo(page, on('parts/import/confirm')).press(importWords.confirm(1, false), SAVED)
  await page.goto(`${paths.adminRunNew(HOUSE.slug)}?module=${HOUSE.module}`)
  const draft = await formTo(page, paths.api.adminRuns(HOUSE.slug)).fill({
    ...{ minimum: '22', maximum: '40', decideBy: day(30), balanceWhen: 'before_packing' },
    'offers.0.postedBy': day(170),
  })
  await draft.press(runWords.draft, /\/runs\/[0-9a-f-]{36}$/)
  const run = new URL(page.url()).pathname.split('/').at(-1)!
  const costs = paths.adminRunPage(HOUSE.slug, run, 'costs')
  const form = formTo(page, paths.api.adminRunDeed(HOUSE.slug, run, 'plan'))
  const framed = countByHand(inFrames, 40)
  const single = countByHand(singly, 40)
  const profit = page.locator('#profit')

  await test.step('the gap is shown while the figures are typed', async () => {
    await page.goto(costs)
    await form.fill({
      ...{ labourPerHourMinor: '', onceMinutes: '0', yieldPercent: '100', unitsPerOrder: '1' },
      ...{ 'offers.0.minutesPerUnit': '0', 'offers.0.packaging': '0' },
      ...{ 'boards.0.name': 'Main board', 'boards.0.supplier': 'Fab Sou-East', 'boards.0.currency': 'USD' },
      ...{ 'boards.0.breaks': '1: 2000', 'boards.0.perArray': '20', 'boards.0.setup': '' },
      ...{ 'boards.0.kit': true, 'boards.0.spare': '0' },
      ...{ 'rates.0.currency': 'USD', 'rates.0.rate': '0.5', 'rates.0.on': day(-1), 'rates.0.margin': '0' },
      ...{ 'taxes.0.rate': '19', 'taxes.0.weight': '1' },
    })
    const began = Date.now()
    await expect(profit).toContainText(
      `it makes it lose again from ${framed.gap![0]} to ${framed.gap![1]}`.replace('it makes', 'makes'),
    )
    await expect(profit).toContainText(`From ${framed.first} units it no longer loses`)
    test.info().annotations.push({ type: 'figures followed', description: `${Date.now() - began} ms` })
    await expect(profit).toContainText('lies in a stretch where a price step makes the run lose again')
    await form.press(planAdminWords.save, SAVED)
  })

  await test.step('bought singly there is none', async () => {
    await form.fill({ 'boards.0.breaks': '1: 100', 'boards.0.perArray': '1' })
    await form.press(planAdminWords.save, SAVED)
    await expect(profit).not.toContainText('lose again')
    await expect(profit).toContainText(
      `No loss from, at today’s mix${single.safe <= 1 ? '1 unit' : `${single.safe} units`}`,
    )
    const left = revenue(22) - singly(22)
    await expect(page.locator('#one-unit')).toContainText((Math.round(left / 22) / 100).toFixed(2))
  })

  await test.step('a late step is seen in the dates', async () => {
    await form.fill({
      ...{ 'steps.0.name': 'Boards', 'steps.0.optimistic': '10', 'steps.0.likely': '10' },
      ...{ 'steps.0.pessimistic': '10', 'steps.1.name': 'Packing', 'steps.1.optimistic': '5' },
      ...{ 'steps.1.likely': '5', 'steps.1.pessimistic': '5', 'steps.1.after': '1' },
      ...Object.fromEntries(
        [2, 3].flatMap((row) =>
          ['name', 'optimistic', 'likely', 'pessimistic', 'after'].map((field) => [
            `steps.${row}.${field}`,
            '',
          ]),
        ),
      ),
    })
    await form.press(planAdminWords.save, SAVED)
    const schedule = paths.adminRunPage(HOUSE.slug, run, 'schedule')
    await page.goto(schedule)
    await expect(page.locator('main')).toContainText(written(workingDaysAfter(day(30), 15)))
    await page.goto(`${schedule}?step=1&days=5`)
    const slipped = page.locator('#slip')
    await expect(slipped).toContainText(
      `${written(workingDaysAfter(day(30), 15))} → ${written(workingDaysAfter(day(30), 20))}`,
    )
  })
})

/** Counted day by day, weekends left out. */
function workingDaysAfter(from: string, days: number): string {
  const at = new Date(`${from}T12:00:00Z`)
  for (let left = days; left > 0;) {
    at.setUTCDate(at.getUTCDate() + 1)
    if (at.getUTCDay() !== 0 && at.getUTCDay() !== 6) left -= 1
  }
  return at.toISOString().slice(0, 10)
}

const written = (day: string) =>
  new Date(`${day}T12:00:00Z`).toLocaleDateString('en-GB', {
    ...{ day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' },
  })
