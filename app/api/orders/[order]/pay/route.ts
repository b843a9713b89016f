import { z } from 'zod'
import { PayInput, type PayAnswer } from '@/lib/contracts/orders'
import { uuid } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { payOrder } from '@/lib/services/payments/pay-order'

export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    body: PayInput,
    idempotent: true,
    form: {
      name: 'pay',
      back: ({ params, draft }) => `${paths.accountOrder(params.order)}?draft=${draft}`,
      done: ({ value }) => (value as PayAnswer).payUrl,
    },
  },
  ({ actor, params, body, now }) =>
    payOrder({ actor, orderId: params.order, otherCard: body.otherCard ?? false, now }),
)
