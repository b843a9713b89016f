import { RunParams } from '@/lib/contracts/runs'
import { WhatIfRemoval } from '@/lib/contracts/what-ifs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { removeWhatIf } from '@/lib/services/runs/remove-what-if'

export const POST = route(
  {
    deed: 'cost:write',
    params: RunParams,
    body: WhatIfRemoval,
    form: {
      name: 'what-if-removal',
      back: ({ params, draft }) =>
        `${paths.adminRunPage(params.workshop, params.run, 'what-ifs')}?draft=${draft}`,
      done: ({ params }) => paths.adminRunPage(params.workshop, params.run, 'what-ifs'),
    },
  },
  ({ actor, workshop, params, body }) =>
    removeWhatIf({ actor, workshopId: workshop.id, runId: params.run, planId: body.plan }),
)
