import { RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { closeRun } from '@/lib/services/runs/close-run'

export const POST = route(
  {
    deed: 'run:close',
    params: RunParams,
    form: {
      name: 'run-close',
      back: ({ params, draft }) => `${paths.adminRun(params.workshop, params.run)}?draft=${draft}`,
      done: ({ params }) => paths.adminRun(params.workshop, params.run),
    },
  },
  ({ actor, workshop, params, now }) => closeRun({ actor, workshopId: workshop.id, runId: params.run, now }),
)
