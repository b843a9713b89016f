import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { withdrawOrder } from '@/lib/services/orders/withdraw-order'

export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    form: {
      name: 'withdraw',
      back: ({ params, draft }) => `${paths.accountOrderWithdraw(params.order)}?draft=${draft}`,
      done: ({ params }) => paths.accountOrder(params.order),
    },
  },
  ({ actor, params, now }) => withdrawOrder({ actor, orderId: params.order, now }),
)
