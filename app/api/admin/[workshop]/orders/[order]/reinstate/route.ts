import { OrderParams } from '@/lib/contracts/orders'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { reinstateOrder } from '@/lib/services/balances/reinstate-order'

export const POST = route(
  {
    deed: 'order:reinstate',
    params: OrderParams,
    form: {
      name: 'order-desk',
      back: ({ params, draft }) => `${paths.adminOrder(params.workshop, params.order)}?draft=${draft}`,
      done: ({ params }) => paths.adminOrder(params.workshop, params.order),
    },
  },
  ({ actor, workshop, params, now }) =>
    reinstateOrder({ actor, workshopId: workshop.id, orderId: params.order, now }),
)
