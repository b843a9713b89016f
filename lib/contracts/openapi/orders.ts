import { z } from 'zod'
import { AddressInput } from '../address'
import { OrderInput, PayInput } from '../orders'
import { HandOverInput, PackInput, PaperQuery, QueueQuery } from '../packing'
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
]

/** What packers call. */
export const PACKING_OPERATIONS: readonly Operation[] = [
  {
    method: 'GET',
    path: '/api/packing/{workshop}/queue',
    summary: 'Parcels to pack, oldest promise first',
    deed: 'packing:read',
    query: QueueQuery,
    answer: '{items, next}',
  },
  {
    method: 'POST',
    path: '/api/packing/{workshop}/fill',
    summary: 'Open the parcels of orders that became ready',
    deed: 'parcel:open',
    answer: 'how many',
  },
  {
    method: 'POST',
    path: '/api/packing/{workshop}/parcels/{parcel}/pack',
    summary: 'Pack and weigh a parcel',
    deed: 'parcel:pack',
    body: PackInput,
    answer: 'the parcel; 409 weight_surprise',
  },
  {
    method: 'POST',
    path: '/api/packing/{workshop}/parcels/{parcel}/reopen',
    summary: 'Open a packed parcel again, until it is handed over',
    deed: 'parcel:reopen',
    answer: 'the parcel',
  },
  {
    method: 'POST',
    path: '/api/packing/{workshop}/parcels/{parcel}/hand-over',
    summary: 'Hand a packed parcel to the post; its buyer is written to',
    deed: 'parcel:hand_over',
    body: HandOverInput,
    answer: 'the parcel',
  },
  {
    method: 'GET',
    path: '/api/packing/{workshop}/list.pdf',
    summary: 'Fulfilment list',
    deed: 'paper:print',
    query: PaperQuery,
    media: 'application/pdf',
    answer: 'the paper',
  },
  {
    method: 'GET',
    path: '/api/packing/{workshop}/slips.pdf',
    summary: 'Packing slips of the queue',
    deed: 'paper:print',
    query: PaperQuery,
    media: 'application/pdf',
    answer: 'the papers',
  },
  {
    method: 'GET',
    path: '/api/packing/{workshop}/parcels/{parcel}/slip.pdf',
    summary: 'Packing slip of one parcel',
    deed: 'paper:print',
    query: PaperQuery.pick({ size: true }),
    media: 'application/pdf',
    answer: 'the paper',
  },
]
