import { ensureBuild } from '../../scripts/support/build.mjs'
import { dropDemoTemplate, makeDemoTemplate } from '../../scripts/support/demo-template.mjs'
import { openTestServer } from './test-server'

const SECRET = 'a secret of the browser tests, long enough to pass'

/**
 * Before the browsers: the build, and a server whose templates each worker's application is cloned from. The demo is made
 * meanwhile; who needs it waits for it.
 */
export default async function setUp() {
  const { serverUrl, template, folder, remove } = await openTestServer()
  const place = { serverUrl, template, folder, secret: SECRET }
  const demo = makeDemoTemplate(place)
  Object.assign(process.env, {
    E2E_SERVER_URL: serverUrl,
    E2E_TEMPLATE: template,
    E2E_FOLDER: folder,
    E2E_SECRET: SECRET,
  })
  await ensureBuild()
  return async () => {
    await demo
    await dropDemoTemplate(place)
    await remove()
  }
}
