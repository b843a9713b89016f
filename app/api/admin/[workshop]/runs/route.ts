import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { readRunForm } from '@/lib/contracts/run-forms'
import { RunInput, RunsQuery } from '@/lib/contracts/runs'
import { ok } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { listRuns } from '@/lib/queries/runs/list-runs'
import { createRun } from '@/lib/services/runs/create-run'

const params = z.object({ workshop: slug })

export const GET = route({ deed: 'run:list', params, query: RunsQuery }, async ({ actor, workshop, query }) =>
  ok(await listRuns({ actor, workshopId: workshop.id, after: query.after })),
)

export const POST = route(
  {
    deed: 'run:create',
    params,
    body: RunInput,
    status: 201,
    form: {
      name: 'run',
      reads: readRunForm,
      back: ({ params, body, draft }) =>
        `${paths.adminRunNew(params.workshop)}?module=${encodeURIComponent(String(body.module))}&draft=${draft}`,
      done: ({ params, value }) => paths.adminRun(params.workshop, (value as { run: string }).run),
    },
  },
  ({ actor, workshop, body, now }) => createRun({ actor, workshopId: workshop.id, input: body, now }),
)
