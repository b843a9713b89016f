import { expectAccessible, expectReflow } from '@/tests/support/browser/look'
import { Sandbox } from '@/tests/support/browser/sandbox'
import { expect, test } from '@/tests/support/e2e'

test.setTimeout(540_000)
test('look', async ({ application, page, context }) => {
  const { code, output } = await application.run('tests/e2e/fixtures/make-matrix-world.ts')
  expect(code, output).toBe(0)
  const world = JSON.parse(output.trim().split('\n').at(-1)!) as {
    sessions: Record<string, string>
    params: Record<string, string>
  }
  const w = world.params.workshop
  const m = world.params.module
  await new Sandbox(context.request, application.baseUrl).signIn(context, 'person-2@example.org')
  const bad: string[] = []
  const paths: Record<string, string> = {
    today: `/admin/${w}`,
    modules: `/admin/${w}/modules`,
    new: `/admin/${w}/modules/new`,
    module: `/admin/${w}/modules/${m}`,
    facts: `/admin/${w}/modules/${m}/facts`,
    offers: `/admin/${w}/modules/${m}/offers?offer=kit`,
    revisions: `/admin/${w}/modules/${m}/revisions`,
    parts: `/admin/${w}/modules/${m}/parts`,
    preview: `/admin/${w}/modules/${m}/preview`,
    plan: `/admin/${w}/modules/${m}/plan`,
    settings: `/admin/${w}/settings`,
    postage: `/admin/${w}/settings/postage`,
    terms: `/admin/${w}/settings/terms`,
    members: `/admin/${w}/settings/members`,
    destinations: `/admin/${w}/settings/destinations`,
    join: '/join/' + 'x'.repeat(43),
  }
  for (const [name, path] of Object.entries(paths)) {
    await page.goto(path)
    if (['preview', 'parts', 'offers', 'revisions'].includes(name))
      await page.screenshot({ path: `/tmp/shots/${name}.png`, fullPage: true })
    for (const check of [expectAccessible, expectReflow])
      await check(page).catch((error: Error) => {
        bad.push(`${name}: ${error.message.slice(0, 1500)}`)
        console.log(bad.at(-1))
      })
    if (['plan'].includes(name)) {
      await page.setViewportSize({ width: 375, height: 800 })
      await page.screenshot({ path: `/tmp/shots/${name}-375.png`, fullPage: true })
      await page.setViewportSize({ width: 1280, height: 720 })
    }
  }
  // The enhanced forms: save the plan in place, then a mistake.
  await page.goto(paths.plan!)
  await page.getByRole('button', { name: 'Save the plan' }).click()
  await page.waitForURL(/saved=1/).catch((e: Error) => bad.push('plan save ' + e.message))
  await page.getByLabel('Good units out of those').fill('0')
  await page.getByRole('button', { name: 'Save the plan' }).click()
  await page.waitForTimeout(1500)
  await page.screenshot({ path: `/tmp/shots/plan-error.png`, fullPage: true })
  await page.goto(paths.offers!)
  await page.getByLabel('Deposit').fill('9000')
  await page.getByRole('button', { name: 'Save' }).click()
  await page.waitForTimeout(1500)
  await page.screenshot({ path: `/tmp/shots/offer-error.png`, fullPage: true })
  expect(bad.join('\n\n')).toBe('')
})
