import { ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { archiveModule } from '@/lib/services/modules/archive-module'

export const POST = route(
  {
    deed: 'module:archive',
    params: ModuleParams,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) => `${paths.adminModule(params.workshop, params.module)}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModule(params.workshop, params.module)}?saved=1`,
    },
  },
  ({ actor, workshop, params, now }) =>
    archiveModule({ actor, workshopId: workshop.id, module: params.module, now }),
)
