import { env } from '@/lib/config/env'
import { programVersion } from '@/lib/config/version'
import { openApi } from '@/lib/contracts/openapi'
import { route } from '@/lib/http/route'

export const GET = route({ deed: 'site:read' }, async () =>
  Response.json(openApi({ baseUrl: env().BASE_URL, version: programVersion() })),
)
