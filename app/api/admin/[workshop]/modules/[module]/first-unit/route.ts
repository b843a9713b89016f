import { FirstUnitInput, ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { recordFirstUnit } from '@/lib/services/modules/record-first-unit'

export const POST = route(
  {
    deed: 'revision:prove',
    params: ModuleParams,
    body: FirstUnitInput,
    form: {
      name: 'first-unit',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    recordFirstUnit({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
