import { ensureBuild } from '../../scripts/support/build.mjs'
import { openTestServer } from './test-server'

/** Before the browsers: the build, and a server whose template each worker's application is cloned from. */
export default async function setUp() {
  await ensureBuild()
  const { serverUrl, template, folder, remove } = await openTestServer()
  Object.assign(process.env, { E2E_SERVER_URL: serverUrl, E2E_TEMPLATE: template, E2E_FOLDER: folder })
  return remove
}
