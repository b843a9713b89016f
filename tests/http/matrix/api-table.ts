import type { Row } from './roles'

/**
 * Who is answered what, written by hand: visitor, customer, owner, bench, packer, host, owner of another workshop. The
 * workshop, module, run and parcel are Hollow Pier's, the order is the customer's. The body is `{}`, so that 422 says
 * "let in, then asked for more"; 409 "let in, then the state refused".
 */
export const API_TABLE: Readonly<Record<string, Row>> = {
  'GET /api/account/orders': '401 200 200 200 200 200 200',
  'POST /api/account/second-factor': '401 422 422 422 422 422 422',
  'GET /api/admin/[workshop]': '401 404 200 404 404 404 404',
  'POST /api/admin/[workshop]/modules': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]': '401 404 422 404 404 404 404',
  // A run of the small world's module takes deposits.
  'POST /api/admin/[workshop]/modules/[module]/archive': '401 404 409 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/first-unit': '401 404 422 422 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/lessons': '401 404 422 422 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/lessons/mend': '401 404 422 422 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/lessons/waive': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/offers': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/parts': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/plan': '401 404 422 404 404 404 404',
  // It is published already, which is no mistake.
  'POST /api/admin/[workshop]/modules/[module]/publish': '401 404 200 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/revisions': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/modules/[module]/samples': '401 404 422 422 404 404 404',
  'POST /api/admin/[workshop]/settings/destinations': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/details': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/members': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/members/remove': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/members/withdraw': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/postage': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/postage/remove': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/settings/terms': '401 404 422 404 404 404 404',
  // The account of the small world is not in the provider's books: the owner gets as far as the provider.
  'POST /api/admin/[workshop]/payment-account': '401 404 409 404 404 404 404',
  'GET /api/admin/[workshop]/bulk/[bulk]': '401 404 200 404 404 404 404',
  'GET /api/admin/[workshop]/runs': '401 404 200 404 404 404 404',
  'POST /api/admin/[workshop]/runs': '401 404 422 404 404 404 404',
  'GET /api/admin/[workshop]/runs/[run]': '401 404 200 404 404 404 404',
  'POST /api/admin/[workshop]/runs/[run]/ask-balances': '401 404 409 404 404 404 404',
  'POST /api/admin/[workshop]/runs/[run]/call-off': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/runs/[run]/close': '401 404 409 404 404 404 404',
  'POST /api/admin/[workshop]/runs/[run]/lock': '401 404 409 404 404 404 404',
  'POST /api/admin/[workshop]/runs/[run]/lower-minimum': '401 404 422 404 404 404 404',
  'POST /api/admin/[workshop]/runs/[run]/open': '401 404 409 404 404 404 404',
  'GET /api/auth/[...nextauth]': '405 405 405 405 405 405 405',
  'POST /api/auth/[...nextauth]': '404 404 404 404 404 404 404',
  'POST /api/host/workshops/[workshop]/[move]': '401 404 404 404 404 409 404',
  'POST /api/orders': '401 422 422 422 422 422 422',
  'POST /api/orders/draft': '401 422 422 422 422 422 422',
  // The body is read before the order is looked for: nobody learns whether it exists.
  'POST /api/orders/[order]/address': '401 422 422 422 422 422 422',
  'PUT /api/orders/[order]/address': '401 422 422 422 422 422 422',
  'POST /api/orders/[order]/cancel': '401 200 404 404 404 404 404',
  'POST /api/orders/[order]/check': '401 200 404 404 404 404 404',
  // By then the customer has cancelled it.
  'POST /api/orders/[order]/pay': '401 409 404 404 404 404 404',
  'GET /api/health': '200 200 200 200 200 200 200',
  'GET /api/openapi.json': '200 200 200 200 200 200 200',
  'GET /api/w/[workshop]/[module]': '200 200 200 200 200 200 200',
  // A mail program without one click is led to the page that asks.
  'GET /api/unsubscribe/[token]': '303 303 303 303 303 303 303',
  'POST /api/unsubscribe/[token]': '404 404 404 404 404 404 404',
  'GET /api/packing/[workshop]/list.pdf': '401 404 200 404 200 404 404',
  'GET /api/packing/[workshop]/parcels/[parcel]/slip.pdf': '401 404 200 404 200 404 404',
  'GET /api/packing/[workshop]/queue': '401 404 200 404 200 404 404',
  // Nothing is in the queue: there is nothing to print.
  'GET /api/packing/[workshop]/slips.pdf': '401 404 404 404 404 404 404',
  'POST /api/packing/[workshop]/fill': '401 404 200 404 200 404 404',
  'POST /api/packing/[workshop]/parcels/[parcel]/hand-over': '401 404 422 404 422 404 404',
  'POST /api/packing/[workshop]/parcels/[parcel]/pack': '401 404 422 404 422 404 404',
  'POST /api/packing/[workshop]/parcels/[parcel]/reopen': '401 404 409 404 409 404 404',
  'POST /api/signin': '422 422 422 422 422 422 422',
  'POST /api/signin/code': '422 422 422 422 422 422 422',
  'POST /api/signout': '401 200 200 200 200 200 200',
  'POST /api/signups': '422 422 422 422 422 422 422',
  'POST /api/signups/confirm': '422 422 422 422 422 422 422',
  'POST /api/signups/take-back': '422 422 422 422 422 422 422',
  'POST /api/webhooks/stripe': '400 400 400 400 400 400 400',
  'POST /api/workshops': '401 422 422 422 422 422 422',
  'POST /api/workshops/join': '401 422 422 422 422 422 422',
}
