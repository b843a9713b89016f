import type { Row } from './roles'

/**
 * The pages and the sandbox's calls, asked of the running application: visitor, customer, owner, bench, packer, host,
 * owner of another workshop. 307 leads to the sign-in page; what somebody may not see does not exist (404).
 */
export const PAGE_TABLE: Readonly<Record<string, Row>> = {
  'PAGE /account/code': '307 200 200 200 200 200 200',
  'PAGE /admin/[workshop]': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/new': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/[module]': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/[module]/facts': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/[module]/offers': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/[module]/parts': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/[module]/plan': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/modules/[module]/revisions': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/payment-account': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/settings': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/settings/destinations': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/settings/members': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/settings/postage': '307 404 200 404 404 404 404',
  'PAGE /admin/[workshop]/settings/terms': '307 404 200 404 404 404 404',
  'PAGE /host': '307 404 404 404 404 200 404',
  // A link nobody was sent: said so, to whoever is signed in.
  'PAGE /join/[token]': '307 200 200 200 200 200 200',
  'PAGE /packing/[workshop]': '307 404 200 404 200 404 404',
  'PAGE /packing/[workshop]/papers/list': '307 404 200 404 200 404 404',
  'PAGE /packing/[workshop]/papers/slips': '307 404 200 404 200 404 404',
  'PAGE /packing/[workshop]/parcels/[parcel]': '307 404 200 404 200 404 404',
  'PAGE /packing/[workshop]/parcels/[parcel]/slip': '307 404 200 404 200 404 404',
  'PAGE /sandbox/pieces': '200 200 200 200 200 200 200',
  'PAGE /signin': '200 200 200 200 200 200 200',
  'PAGE /signin/link/[token]': '200 200 200 200 200 200 200',
  'PAGE /signin/sent': '200 200 200 200 200 200 200',
  'PAGE /start': '307 200 200 200 200 200 200',
}
