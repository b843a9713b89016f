import { ModuleParams } from '@/lib/contracts/module-forms'
import { StockInput } from '@/lib/contracts/part-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { countStock } from '@/lib/services/parts/count-stock'

export const POST = route(
  {
    deed: 'stock:write',
    params: ModuleParams,
    body: StockInput,
    form: {
      name: 'stock',
      back: ({ params, body, draft }) =>
        `${paths.adminPart(params.workshop, params.module, String(body.part))}?draft=${draft}`,
      done: ({ params, body }) => `${paths.adminPart(params.workshop, params.module, body.part)}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => countStock({ actor, workshopId: workshop.id, input: body, now }),
)
