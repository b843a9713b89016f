import { programVersion } from '@/lib/config/version'
import { getHealth } from '@/lib/queries/public/get-health'

export const dynamic = 'force-dynamic'

/** Without `route()`: it must answer while the database, which the wrapper asks for the time, does not. */
export async function GET(): Promise<Response> {
  const health = await getHealth()
  const status = health.database === 'down' ? 'down' : health.jobs === 'ok' ? 'ok' : 'degraded'
  return Response.json(
    { status, ...health, version: programVersion() },
    { status: status === 'down' ? 503 : 200, headers: { 'cache-control': 'no-store' } },
  )
}
