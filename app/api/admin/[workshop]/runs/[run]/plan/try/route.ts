import { CostTrial } from '@/lib/contracts/cost-desk'
import { RunParams } from '@/lib/contracts/runs'
import { ok, refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { tryCosts } from '@/lib/queries/runs/try-costs'

/** Asked at every change of the form while it is filled in. */
export const POST = route(
  { deed: 'cost:read', params: RunParams, body: CostTrial, limit: 'read' },
  async ({ actor, workshop, params, body, now }) => {
    const figures = await tryCosts({ actor, workshopId: workshop.id, runId: params.run, input: body, now })
    return figures ? ok(figures) : refuse('not_found')
  },
)
