import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { compareBooks } from '@/lib/services/money/compare-books'

export const POST = route(
  {
    deed: 'ledger:reconcile',
    params: z.object({ workshop: slug }),
    form: {
      name: 'money',
      back: ({ params, draft }) => `${paths.adminMoney(params.workshop, 'books')}?draft=${draft}`,
      done: ({ params }) => paths.adminMoney(params.workshop, 'books'),
    },
  },
  ({ actor, workshop, now }) => compareBooks({ actor, workshopId: workshop.id, now }),
)
