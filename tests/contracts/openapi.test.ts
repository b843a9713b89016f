import { expect, test } from 'vitest'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { openApi, OPERATIONS } from '@/lib/contracts/openapi'
import { listRoutes } from '@/tests/http/matrix/list-routes'

const document = openApi({ baseUrl: 'https://runs.example.org', version: '1.2.3' })

test('every route of the API stands in the table, and the table names no other', () => {
  const routes = listRoutes().filter(({ isPage, path }) => !isPage && path.startsWith('/api/'))
  const ofFiles = routes.map(
    ({ method, path }) => `${method} ${path.replaceAll(/\[(?:\.\.\.)?(\w+)\]/g, '{$1}')}`,
  )
  expect(OPERATIONS.map(({ method, path }) => `${method} ${path}`).sort()).toEqual(ofFiles.sort())
})

test('a body is described as its contract reads it', () => {
  const submit = document.paths['/api/signups']?.post as {
    requestBody: { content: Record<string, { schema: { required: string[]; properties: object } }> }
  }
  const { schema } = submit.requestBody.content['application/json']!
  expect(schema.required).toEqual(
    expect.arrayContaining(['workshop', 'module', 'offer', 'quantity', 'country', 'certainty', 'email']),
  )
  expect(schema.properties).toMatchObject({
    offer: { enum: ['boards', 'kit', 'built'] },
    certainty: { enum: ['certain', 'likely', 'curious'] },
  })
})

test('what needs a session says so, and for whom it is', () => {
  expect(document.components.securitySchemes.session.name).toBe(SESSION_COOKIE)
  expect(document.paths['/api/signups']?.post).not.toHaveProperty('security')
  expect(document.paths['/api/packing/{workshop}/queue']?.get).toMatchObject({
    description: 'For: owner, packer.',
    security: [{ session: [] }],
  })
})

test('parameters of path and query, and the key of what may be repeated', () => {
  expect(document.paths['/api/w/{workshop}/{module}']?.get).toMatchObject({
    parameters: [
      { name: 'workshop', in: 'path', required: true },
      { name: 'module', in: 'path', required: true },
      { name: 'country', in: 'query', required: false },
    ],
  })
  expect(document.paths['/api/orders']?.post).toMatchObject({
    parameters: [{ name: 'Idempotency-Key', in: 'header' }],
  })
})

test('the whole is plain JSON', () => {
  expect(JSON.parse(JSON.stringify(document))).toMatchObject({
    openapi: '3.1.0',
    info: { version: '1.2.3' },
    servers: [{ url: 'https://runs.example.org' }],
  })
})
