import { OrderInput, readOrderForm } from '@/lib/contracts/orders'
import { keepFields } from '@/lib/http/keep-fields'
import { route } from '@/lib/http/route'
import { ok } from '@/lib/core/result'
import { paths } from '@/lib/paths'
import { getOrderQuote } from '@/lib/queries/orders/get-order-quote'

/** The order form's own button: prices what was typed and leads to the page where it is read once more. */
export const POST = route(
  {
    deed: 'order:place',
    body: OrderInput,
    form: {
      name: 'order',
      reads: readOrderForm,
      back: ({ body, draft }) =>
        `${paths.orderForm(String(body.workshop), String(body.module))}?draft=${draft}`,
      done: ({ value }) => (value as { next: string }).next,
    },
  },
  async ({ actor, body, now, fields }) => {
    const quote = await getOrderQuote({ actor, input: body, now })
    if (!quote.ok) return quote
    const { workshop, module } = quote.value
    if (fields === null) return ok(quote.value)
    const draft = await keepFields('order', fields)
    return ok({ ...quote.value, next: `${paths.orderCheck(workshop.slug, module.slug)}?draft=${draft}` })
  },
)
