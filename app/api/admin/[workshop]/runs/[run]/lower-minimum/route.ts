import { type BulkAnswer, LowerMinimumInput, RunParams } from '@/lib/contracts/runs'
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
      back: ({ params, draft }) =>
        `${paths.adminRunDeed(params.workshop, params.run, 'lower-minimum')}?draft=${draft}`,
      done: ({ params, value }) => paths.adminBulk(params.workshop, (value as BulkAnswer).bulk),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    lowerMinimum({ actor, workshopId: workshop.id, runId: params.run, minimum: body.minimum, now }),
)
