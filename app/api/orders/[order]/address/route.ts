import { z } from 'zod'
import { AddressInput } from '@/lib/contracts/address'
import { uuid } from '@/lib/contracts/fields'
import { refuseFields } from '@/lib/contracts/problem'
import { ok } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { getOrder } from '@/lib/queries/orders/get-order'
import { setAddress } from '@/lib/services/orders/set-address'

const change = route(
  {
    signedIn: true,
    params: z.object({ order: uuid }),
    body: AddressInput,
    form: {
      name: 'address',
      back: ({ params, draft }) => `${paths.accountOrderAddress(params.order)}?draft=${draft}`,
      done: ({ params }) => paths.accountOrder(params.order),
    },
  },
  async ({ actor, params, body, now }) => {
    const set = await setAddress({ actor, orderId: params.order, address: body, now })
    if (set.ok) return ok(await getOrder({ actor, orderId: params.order, now }))
    if (!('errors' in set)) return set
    // The body is the address itself, so its fields have no prefix here.
    const own = Object.entries(set.errors).map(([field, words]) => [field.replace(/^address\./, ''), words])
    return refuseFields(Object.fromEntries(own))
  },
)

export const PUT = change
/** The same for a form without script. */
export const POST = change
