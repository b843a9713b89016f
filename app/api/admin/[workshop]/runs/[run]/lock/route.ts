import { readLockForm } from '@/lib/contracts/run-forms'
import { type BulkAnswer, LockBody, RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { lockRun } from '@/lib/services/runs/lock-run'

export const POST = route(
  {
    deed: 'run:lock',
    params: RunParams,
    body: LockBody,
    status: 202,
    form: {
      name: 'run-lock',
      reads: readLockForm,
      back: ({ params, draft }) =>
        `${paths.adminRunDeed(params.workshop, params.run, 'lock')}?draft=${draft}`,
      done: ({ params, value }) => paths.adminBulk(params.workshop, (value as BulkAnswer).bulk),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    lockRun({ actor, workshopId: workshop.id, runId: params.run, input: body, now }),
)
