import { LessonInput, ModuleParams } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { writeLesson } from '@/lib/services/modules/write-lesson'

export const POST = route(
  {
    deed: 'lesson:write',
    params: ModuleParams,
    body: LessonInput,
    form: {
      name: 'lesson',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'revisions')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    writeLesson({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
