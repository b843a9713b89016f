import { OrderParams } from '@/lib/contracts/orders'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { receiveReturn } from '@/lib/services/returns/receive-return'

export const POST = route(
  {
    deed: 'order:receive_return',
    params: OrderParams,
    form: {
      name: 'order-desk',
      back: ({ params, draft }) => `${paths.adminOrder(params.workshop, params.order)}?draft=${draft}`,
      done: ({ params }) => paths.adminOrder(params.workshop, params.order),
    },
  },
  ({ actor, workshop, params, now }) =>
    receiveReturn({ actor, workshopId: workshop.id, orderId: params.order, now }),
)
