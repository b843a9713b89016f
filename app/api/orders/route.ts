import { OrderInput, readOrderForm, type OrderPlaced } from '@/lib/contracts/orders'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { placeOrder } from '@/lib/services/orders/place-order'

export const POST = route(
  {
    deed: 'order:place',
    body: OrderInput,
    status: 201,
    idempotent: true,
    form: {
      name: 'order',
      reads: readOrderForm,
      // The form says where it stands, so that its mistakes come back to it.
      back: ({ body, draft }) =>
        `${paths.orderForm(String(body.workshop), String(body.module))}?draft=${draft}`,
      done: ({ value }) => {
        const { order, payUrl } = value as OrderPlaced
        return payUrl ?? paths.accountOrder(order)
      },
    },
  },
  ({ actor, body, now }) => placeOrder({ actor, input: body, now }),
)
