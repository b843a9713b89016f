import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { listRoutes } from '@/tests/http/matrix/list-routes'
import { PAGE_TABLE } from '@/tests/http/matrix/page-table'
import { expectedOf, ROLES } from '@/tests/http/matrix/roles'
import { expect, test } from '@/tests/support/e2e'

type World = { sessions: Record<string, string>; params: Record<string, string | string[]> }

const pages = listRoutes().filter(({ isPage, path }) => isPage || !path.startsWith('/api/'))

test('every page answers each role as the table says', async ({ application, request }) => {
  const { code, output } = await application.run('tests/e2e/fixtures/make-matrix-world.ts')
  expect(code, output).toBe(0)
  const world = JSON.parse(output.trim().split('\n').at(-1)!) as World
  const found: Record<string, string> = {}
  const wanted: Record<string, string> = {}
  for (const { key, method, path } of pages) {
    const row = PAGE_TABLE[key]
    if (!row) throw new Error(`no row for ${key}`)
    const given = typeof row === 'string' ? { who: row } : row
    const params = { ...world.params, ...given.params }
    const address = path.replaceAll(/\[(?:\.\.\.)?(\w+)\]/g, (_, name: string) =>
      [params[name]].flat().join('/'),
    )
    const statuses = await Promise.all(
      ROLES.map(async (role) => {
        const session = world.sessions[role]
        const answer = await request.fetch(`${address}${given.query ?? ''}`, {
          method: method === 'PAGE' ? 'GET' : method,
          maxRedirects: 0,
          headers: {
            accept: 'text/html',
            origin: application.baseUrl,
            ...(session && { cookie: `${SESSION_COOKIE}=${session}` }),
            ...given.headers,
          },
          ...(given.body !== undefined && { data: given.body }),
        })
        return answer.status()
      }),
    )
    found[key] = statuses.join(' ')
    wanted[key] = Object.values(expectedOf(row)).join(' ')
  }
  expect(found).toEqual(wanted)
})
