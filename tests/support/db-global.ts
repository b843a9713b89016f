import type { TestProject } from 'vitest/node'
import { openTestServer } from './test-server'

declare module 'vitest' {
  interface ProvidedContext {
    serverUrl: string
    template: string
  }
}

/** One server for the run and one migrated template in it; each test file gets a clone (db-setup.ts). */
export default async function setUp(project: TestProject) {
  const { serverUrl, template, remove } = await openTestServer()
  project.provide('serverUrl', serverUrl)
  project.provide('template', template)
  return remove
}
