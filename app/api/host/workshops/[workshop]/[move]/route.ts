import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { moveWorkshop } from '@/lib/services/workshops/move-workshop'

const Params = z.object({ workshop: slug, move: z.enum(['open', 'suspend', 'reopen']) })

export const POST = route(
  {
    deed: 'host:read',
    params: Params,
    form: { name: 'host', back: ({ draft }) => `${paths.host}?draft=${draft}`, done: () => paths.host },
  },
  ({ actor, params, now }) => moveWorkshop({ actor, slug: params.workshop, event: params.move, now }),
)
