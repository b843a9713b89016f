import { ModuleFactsInput, ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveModule } from '@/lib/services/modules/save-module'

export const POST = route(
  {
    deed: 'module:write',
    params: ModuleParams,
    body: ModuleFactsInput,
    form: {
      name: 'module-facts',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'facts')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'facts')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body }) =>
    saveModule({ actor, workshopId: workshop.id, module: params.module, input: body }),
)
