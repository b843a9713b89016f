import { expect, test } from 'vitest'
import { GET } from '@/app/api/openapi.json/route'

test('the description of the API is served, by a route that is handed no parameters at all', async () => {
  const answer = await GET(new Request('http://localhost:3000/api/openapi.json'), {})
  expect(answer.status).toBe(200)
  expect(await answer.json()).toMatchObject({
    openapi: '3.1.0',
    servers: [{ url: 'http://localhost:3000' }],
  })
})
