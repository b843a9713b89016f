import { defineConfig } from '@playwright/test'

const CHROMIUM_ARGS = [
  '--no-sandbox',
  '--disable-dev-shm-usage',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** The screens, in Debian's Chromium, against the production build; see tests/support/e2e.ts. */
export default defineConfig({
  testDir: 'tests/e2e',
  globalSetup: './tests/support/e2e-global.ts',
  outputDir: 'test-results',
  workers: 2,
  retries: process.env.CI ? 1 : 0,
  timeout: 180_000,
  expect: { timeout: 15_000 },
  reporter: [
    ['line'],
    ['json', { outputFile: process.env.PLAYWRIGHT_JSON_OUTPUT_NAME ?? '.data/test-results/browser.json' }],
  ],
  use: {
    browserName: 'chromium',
    locale: 'en-GB',
    timezoneId: 'UTC',
    trace: 'retain-on-failure',
    video: 'off',
    launchOptions: { executablePath: '/usr/bin/chromium', args: CHROMIUM_ARGS },
  },
})
