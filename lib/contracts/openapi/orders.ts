import { z } from 'zod'
import { AddressInput } from '../address'
import { OrderInput, PayInput } from '../orders'
import { ReportProblemInput } from '../problems'
import type { Operation } from './operation'

/** What customers call. */
export const ORDER_OPERATIONS: readonly Operation[] = [
  {
    method: 'GET',
    path: '/api/account/orders',
    summary: 'One’s own orders, newest first',
    deed: 'order:list_own',
    query: z.object({ after: z.string().max(100).optional() }),
    answer: '{items: OrderView[], next}',
  },
  {
    method: 'POST',
    path: '/api/orders',
    summary: 'Order with obligation to pay: take a place, or the next on the waiting list',
    deed: 'order:place',
    body: OrderInput,
    isIdempotent: true,
    status: 201,
    answer: 'OrderPlaced',
  },
  {
    method: 'POST',
    path: '/api/orders/draft',
    summary: 'Price an order before it is placed; nothing is taken yet',
    deed: 'order:place',
    body: OrderInput,
    answer: 'the page that shows what is to be checked',
  },
  {
    method: 'POST',
    path: '/api/orders/{order}/pay',
    summary: 'Where to pay what is due; the same page again while it is open',
    deed: 'self',
    body: PayInput,
    isIdempotent: true,
    answer: '{payUrl}',
  },
  {
    method: 'POST',
    path: '/api/orders/{order}/cancel',
    summary: 'Cancel; before the lock everything is paid back',
    deed: 'self',
    answer: '{state, refundMinor}',
  },
  {
    method: 'POST',
    path: '/api/orders/{order}/check',
    summary: 'Ask the provider what became of a payment',
    deed: 'self',
    answer: 'OrderView',
  },
  ...(['PUT', 'POST'] as const).map((method): Operation => ({
    method,
    path: '/api/orders/{order}/address',
    summary: 'Send it elsewhere, until it is packed',
    deed: 'self',
    body: AddressInput,
    answer: 'OrderView',
  })),
  {
    method: 'POST',
    path: '/api/orders/{order}/problems',
    summary: 'Report a problem with what arrived, or did not',
    deed: 'self',
    body: ReportProblemInput,
    status: 201,
    answer: '{problem}',
  },
]
