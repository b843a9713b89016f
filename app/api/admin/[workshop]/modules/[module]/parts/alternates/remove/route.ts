import { ModuleParams } from '@/lib/contracts/module-forms'
import { AlternateRemoval } from '@/lib/contracts/part-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { removeAlternate } from '@/lib/services/parts/remove-alternate'

export const POST = route(
  {
    deed: 'part:write',
    params: ModuleParams,
    body: AlternateRemoval,
    form: {
      name: 'module-deed',
      back: ({ params, body, draft }) =>
        `${paths.adminPart(params.workshop, params.module, String(body.part))}?draft=${draft}`,
      done: ({ params, body }) => `${paths.adminPart(params.workshop, params.module, body.part)}?saved=1`,
    },
  },
  ({ actor, workshop, body }) => removeAlternate({ actor, workshopId: workshop.id, input: body }),
)
