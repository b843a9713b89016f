import { LowerMinimumInput, RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { lowerMinimum } from '@/lib/services/runs/lower-minimum'

export const POST = route(
  {
    deed: 'run:lower_minimum',
    params: RunParams,
    body: LowerMinimumInput,
    form: {
      name: 'run-lower-minimum',
      back: ({ params, draft }) => `${paths.adminRun(params.workshop, params.run)}?draft=${draft}`,
      done: ({ params }) => paths.adminRun(params.workshop, params.run),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    lowerMinimum({ actor, workshopId: workshop.id, runId: params.run, minimum: body.minimum, now }),
)
