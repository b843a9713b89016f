import { z } from 'zod'
import { ok } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { listOwnOrders } from '@/lib/queries/orders/list-own-orders'

export const GET = route(
  { deed: 'order:list_own', query: z.object({ after: z.string().max(100).optional() }) },
  async ({ actor, query, now }) => ok(await listOwnOrders({ actor, after: query.after, now })),
)
