import { RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { openRun } from '@/lib/services/runs/open-run'

export const POST = route(
  {
    deed: 'run:open_deposits',
    params: RunParams,
    status: 202,
    form: {
      name: 'run-open',
      back: ({ params, draft }) =>
        `${paths.adminRunDeed(params.workshop, params.run, 'open')}?draft=${draft}`,
      done: ({ params }) => paths.adminRun(params.workshop, params.run),
    },
  },
  ({ actor, workshop, params, now }) => openRun({ actor, workshopId: workshop.id, runId: params.run, now }),
)
