import { MendInput, ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { mendLesson } from '@/lib/services/modules/mend-lesson'

export const POST = route(
  {
    deed: 'lesson:mend',
    params: ModuleParams,
    body: MendInput,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body }) =>
    mendLesson({ actor, workshopId: workshop.id, module: params.module, input: body }),
)
