import { RunParams } from '@/lib/contracts/runs'
import { WhatIfInput } from '@/lib/contracts/what-ifs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { addWhatIf } from '@/lib/services/runs/add-what-if'

export const POST = route(
  {
    deed: 'cost:write',
    params: RunParams,
    body: WhatIfInput,
    form: {
      name: 'what-if',
      back: ({ params, draft }) =>
        `${paths.adminRunPage(params.workshop, params.run, 'what-ifs')}?draft=${draft}`,
      done: ({ params }) => `${paths.adminRunPage(params.workshop, params.run, 'what-ifs')}?saved=1`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    addWhatIf({ actor, workshopId: workshop.id, runId: params.run, input: body, now }),
)
