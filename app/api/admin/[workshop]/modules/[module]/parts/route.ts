import { ModuleParams, PartsInput } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveParts } from '@/lib/services/modules/save-parts'

export const POST = route(
  {
    deed: 'part:write',
    params: ModuleParams,
    body: PartsInput,
    form: {
      name: 'parts',
      back: ({ params, body, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'parts')}?revision=${String(body.revision)}&draft=${draft}`,
      done: ({ params, body }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'parts')}?revision=${String(body.revision)}&saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    saveParts({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
