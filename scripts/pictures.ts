import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { chromium } from '@playwright/test'
import sharp from 'sharp'
import { PEOPLE } from '../seeders/demo/people'

// The pictures of the README, taken from the demo that `npm start` runs: npm run pictures [-- http://localhost:3000]
const base = process.argv[2] ?? 'http://localhost:3000'
const FOLDER = 'public/pictures'
const WIDTH = 1280

const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu', '--disable-quic', '--disable-background-networking'],
})
const context = await browser.newContext({ baseURL: base, viewport: { width: WIDTH, height: 900 } })
const page = await context.newPage()
mkdirSync(FOLDER, { recursive: true })

await take('module-page', '/w/hollow-pier/rowlock')
await context.request.post('/sandbox/sign-in', { form: { email: PEOPLE.mara }, headers: { origin: base } })
await page.goto('/admin/hollow-pier/runs')
const run = await page
  .getByRole('link', { name: /rowlock/i })
  .first()
  .getAttribute('href')
if (!run) throw new Error('The demo has no run of Rowlock on the list of runs.')
await take('decision-page', run)
await browser.close()

/** A palette of 128 colours is enough for flat pages and keeps the clone small. */
async function take(name: string, path: string): Promise<void> {
  const answer = await page.goto(path)
  if (answer?.status() !== 200) throw new Error(`${path} answered ${answer?.status()}.`)
  const shot = await page.screenshot({
    caret: 'initial',
    clip: { x: 0, y: 0, width: WIDTH, height: 1100 },
    fullPage: true,
  })
  await sharp(shot)
    .png({ palette: true, colours: 128 })
    .toFile(join(FOLDER, `${name}.png`))
}
