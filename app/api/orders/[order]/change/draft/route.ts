import { z } from 'zod'
import { uuid } from '@/lib/contracts/fields'
import { OrderChangeInput, readOrderForm } from '@/lib/contracts/orders'
import { ok } from '@/lib/core/result'
import { keepFields } from '@/lib/http/keep-fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { getChangeQuote } from '@/lib/queries/orders/get-change-quote'

/** The change form's own button: prices what was typed and leads to the page where it is read once more. */
export const POST = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    body: OrderChangeInput,
    form: {
      name: 'order-change',
      reads: readOrderForm,
      back: ({ params, draft }) => `${paths.accountOrderChange(params.order)}?draft=${draft}`,
      done: ({ value }) => (value as { next: string }).next,
    },
  },
  async ({ actor, params, body, now, fields }) => {
    const quote = await getChangeQuote({ actor, orderId: params.order, input: body, now })
    if (!quote.ok) return quote
    if (fields === null) return ok(quote.value)
    const draft = await keepFields('order-change', fields)
    return ok({ ...quote.value, next: `${paths.accountOrderChangeCheck(params.order)}?draft=${draft}` })
  },
)
