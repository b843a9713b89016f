import { ModuleParams } from '@/lib/contracts/module-forms'
import { QuoteInput } from '@/lib/contracts/part-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { writeQuote } from '@/lib/services/parts/write-quote'

export const POST = route(
  {
    deed: 'quote:write',
    params: ModuleParams,
    body: QuoteInput,
    form: {
      name: 'quote',
      back: ({ params, body, draft }) =>
        `${paths.adminPart(params.workshop, params.module, String(body.part))}?draft=${draft}`,
      done: ({ params, body }) => `${paths.adminPart(params.workshop, params.module, body.part)}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => writeQuote({ actor, workshopId: workshop.id, input: body, now }),
)
