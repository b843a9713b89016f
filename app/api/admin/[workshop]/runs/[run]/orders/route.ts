import { EnterOrderInput, readOrderForm } from '@/lib/contracts/orders'
import { RunParams } from '@/lib/contracts/runs'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { enterOrder } from '@/lib/services/orders/enter-order'

export const POST = route(
  {
    deed: 'order:enter',
    params: RunParams,
    body: EnterOrderInput,
    idempotent: true,
    status: 201,
    form: {
      name: 'order-enter',
      reads: readOrderForm,
      back: ({ params, draft }) => `${paths.adminOrderNew(params.workshop, params.run)}?draft=${draft}`,
      done: ({ params, value }) => paths.adminOrder(params.workshop, (value as { order: string }).order),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    enterOrder({ actor, workshopId: workshop.id, runId: params.run, input: body, now }),
)
