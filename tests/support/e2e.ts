import { expect, test as base } from '@playwright/test'
import { startTestApplication, type TestApplication } from '../../scripts/support/test-application.mjs'

export { expect }

/** The browser's line for an answer the journey itself looks at: a refusal is no defect of the page. */
const REFUSAL = /Failed to load resource: the server responded with a status of (400|401|403|404|409|422|429)/

/**
 * The tests of the screens. Each worker has an application of its own (the sandbox's clock moves for everybody in
 * it); every page of the context fails its test on a console error, an uncaught error or a policy violation.
 */
export const test = base.extend<{ watched: undefined }, { application: TestApplication }>({
  application: [
    async ({}, use, { workerIndex }) => {
      const application = await startTestApplication({
        serverUrl: process.env.E2E_SERVER_URL ?? '',
        template: process.env.E2E_TEMPLATE ?? '',
        folder: process.env.E2E_FOLDER ?? '.data/test',
        name: `e2e_${process.pid}_${workerIndex}`,
      })
      await use(application)
      await application.stop()
    },
    { scope: 'worker', timeout: 120_000 },
  ],
  baseURL: async ({ application }, use) => use(application.baseUrl),
  watched: [
    async ({ context }, use) => {
      const complaints: string[] = []
      context.on('console', (message) => {
        if (message.type() === 'error' && !REFUSAL.test(message.text())) complaints.push(message.text())
      })
      context.on('weberror', (error) => complaints.push(String(error.error())))
      await use(undefined)
      expect(complaints, 'the console of the pages').toEqual([])
    },
    { auto: true },
  ],
})
