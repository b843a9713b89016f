import { readTypedForm } from '@/lib/contracts/run-forms'
import { type BulkAnswer, Confirmed, RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { askBalances } from '@/lib/services/runs/ask-balances'

export const POST = route(
  {
    deed: 'run:ask_balances',
    params: RunParams,
    body: Confirmed,
    status: 202,
    form: {
      name: 'run-ask-balances',
      reads: readTypedForm,
      back: ({ params, draft }) =>
        `${paths.adminRunDeed(params.workshop, params.run, 'ask-balances')}?draft=${draft}`,
      done: ({ params, value }) => paths.adminBulk(params.workshop, (value as BulkAnswer).bulk),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    askBalances({ actor, workshopId: workshop.id, runId: params.run, typed: body.typed, now }),
)
