import { gzipSync } from 'node:zlib'
import type { Request } from 'autocannon'
import { pathToFileURL } from 'node:url'
import { run } from '../support/shell.mjs'
import { load, ratio } from './load'
import { openServers, type Servers } from './servers'

type Measure = { name: string; value: number; unit: string }

const PAGE = '/w/hollow-pier/rowlock'
let sent = 0

/** A sign-up by somebody new each time, from an address of its own: limits are for one person. */
const signUp = (body: object): Request => ({
  method: 'POST',
  headers: { 'content-type': 'application/json' },
  setupRequest: (request) => {
    sent += 1
    return {
      ...request,
      headers: {
        'content-type': 'application/json',
        'x-forwarded-for': `10.${sent >> 16}.${(sent >> 8) & 255}.${sent & 255}`,
      },
      body: JSON.stringify({ ...body, email: `somebody-${sent}@bench.brimline.example` }),
    }
  },
})

const INTEREST = {
  ...{ workshop: 'hollow-pier', module: 'rowlock', offer: 'kit', quantity: 1 },
  ...{ country: 'DE', certainty: 'likely', updates: false },
}

/** What a first visit of a page loads of JavaScript, compressed; what only old browsers load is left out. */
async function scriptsOf(url: string): Promise<{ files: number; bytes: number; html: number }> {
  const html = await (await fetch(url)).text()
  const scripts = [...html.matchAll(/<script\b[^>]*\bsrc="([^"]+)"[^>]*>/g)]
    .filter(([tag]) => !/nomodule/i.test(tag!))
    .map(([, src]) => new URL(src!.replaceAll('&amp;', '&'), url).href)
  const sizes = await Promise.all(
    [...new Set(scripts)].map(
      async (src) => gzipSync(Buffer.from(await (await fetch(src)).arrayBuffer())).length,
    ),
  )
  return {
    files: sizes.length,
    bytes: sizes.reduce((sum, size) => sum + size, 0),
    html: gzipSync(html).length,
  }
}

async function firstLoad({ ours, bare }: Servers): Promise<Measure[]> {
  const [page, nothing] = [await scriptsOf(`${ours}${PAGE}`), await scriptsOf(`${bare}/`)]
  return [
    {
      name: `module page, JavaScript of a first load (${page.files} files, gzip)`,
      value: page.bytes / 1024,
      unit: 'KiB',
    },
    {
      name: 'module page, that JavaScript against a bare page',
      value: page.bytes / nothing.bytes,
      unit: '×',
    },
    { name: 'module page, HTML (gzip)', value: page.html / 1024, unit: 'KiB' },
  ]
}

/** The module page and the sign-up beside a bare page and a bare insert of the same framework. */
export async function benchHttp(): Promise<Measure[]> {
  const servers = await openServers(async (env) => {
    await run(process.execPath, ['scripts/run.mjs', 'scripts/bench/prepare.ts'], { env })
  })
  try {
    const { ours, bare } = servers
    const page = await ratio(
      () => load(`${ours}${PAGE}`),
      () => load(`${bare}/`),
    )
    const post = await ratio(
      () => load(`${ours}/api/signups`, signUp(INTEREST)),
      () => load(`${bare}/api/rows`, signUp({})),
    )
    return [
      { name: 'module page against a bare static page', value: page.ratio, unit: '×' },
      { name: 'module page', value: page.ours, unit: 'requests/s' },
      { name: 'sign-up against a bare insert', value: post.ratio, unit: '×' },
      { name: 'sign-up', value: post.ours, unit: 'requests/s' },
      ...(await firstLoad(servers)),
    ]
  } finally {
    await servers.close()
  }
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  for (const { name, value, unit } of await benchHttp())
    console.log(`${name.padEnd(66)} ${value.toFixed(value < 10 ? 2 : 0).padStart(8)} ${unit}`)
}
