import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { StuckInput } from '@/lib/contracts/money-desk'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { resolveStuck } from '@/lib/services/money/resolve-stuck'

export const POST = route(
  {
    deed: 'refund:retry',
    params: z.object({ workshop: slug }),
    body: StuckInput,
    form: {
      name: 'money',
      back: ({ params, draft }) => `${paths.adminMoney(params.workshop, 'books')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminMoney(params.workshop, 'books')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => resolveStuck({ actor, workshopId: workshop.id, input: body, now }),
)
