import { ModuleParams, WaiveInput } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { waiveLesson } from '@/lib/services/modules/waive-lesson'

export const POST = route(
  {
    deed: 'lesson:waive',
    params: ModuleParams,
    body: WaiveInput,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    waiveLesson({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
