import { ModuleParams, SampleInput } from '@/lib/contracts/module-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { recordSampleCheck } from '@/lib/services/modules/record-sample-check'

export const POST = route(
  {
    deed: 'part:check_sample',
    params: ModuleParams,
    body: SampleInput,
    form: {
      name: 'module-deed',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'parts')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'parts')}?saved=1`,
    },
  },
  ({ actor, workshop, body, now }) => recordSampleCheck({ actor, workshopId: workshop.id, input: body, now }),
)
