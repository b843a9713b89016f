import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { ok, refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { getDesk } from '@/lib/queries/workshops/get-desk'

export const GET = route(
  { deed: 'workshop:read', params: z.object({ workshop: slug }) },
  async ({ actor, params }) => {
    const desk = await getDesk({ actor, slug: params.workshop })
    return desk ? ok(desk) : refuse('not_found')
  },
)
