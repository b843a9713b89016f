import { type BulkAnswer, MoveDecideByInput, RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { moveDecideBy } from '@/lib/services/runs/move-decide-by'

export const POST = route(
  {
    deed: 'run:move_decide_by',
    params: RunParams,
    body: MoveDecideByInput,
    form: {
      name: 'run-move-decide-by',
      back: ({ params, draft }) =>
        `${paths.adminRunDeed(params.workshop, params.run, 'move-decide-by')}?draft=${draft}`,
      done: ({ params, value }) => paths.adminBulk(params.workshop, (value as BulkAnswer).bulk),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    moveDecideBy({ actor, workshopId: workshop.id, runId: params.run, decideBy: body.decideBy, now }),
)
