import { CancelForBuyerInput, OrderParams } from '@/lib/contracts/orders'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { cancelForBuyer } from '@/lib/services/orders/cancel-for-buyer'

export const POST = route(
  {
    deed: 'order:cancel_for_buyer',
    params: OrderParams,
    body: CancelForBuyerInput,
    form: {
      name: 'order-cancel-desk',
      back: ({ params, draft }) => `${paths.adminOrder(params.workshop, params.order)}?draft=${draft}`,
      done: ({ params }) => paths.adminOrder(params.workshop, params.order),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    cancelForBuyer({ actor, workshopId: workshop.id, orderId: params.order, reason: body.reason, now }),
)
