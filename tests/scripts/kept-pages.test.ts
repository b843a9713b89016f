import { createHash } from 'node:crypto'
import { beforeEach, describe, expect, test } from 'vitest'
import KeptPages, { evict } from '../../cache-handler.mjs'

const key = (path: string) => `/route-cache/APP_PAGE/0123/$${path}`
const page = (html: string, headers: Record<string, string> = {}) => ({ kind: 'APP_PAGE', html, headers })
const pages = new KeptPages()
const policyOf = async (path: string) =>
  (await pages.get(key(path)))?.value.headers['content-security-policy'] ?? ''
const hashOf = (script: string) => `'sha256-${createHash('sha256').update(script).digest('base64')}'`

beforeEach(() => evict('*'))

describe('the policy of a kept page', () => {
  test('names the hash of every inline script of that page, once, and of nothing else', async () => {
    const html =
      '<script>one()</script><script src="/a.js"></script><script id="x">two("<b>")</script><script>one()</script>'
    await pages.set(key('/w/pier/kedge'), page(html), {})
    const policy = await policyOf('/w/pier/kedge')
    expect(policy.match(/'sha256-[^']+'/g)).toEqual([hashOf('one()'), hashOf('two("<b>")')])
    expect(policy).not.toContain("unsafe-inline'; script")
    expect(/script-src [^;]*/.exec(policy)?.[0]).not.toContain('unsafe')
  })

  test('changes with the page when it is made again', async () => {
    await pages.set(key('/w/pier/kedge'), page('<script>one()</script>'), {})
    await pages.set(key('/w/pier/kedge'), page('<script>two()</script>'), {})
    const policy = await policyOf('/w/pier/kedge')
    expect(policy).toContain(hashOf('two()'))
    expect(policy).not.toContain(hashOf('one()'))
  })
})

describe('eviction', () => {
  beforeEach(async () => {
    for (const path of ['/index', '/w/pier', '/w/pier/kedge', '/w/pier/kedge-two'])
      await pages.set(key(path), page(''), {})
  })

  test('drops the one page and no other', async () => {
    evict('/w/pier/kedge')
    expect(await pages.get(key('/w/pier/kedge'))).toBeNull()
    expect(await pages.get(key('/w/pier/kedge-two'))).not.toBeNull()
    expect(await pages.get(key('/w/pier'))).not.toBeNull()
  })

  test('knows the front page by its address', async () => {
    evict('/')
    expect(await pages.get(key('/index'))).toBeNull()
  })

  test('drops everything for *', async () => {
    evict('*')
    expect(await pages.get(key('/w/pier'))).toBeNull()
    expect(await pages.get(key('/index'))).toBeNull()
  })
})

test('a tag that was called out makes its pages stale, older ones only', async () => {
  await pages.set(key('/w/pier'), page('', { 'x-next-cache-tags': 'runs,modules' }), {})
  await pages.revalidateTag(['runs'])
  expect(await pages.get(key('/w/pier'))).toBeNull()
})

test('addresses nobody made cannot fill the memory: the oldest go', async () => {
  for (let number = 0; number <= 2000; number += 1) await pages.set(key(`/w/${number}`), page(''), {})
  expect(await pages.get(key('/w/0'))).toBeNull()
  expect(await pages.get(key('/w/2000'))).not.toBeNull()
})
