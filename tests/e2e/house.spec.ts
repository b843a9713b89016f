import { expect, test } from '@/tests/support/e2e'

test.describe('every answer', () => {
  for (const path of ['/', '/signin', '/sandbox/pieces', '/nowhere', '/api/nowhere', '/account']) {
    test(`of ${path} carries the security headers and one policy`, async ({ request }) => {
      const answer = await request.get(path, { maxRedirects: 0 })
      const headers = answer.headers()
      expect(headers).toMatchObject({
        'x-content-type-options': 'nosniff',
        'x-frame-options': 'DENY',
        'cross-origin-opener-policy': 'same-origin',
      })
      expect(headers['x-request-id']).toMatch(/^[\w-]{8,64}$/)
      expect(headers['x-powered-by']).toBeUndefined()
      const policies = answer
        .headersArray()
        .filter(({ name }) => name.toLowerCase() === 'content-security-policy')
      expect(policies).toHaveLength(1)
      expect(policies[0]?.value).toContain("frame-ancestors 'none'")
      expect(/script-src [^;]*/.exec(policies[0]?.value ?? '')?.[0] ?? '').not.toContain('unsafe')
    })
  }
})

test('a request id from in front is kept when it is one, else replaced', async ({ request }) => {
  const kept = await request.get('/api/nowhere', { headers: { 'x-request-id': 'front-0123456789' } })
  expect(kept.headers()['x-request-id']).toBe('front-0123456789')
  const replaced = await request.get('/api/nowhere', { headers: { 'x-request-id': 'no id at all {}' } })
  expect(replaced.headers()['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
})

test('a page made per request and a page kept both come to life', async ({ page, watch }) => {
  watch.expect(404, '/nowhere')
  for (const path of ['/signin', '/nowhere']) {
    await page.goto(path)
    await expect(page.locator('main, h1').first()).toBeVisible()
  }
})
