import { ModuleParams } from '@/lib/contracts/module-forms'
import { PlanInput } from '@/lib/contracts/plan-forms'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { savePlan } from '@/lib/services/modules/save-plan'

export const POST = route(
  {
    deed: 'plan:write',
    params: ModuleParams,
    body: PlanInput,
    form: {
      name: 'plan',
      back: ({ params, draft }) =>
        `${paths.adminModulePage(params.workshop, params.module, 'plan')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminModulePage(params.workshop, params.module, 'plan')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    savePlan({ actor, workshopId: workshop.id, module: params.module, input: body, now }),
)
