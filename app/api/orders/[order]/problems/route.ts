import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { ReportProblemInput } from '@/lib/contracts/problems'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { reportProblem } from '@/lib/services/problems/report-problem'

export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    body: ReportProblemInput,
    status: 201,
    form: {
      name: 'problem',
      back: ({ params, draft }) => `${paths.accountOrder(params.order)}?draft=${draft}#problems`,
      done: ({ params }) => `${paths.accountOrder(params.order)}#problems`,
    },
  },
  ({ actor, params, body, now }) => reportProblem({ actor, orderId: params.order, input: body, now }),
)
