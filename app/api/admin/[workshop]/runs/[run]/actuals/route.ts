import { ActualsInput } from '@/lib/contracts/run-outcome'
import { RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { saveActuals } from '@/lib/services/runs/save-actuals'

export const POST = route(
  {
    deed: 'outcome:write',
    params: RunParams,
    body: ActualsInput,
    form: {
      name: 'run-actuals',
      back: ({ params, draft }) =>
        `${paths.adminRunPage(params.workshop, params.run, 'outcome')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminRunPage(params.workshop, params.run, 'outcome')}?saved=actuals`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    saveActuals({ actor, workshopId: workshop.id, runId: params.run, input: body, now }),
)
