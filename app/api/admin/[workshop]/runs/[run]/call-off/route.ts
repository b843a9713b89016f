import { readTypedForm } from '@/lib/contracts/run-forms'
import { type BulkAnswer, CallOffBody, RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { callOffRun } from '@/lib/services/runs/call-off-run'

export const POST = route(
  {
    deed: 'run:call_off',
    params: RunParams,
    body: CallOffBody,
    status: 202,
    form: {
      name: 'run-call-off',
      reads: readTypedForm,
      back: ({ params, draft }) =>
        `${paths.adminRunDeed(params.workshop, params.run, 'call-off')}?draft=${draft}`,
      done: ({ params, value }) => paths.adminBulk(params.workshop, (value as BulkAnswer).bulk),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    callOffRun({ actor, workshopId: workshop.id, runId: params.run, ...body, now }),
)
