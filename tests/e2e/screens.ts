/** Where the things of the demo are; printed by fixtures/demo-addresses.ts. */
export type Found = Record<
  | 'rowlock'
  | 'fairlead'
  | 'order'
  | 'buyer'
  | 'posted'
  | 'receiver'
  | 'open'
  | 'packed'
  | 'handedOver'
  | 'bulk'
  | 'part',
  string
>

/** Who looks at a screen; `buyer` and `receiver` are customers of the demo. */
export type Looker = 'visitor' | 'buyer' | 'receiver' | 'owner' | 'packer' | 'host'

const TOKEN = 'x'.repeat(43)
const ADMIN = '/admin/hollow-pier'
const ROWLOCK = `${ADMIN}/modules/rowlock`

/** Every page of the application by its route, at addresses of the demo; a page may stand here in several states. */
export const SCREENS: Readonly<Record<string, { by: Looker; at: (found: Found) => string[] }>> = {
  '/': { by: 'visitor', at: () => ['/'] },
  '/terms': { by: 'visitor', at: () => ['/terms'] },
  '/privacy': { by: 'visitor', at: () => ['/privacy'] },
  '/accessibility': { by: 'visitor', at: () => ['/accessibility'] },
  '/signin': { by: 'visitor', at: () => ['/signin'] },
  '/signin/sent': { by: 'visitor', at: () => ['/signin/sent'] },
  '/signin/link/[token]': { by: 'visitor', at: () => [`/signin/link/${TOKEN}`] },
  '/confirm/[token]': { by: 'visitor', at: () => [`/confirm/${TOKEN}`] },
  '/take-back/[token]': { by: 'visitor', at: () => [`/take-back/${TOKEN}`] },
  '/unsubscribe/[token]': { by: 'visitor', at: () => [`/unsubscribe/${TOKEN}`] },
  '/w/[workshop]': { by: 'visitor', at: () => ['/w/hollow-pier', '/w/fen-lamp'] },
  '/w/[workshop]/[module]': {
    by: 'visitor',
    at: () => [
      '/w/hollow-pier/rowlock',
      '/w/hollow-pier/fairlead',
      '/w/hollow-pier/kedge',
      '/w/fen-lamp/reedmace',
    ],
  },
  '/w/[workshop]/[module]/sent': { by: 'visitor', at: () => ['/w/hollow-pier/rowlock/sent'] },
  // Leads back to the module's page; the form with its mistakes is looked at in journeys/without-script.spec.ts.
  '/w/[workshop]/[module]/form/[draft]': {
    by: 'visitor',
    at: () => [`/w/hollow-pier/rowlock/form/${TOKEN}`],
  },
  '/sandbox': { by: 'visitor', at: () => ['/sandbox'] },
  '/sandbox/mail': { by: 'visitor', at: () => ['/sandbox/mail'] },
  '/sandbox/pieces': { by: 'visitor', at: () => ['/sandbox/pieces'] },

  '/account': { by: 'buyer', at: () => ['/account'] },
  '/account/code': { by: 'buyer', at: () => ['/account/code'] },
  '/account/order/[workshop]/[module]': {
    by: 'buyer',
    at: () => ['/account/order/hollow-pier/rowlock', '/account/order/hollow-pier/kedge'],
  },
  // Leads back to the form; the page itself is looked at in the journeys.
  '/account/order/[workshop]/[module]/check': {
    by: 'buyer',
    at: () => ['/account/order/hollow-pier/rowlock/check'],
  },
  '/account/orders/[order]': { by: 'buyer', at: ({ order }) => [`/account/orders/${order}`] },
  '/account/orders/[order]/address': { by: 'buyer', at: ({ order }) => [`/account/orders/${order}/address`] },
  '/account/orders/[order]/cancel': { by: 'buyer', at: ({ order }) => [`/account/orders/${order}/cancel`] },
  '/account/orders/[order]/change': { by: 'buyer', at: ({ order }) => [`/account/orders/${order}/change`] },
  // Leads back to the form; what it shows is looked at in the journeys.
  '/account/orders/[order]/change/check': {
    by: 'buyer',
    at: ({ order }) => [`/account/orders/${order}/change/check`],
  },
  '/start': { by: 'buyer', at: () => ['/start'] },
  '/join/[token]': { by: 'buyer', at: () => [`/join/${TOKEN}`] },

  '/admin/[workshop]': { by: 'owner', at: () => [ADMIN] },
  '/admin/[workshop]/payment-account': { by: 'owner', at: () => [`${ADMIN}/payment-account`] },
  '/admin/[workshop]/settings': { by: 'owner', at: () => [`${ADMIN}/settings`] },
  '/admin/[workshop]/settings/destinations': { by: 'owner', at: () => [`${ADMIN}/settings/destinations`] },
  '/admin/[workshop]/settings/members': { by: 'owner', at: () => [`${ADMIN}/settings/members`] },
  '/admin/[workshop]/settings/postage': { by: 'owner', at: () => [`${ADMIN}/settings/postage`] },
  '/admin/[workshop]/settings/terms': { by: 'owner', at: () => [`${ADMIN}/settings/terms`] },
  '/admin/[workshop]/orders/[order]': { by: 'owner', at: ({ order }) => [`${ADMIN}/orders/${order}`] },
  '/admin/[workshop]/runs/[run]/orders/new': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/orders/new`],
  },
  '/account/orders/[order]/withdraw': {
    by: 'receiver',
    at: ({ posted }) => [`/account/orders/${posted}/withdraw`],
  },
  '/admin/[workshop]/money/books': { by: 'owner', at: () => [`${ADMIN}/money/books`] },
  '/admin/[workshop]/runs/[run]/money': {
    by: 'owner',
    at: ({ fairlead }) => [`${ADMIN}/runs/${fairlead}/money`],
  },
  '/admin/[workshop]/money/invoices': { by: 'owner', at: () => [`${ADMIN}/money/invoices`] },
  '/admin/[workshop]/money/tax': { by: 'owner', at: () => [`${ADMIN}/money/tax`] },
  '/admin/[workshop]/modules': { by: 'owner', at: () => [`${ADMIN}/modules`] },
  '/admin/[workshop]/modules/new': { by: 'owner', at: () => [`${ADMIN}/modules/new`] },
  '/admin/[workshop]/modules/[module]': { by: 'owner', at: () => [ROWLOCK] },
  '/admin/[workshop]/modules/[module]/facts': { by: 'owner', at: () => [`${ROWLOCK}/facts`] },
  '/admin/[workshop]/modules/[module]/files': { by: 'owner', at: () => [`${ROWLOCK}/files`] },
  '/admin/[workshop]/modules/[module]/offers': { by: 'owner', at: () => [`${ROWLOCK}/offers?offer=kit`] },
  '/admin/[workshop]/modules/[module]/parts': { by: 'owner', at: () => [`${ROWLOCK}/parts`] },
  '/admin/[workshop]/modules/[module]/parts/[part]': {
    by: 'owner',
    at: ({ part }) => [`${ROWLOCK}/parts/${part}`],
  },
  '/admin/[workshop]/modules/[module]/parts/import': {
    by: 'owner',
    at: () => [`${ROWLOCK}/parts/import`, `${ROWLOCK}/parts/import?kind=quotes`],
  },
  '/admin/[workshop]/modules/[module]/plan': { by: 'owner', at: () => [`${ROWLOCK}/plan`] },
  '/admin/[workshop]/modules/[module]/preview': { by: 'owner', at: () => [`${ROWLOCK}/preview`] },
  '/admin/[workshop]/modules/[module]/revisions': { by: 'owner', at: () => [`${ROWLOCK}/revisions`] },
  '/admin/[workshop]/runs': { by: 'owner', at: () => [`${ADMIN}/runs`] },
  '/admin/[workshop]/runs/new': {
    by: 'owner',
    at: () => [`${ADMIN}/runs/new`, `${ADMIN}/runs/new?module=kedge`],
  },
  '/admin/[workshop]/runs/[run]': {
    by: 'owner',
    at: ({ rowlock, fairlead }) => [`${ADMIN}/runs/${rowlock}`, `${ADMIN}/runs/${fairlead}`],
  },
  '/admin/[workshop]/runs/[run]/orders': {
    by: 'owner',
    at: ({ fairlead }) => [`${ADMIN}/runs/${fairlead}/orders`],
  },
  '/admin/[workshop]/runs/[run]/costs': {
    by: 'owner',
    at: ({ rowlock, fairlead }) => [`${ADMIN}/runs/${rowlock}/costs`, `${ADMIN}/runs/${fairlead}/costs`],
  },
  '/admin/[workshop]/runs/[run]/schedule': {
    by: 'owner',
    at: ({ rowlock }) => [
      `${ADMIN}/runs/${rowlock}/schedule`,
      `${ADMIN}/runs/${rowlock}/schedule?step=1&days=10`,
    ],
  },
  '/admin/[workshop]/runs/[run]/what-ifs': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/what-ifs`],
  },
  '/admin/[workshop]/runs/[run]/open': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/open`],
  },
  '/admin/[workshop]/runs/[run]/lock': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/lock`],
  },
  '/admin/[workshop]/runs/[run]/call-off': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/call-off`],
  },
  '/admin/[workshop]/record': { by: 'owner', at: () => [`${ADMIN}/record`] },
  '/admin/[workshop]/modules/[module]/interest': { by: 'owner', at: () => [`${ROWLOCK}/interest`] },
  '/admin/[workshop]/runs/[run]/demand': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/demand`],
  },
  '/admin/[workshop]/runs/[run]/outcome': {
    by: 'owner',
    at: ({ fairlead }) => [`${ADMIN}/runs/${fairlead}/outcome`],
  },
  '/admin/[workshop]/runs/[run]/lower-minimum': {
    by: 'owner',
    at: ({ rowlock }) => [
      `${ADMIN}/runs/${rowlock}/lower-minimum`,
      `${ADMIN}/runs/${rowlock}/lower-minimum?minimum=20`,
    ],
  },
  '/admin/[workshop]/runs/[run]/move-decide-by': {
    by: 'owner',
    at: ({ rowlock }) => [`${ADMIN}/runs/${rowlock}/move-decide-by`],
  },
  '/admin/[workshop]/runs/[run]/ask-balances': {
    by: 'owner',
    at: ({ fairlead }) => [`${ADMIN}/runs/${fairlead}/ask-balances`],
  },
  '/admin/[workshop]/bulk/[bulk]': { by: 'owner', at: ({ bulk }) => [`${ADMIN}/bulk/${bulk}`] },

  '/admin/[workshop]/runs/[run]/units': {
    by: 'owner',
    at: ({ fairlead }) => [`${ADMIN}/runs/${fairlead}/units`],
  },
  '/admin/[workshop]/problems': { by: 'owner', at: () => [`${ADMIN}/problems`] },
  '/packing/[workshop]': {
    by: 'packer',
    at: () => [
      '/packing/hollow-pier',
      '/packing/hollow-pier?show=packed',
      '/packing/hollow-pier?show=handed_over',
    ],
  },
  '/packing/[workshop]/papers/list': { by: 'packer', at: () => ['/packing/hollow-pier/papers/list'] },
  '/packing/[workshop]/papers/slips': { by: 'packer', at: () => ['/packing/hollow-pier/papers/slips'] },
  '/packing/[workshop]/post': { by: 'packer', at: () => ['/packing/hollow-pier/post'] },
  // Nobody of the demo has taken a batch; the page is asked for in the table of roles.
  '/packing/[workshop]/batches/[batch]': { by: 'packer', at: () => [] },
  '/packing/[workshop]/papers/[paper]': {
    by: 'packer',
    at: () =>
      ['labels', 'customs', 'invoices', 'returns', 'bags', 'hand-over'].map(
        (paper) => `/packing/hollow-pier/papers/${paper}`,
      ),
  },
  '/packing/[workshop]/parcels/[parcel]': {
    by: 'packer',
    at: ({ open, packed, handedOver }) =>
      [open, packed, handedOver].map((id) => `/packing/hollow-pier/parcels/${id}`),
  },
  '/packing/[workshop]/parcels/[parcel]/slip': {
    by: 'packer',
    at: ({ open }) => [`/packing/hollow-pier/parcels/${open}/slip`],
  },

  '/host': { by: 'host', at: () => ['/host'] },
}
