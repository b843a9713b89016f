import { resolve } from 'node:path'
import { NextRequest } from 'next/server'
import { beforeAll, describe, expect, test } from 'vitest'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { API_TABLE } from './api-table'
import { listRoutes, type Route } from './list-routes'
import { PAGE_TABLE } from './page-table'
import { matrixWorld, sessionOf } from './people'
import { expectedOf, ROLES, type MatrixRole, type Row } from './roles'

// Who is let in where. Pages are asked in the browser part (tests/e2e/matrix.spec.ts), by the same table.
const routes = listRoutes()
const handled = routes.filter(({ isPage, path }) => !isPage && path.startsWith('/api/'))
let world: Awaited<ReturnType<typeof matrixWorld>>

beforeAll(async () => {
  world = await matrixWorld()
})

test('every route has a row, and every row a route', () => {
  expect(Object.keys({ ...API_TABLE, ...PAGE_TABLE }).sort()).toEqual(routes.map(({ key }) => key).sort())
})

describe.each(handled)('$key', (route) => {
  test.each(ROLES)('%s', async (role) => {
    const row = API_TABLE[route.key]
    if (!row) throw new Error(`no row for ${route.key}`)
    const answer = await ask(route, role, row)
    const expected = expectedOf(row)[role]
    expect(answer.status, answer.status === expected ? '' : await answer.text()).toBe(expected)
  })
})

async function ask(route: Route, role: MatrixRole, row: Row): Promise<Response> {
  const given = typeof row === 'string' ? { who: row } : row
  const params = { ...world.params, ...given.params }
  const path = route.path.replaceAll(/\[(?:\.\.\.)?(\w+)\]/g, (_, name: string) =>
    [params[name]].flat().join('/'),
  )
  const headers = new Headers({ origin: 'http://localhost:3000', ...given.headers })
  if (role !== 'visitor') headers.set('cookie', `${SESSION_COOKIE}=${await sessionOf(world.people[role])}`)
  const carries = route.method !== 'GET' && route.method !== 'HEAD'
  if (carries && !headers.has('content-type')) headers.set('content-type', 'application/json')
  const request = new NextRequest(`http://localhost:3000${path}${given.query ?? ''}`, {
    method: route.method,
    headers,
    ...(carries && { body: typeof given.body === 'string' ? given.body : JSON.stringify(given.body ?? {}) }),
  })
  const handlers = (await import(resolve(route.file))) as Record<string, Handler>
  return handlers[route.method]!(request, { params: Promise.resolve(params) })
}

type Handler = (
  request: NextRequest,
  segment: { params: Promise<Record<string, string | string[]>> },
) => Promise<Response>
