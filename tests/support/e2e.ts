import { expect, test as base, type BrowserContext } from '@playwright/test'
import { demoTemplate } from '../../scripts/support/demo-template.mjs'
import { startTestApplication, type TestApplication } from '../../scripts/support/test-application.mjs'
import { Sandbox } from './browser/sandbox'
import { Watch } from './browser/watch'

export { expect }

type PerTest = {
  /** Fails the test for what its pages must never do; `watch.expect` names a refusal the journey wants. */
  watch: Watch
  sandbox: Sandbox
  /** A browser of its own for each person of a journey, watched as the first. */
  browserOf: (email?: string, options?: { javaScriptEnabled?: boolean }) => Promise<BrowserContext>
}
type PerWorker = {
  /** What the application begins with: nothing at all, or the demo. */
  world: 'empty' | 'demo'
  application: TestApplication
}

/**
 * The tests of the screens. Each worker has an application of its own (the sandbox's clock moves for everybody in it),
 * the fake provider doubling, losing and delaying what it sends.
 */
export const test = base.extend<PerTest, PerWorker>({
  world: ['empty', { scope: 'worker', option: true }],
  application: [
    async ({ world }, use, { workerIndex }) => {
      const { E2E_SERVER_URL = '', E2E_TEMPLATE = '', E2E_FOLDER = '', E2E_SECRET = '' } = process.env
      const application = await startTestApplication({
        serverUrl: E2E_SERVER_URL,
        template: world === 'demo' ? await demoTemplate(E2E_FOLDER) : E2E_TEMPLATE,
        folder: E2E_FOLDER,
        name: `e2e_${process.pid}_${workerIndex}`,
        settings: { AUTH_SECRET: E2E_SECRET },
      })
      await use(application)
      await application.stop()
    },
    { scope: 'worker', timeout: 600_000 },
  ],
  baseURL: async ({ application }, use) => use(application.baseUrl),
  watch: [
    async ({ context, application }, use) => {
      const watch = new Watch(originsOf(application))
      watch.follow(context)
      await use(watch)
      expect(watch.complaints, 'what the pages complained of').toEqual([])
    },
    { auto: true },
  ],
  sandbox: async ({ request, application }, use) => use(new Sandbox(request, application.baseUrl)),
  browserOf: async ({ browser, application, sandbox, watch }, use) => {
    const opened: BrowserContext[] = []
    await use(async (email, options = {}) => {
      const context = await browser.newContext({ baseURL: application.baseUrl, ...options })
      watch.follow(context)
      opened.push(context)
      if (email) await sandbox.signIn(context, email)
      return context
    })
    for (const context of opened) await context.close()
  },
})

const originsOf = ({ baseUrl, env }: TestApplication) =>
  [baseUrl, env.CARD_PAGE_URL].filter((url) => url !== undefined).map((url) => new URL(url).origin)
