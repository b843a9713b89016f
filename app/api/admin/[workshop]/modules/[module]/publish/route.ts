import { ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { publishModule } from '@/lib/services/modules/publish-module'

export const POST = route(
  {
    deed: 'module:publish',
    params: ModuleParams,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) => `${paths.adminModule(params.workshop, params.module)}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModule(params.workshop, params.module)}?saved=1`,
    },
  },
  ({ actor, workshop, params, now }) =>
    publishModule({ actor, workshopId: workshop.id, module: params.module, now }),
)
