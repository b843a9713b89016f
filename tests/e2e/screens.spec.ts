import { PEOPLE } from '@/seeders/demo/people'
import type { TestApplication } from '@/scripts/support/test-application.mjs'
import { listRoutes } from '@/tests/http/matrix/list-routes'
import { expectAccessible, expectKeyboard, expectReflow } from '@/tests/support/browser/look'
import { expect, test } from '@/tests/support/e2e'
import { SCREENS, type Found, type Looker } from './screens'

test.use({ world: 'demo' })
test.describe.configure({ mode: 'parallel' })

/** The long lists of the owner are looked at in two halves, so that two workers share them. */
const LOOKERS: readonly { by: Looker; half?: 0 | 1 }[] = [
  { by: 'owner', half: 0 },
  { by: 'owner', half: 1 },
  { by: 'visitor' },
  { by: 'buyer' },
  { by: 'packer' },
  { by: 'host' },
]
let found: Found | undefined

test('every page has a screen to be looked at', () => {
  const pages = listRoutes().filter(({ isPage }) => isPage)
  expect(Object.keys(SCREENS).sort()).toEqual(pages.map(({ path }) => path).sort())
})

for (const { by, half } of LOOKERS) {
  test(`the pages of the ${by}${half === undefined ? '' : `, part ${half + 1}`} @full`, async ({
    application,
    browserOf,
  }) => {
    test.setTimeout(600_000)
    const page = await (await browserOf(await emailOf(by, application))).newPage()
    for (const address of addressesOf(by, half, await locate(application))) {
      await test.step(address, async () => {
        const answer = await page.goto(address)
        expect(answer?.status(), address).toBe(200)
        await expectAccessible(page)
        await expectKeyboard(page)
        await expectReflow(page)
      })
    }
  })

  test(`the pages of the ${by}${half === undefined ? '' : `, part ${half + 1}`}, dark and in between @full`, async ({
    application,
    browserOf,
  }) => {
    test.setTimeout(600_000)
    const page = await (await browserOf(await emailOf(by, application))).newPage()
    await page.emulateMedia({ colorScheme: 'dark' })
    for (const address of addressesOf(by, half, await locate(application))) {
      await test.step(address, async () => {
        await page.goto(address)
        for (const width of [360, 768, 1440]) {
          await page.setViewportSize({ width, height: 900 })
          await expectAccessible(page)
        }
      })
    }
  })
}

function addressesOf(by: Looker, half: 0 | 1 | undefined, where: Found): string[] {
  const all = Object.values(SCREENS)
    .filter((screen) => screen.by === by)
    .flatMap((screen) => screen.at(where))
  return all.filter((_, index) => half === undefined || index % 2 === half)
}

async function locate(application: TestApplication): Promise<Found> {
  if (found) return found
  const { code, output } = await application.run('tests/e2e/fixtures/demo-addresses.ts')
  expect(code, output).toBe(0)
  found = JSON.parse(output.trim().split('\n').at(-1)!) as Found
  return found
}

async function emailOf(by: Looker, application: TestApplication): Promise<string | undefined> {
  switch (by) {
    case 'visitor':
      return undefined
    case 'owner':
      return PEOPLE.mara
    case 'packer':
      return PEOPLE.lene
    case 'host':
      return PEOPLE.host
    default:
      return (await locate(application))[by]
  }
}
