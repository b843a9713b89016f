import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { checkPayment } from '@/lib/services/payments/check-payment'

/** Back from the card page: has it arrived? */
export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    form: {
      name: 'check',
      back: ({ params, draft }) => `${paths.accountOrder(params.order)}?draft=${draft}`,
      done: ({ params }) => paths.accountOrder(params.order),
    },
  },
  ({ actor, params, now }) => checkPayment({ actor, orderId: params.order, now }),
)
