import { ModuleParams } from '@/lib/contracts/module-forms'
import { AlternateInput } from '@/lib/contracts/part-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { addAlternate } from '@/lib/services/parts/add-alternate'

export const POST = route(
  {
    deed: 'part:write',
    params: ModuleParams,
    body: AlternateInput,
    form: {
      name: 'alternate',
      back: ({ params, body, draft }) =>
        `${paths.adminPart(params.workshop, params.module, String(body.part))}?draft=${draft}`,
      done: ({ params, body }) => `${paths.adminPart(params.workshop, params.module, body.part)}?saved=1`,
    },
  },
  ({ actor, workshop, body }) => addAlternate({ actor, workshopId: workshop.id, input: body }),
)
