import { PlanInput } from '@/lib/contracts/plan-forms'
import { RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveRunPlan } from '@/lib/services/runs/save-run-plan'

export const POST = route(
  {
    deed: 'cost:write',
    params: RunParams,
    body: PlanInput,
    form: {
      name: 'run-plan',
      back: ({ params, draft }) =>
        `${paths.adminRunPage(params.workshop, params.run, 'costs')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminRunPage(params.workshop, params.run, 'costs')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    saveRunPlan({ actor, workshopId: workshop.id, runId: params.run, input: body, now }),
)
