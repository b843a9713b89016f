import react from '@vitejs/plugin-react'
import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const serverOnly = fileURLToPath(new URL('./scripts/support/server-only.ts', import.meta.url))
const shared = {
  resolve: { tsconfigPaths: true, alias: { 'server-only': serverOnly } },
}

/**
 * unit: pure code and the architecture, no database. db: services, queries and HTTP handlers against a
 * real PostgreSQL (a clone of a migrated template per file). ui: components in jsdom. faults: whole processes
 * killed and started again, one file at a time.
 */
export default defineConfig({
  test: {
    reporters: ['default'],
    projects: [
      {
        ...shared,
        test: {
          name: 'unit',
          // Pure code: files share their modules, which saves loading them seventy times.
          isolate: false,
          pool: 'threads',
          include: ['tests/{core,architecture,contracts,messages,emails,scripts}/**/*.test.{ts,tsx}'],
          environment: 'node',
        },
      },
      {
        ...shared,
        test: {
          name: 'db',
          include: [
            'tests/{services,queries,http,gateways,jobs,auth,db,sandbox,seeders,machine}/**/*.test.{ts,tsx}',
          ],
          environment: 'node',
          setupFiles: ['tests/support/db-setup.ts'],
          globalSetup: ['tests/support/db-global.ts'],
          testTimeout: 120_000,
          retry: process.env.CI ? 1 : 0,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
      {
        ...shared,
        test: {
          name: 'faults',
          include: ['tests/faults/**/*.test.ts'],
          environment: 'node',
          setupFiles: ['tests/support/db-setup.ts'],
          globalSetup: ['tests/support/db-global.ts'],
          testTimeout: 120_000,
          retry: process.env.CI ? 1 : 0,
          hookTimeout: 120_000,
          maxWorkers: 1,
        },
      },
      {
        ...shared,
        plugins: [react()],
        test: {
          name: 'ui',
          include: ['tests/ui/**/*.test.{ts,tsx}'],
          environment: 'jsdom',
          setupFiles: ['tests/support/ui-setup.ts'],
        },
      },
    ],
  },
})
