import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { OrderChangeInput, readOrderForm } from '@/lib/contracts/orders'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { changeOrder } from '@/lib/services/orders/change-order'

export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    body: OrderChangeInput,
    idempotent: true,
    form: {
      name: 'order-change',
      reads: readOrderForm,
      back: ({ params, draft }) => `${paths.accountOrderChange(params.order)}?draft=${draft}`,
      done: ({ params }) => paths.accountOrder(params.order),
    },
  },
  ({ actor, params, body, now }) => changeOrder({ actor, orderId: params.order, input: body, now }),
)
