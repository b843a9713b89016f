import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { cancelOrder } from '@/lib/services/orders/cancel-order'

export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    form: {
      name: 'cancel',
      back: ({ params, draft }) => `${paths.accountOrderCancel(params.order)}?draft=${draft}`,
      done: ({ params }) => paths.accountOrder(params.order),
    },
  },
  ({ actor, params, now }) => cancelOrder({ actor, orderId: params.order, now }),
)
