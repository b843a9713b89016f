/**
 * Every address of the application. Slugs and ids are handed in as they stand in the database; each is encoded
 * here, once. Pages take `draft` when a form comes back with its mistakes (see lib/http/form-draft.ts).
 */
const part = encodeURIComponent
const asked = (query: Record<string, string | undefined>) => {
  const given = Object.entries(query).flatMap(([name, value]) =>
    value === undefined ? [] : [`${name}=${part(value)}`],
  )
  return given.length > 0 ? `?${given.join('&')}` : ''
}

type PaperKind = 'labels' | 'customs' | 'invoices' | 'returns' | 'bags' | 'hand-over'

export const paths = {
  home: '/',
  start: '/start',
  join: (token: string) => `/join/${part(token)}`,
  terms: '/terms',
  privacy: '/privacy',
  accessibility: '/accessibility',
  signIn: (next?: string) => (next ? `/signin?next=${part(next)}` : '/signin'),
  signInLink: (token: string) => `/signin/link/${part(token)}`,
  signInSent: '/signin/sent',
  secondFactor: (next?: string) => (next ? `/account/code?next=${part(next)}` : '/account/code'),

  workshop: (workshop: string) => `/w/${part(workshop)}`,
  module: (workshop: string, module: string) => `/w/${part(workshop)}/${part(module)}`,
  moduleDraft: (workshop: string, module: string, draft: string) =>
    `/w/${part(workshop)}/${part(module)}/form/${part(draft)}`,
  signUpSent: (workshop: string, module: string) => `/w/${part(workshop)}/${part(module)}/sent`,
  orderForm: (workshop: string, module: string) => `/account/order/${part(workshop)}/${part(module)}`,
  orderCheck: (workshop: string, module: string) => `/account/order/${part(workshop)}/${part(module)}/check`,
  confirm: (token: string) => `/confirm/${part(token)}`,
  takeBack: (token: string) => `/take-back/${part(token)}`,
  unsubscribe: (token: string) => `/unsubscribe/${part(token)}`,
  invitation: (token: string) => `/invitation/${part(token)}`,

  account: '/account',
  accountOrder: (order: string) => `/account/orders/${part(order)}`,
  accountOrderAddress: (order: string) => `/account/orders/${part(order)}/address`,
  accountOrderCancel: (order: string) => `/account/orders/${part(order)}/cancel`,
  accountOrderWithdraw: (order: string) => `/account/orders/${part(order)}/withdraw`,
  accountOrderChange: (order: string) => `/account/orders/${part(order)}/change`,
  accountOrderChangeCheck: (order: string) => `/account/orders/${part(order)}/change/check`,
  accountData: '/account/data',

  admin: (workshop: string) => `/admin/${part(workshop)}`,
  adminModules: (workshop: string) => `/admin/${part(workshop)}/modules`,
  adminModuleNew: (workshop: string) => `/admin/${part(workshop)}/modules/new`,
  adminModule: (workshop: string, module: string) => `/admin/${part(workshop)}/modules/${part(module)}`,
  adminModulePage: (
    workshop: string,
    module: string,
    page: 'facts' | 'offers' | 'revisions' | 'parts' | 'plan' | 'preview' | 'files' | 'interest',
  ) => `/admin/${part(workshop)}/modules/${part(module)}/${page}`,
  adminPartImport: (
    workshop: string,
    module: string,
    query: { import?: string; revision?: string; kind?: string; draft?: string } = {},
  ) => `/admin/${part(workshop)}/modules/${part(module)}/parts/import${asked(query)}`,
  adminPart: (workshop: string, module: string, id: string) =>
    `/admin/${part(workshop)}/modules/${part(module)}/parts/${part(id)}`,
  adminRecord: (workshop: string) => `/admin/${part(workshop)}/record`,
  adminRuns: (workshop: string) => `/admin/${part(workshop)}/runs`,
  adminRunNew: (workshop: string) => `/admin/${part(workshop)}/runs/new`,
  adminRun: (workshop: string, run: string) => `/admin/${part(workshop)}/runs/${part(run)}`,
  adminRunPage: (
    workshop: string,
    run: string,
    page:
      | 'demand'
      | 'outcome'
      | 'costs'
      | 'what-ifs'
      | 'schedule'
      | 'orders'
      | 'buying'
      | 'bench'
      | 'packing'
      | 'money'
      | 'messages',
  ) => `/admin/${part(workshop)}/runs/${part(run)}/${page}`,
  adminRunUnits: (workshop: string, run: string) => `/admin/${part(workshop)}/runs/${part(run)}/units`,
  adminRunDeed: (
    workshop: string,
    run: string,
    deed: 'open' | 'lock' | 'call-off' | 'ask-balances' | 'lower-minimum' | 'move-decide-by',
  ) => `/admin/${part(workshop)}/runs/${part(run)}/${deed}`,
  adminProblems: (workshop: string) => `/admin/${part(workshop)}/problems`,
  adminBulk: (workshop: string, bulk: string) => `/admin/${part(workshop)}/bulk/${part(bulk)}`,
  adminPaymentAccount: (workshop: string) => `/admin/${part(workshop)}/payment-account`,
  adminOrder: (workshop: string, order: string) => `/admin/${part(workshop)}/orders/${part(order)}`,
  adminOrderNew: (workshop: string, run: string) => `/admin/${part(workshop)}/runs/${part(run)}/orders/new`,
  adminMoney: (workshop: string, page: 'books' | 'invoices' | 'tax') =>
    `/admin/${part(workshop)}/money/${page}`,
  adminSettings: (workshop: string) => `/admin/${part(workshop)}/settings`,
  adminSettingsPage: (workshop: string, page: 'postage' | 'terms' | 'members' | 'destinations') =>
    `/admin/${part(workshop)}/settings/${page}`,
  bench: (workshop: string) => `/bench/${part(workshop)}`,
  packing: (workshop: string) => `/packing/${part(workshop)}`,
  packingParcel: (workshop: string, parcel: string) => `/packing/${part(workshop)}/parcels/${part(parcel)}`,
  packingPost: (workshop: string) => `/packing/${part(workshop)}/post`,
  packingBatch: (workshop: string, batch: string) => `/packing/${part(workshop)}/batches/${part(batch)}`,
  packingPapers: (workshop: string, paper: PaperKind | 'list' | 'slips') =>
    `/packing/${part(workshop)}/papers/${paper}`,
  packingSlip: (workshop: string, parcel: string) =>
    `/packing/${part(workshop)}/parcels/${part(parcel)}/slip`,
  host: '/host',

  sandbox: '/sandbox',
  sandboxMail: (to?: string) => (to ? `/sandbox/mail?to=${part(to)}` : '/sandbox/mail'),

  api: {
    health: '/api/health',
    file: (file: string) => `/api/files/${part(file)}`,
    openapi: '/api/openapi.json',
    auth: '/api/auth',
    signIn: '/api/signin',
    signInCode: '/api/signin/code',
    signInCallback: '/api/auth/callback/email',
    signOut: '/api/signout',
    secondFactor: '/api/account/second-factor',
    module: (workshop: string, module: string) => `/api/w/${part(workshop)}/${part(module)}`,
    signUps: '/api/signups',
    signUpConfirm: '/api/signups/confirm',
    signUpTakeBack: '/api/signups/take-back',
    unsubscribe: (token: string) => `/api/unsubscribe/${part(token)}`,
    orders: '/api/orders',
    orderDraft: '/api/orders/draft',
    orderPaid: (order: string) => `/api/orders/${part(order)}/check`,
    orderPay: (order: string) => `/api/orders/${part(order)}/pay`,
    orderCancel: (order: string) => `/api/orders/${part(order)}/cancel`,
    orderProblems: (order: string) => `/api/orders/${part(order)}/problems`,
    adminProblemAnswer: (workshop: string, problem: string) =>
      `/api/admin/${part(workshop)}/problems/${part(problem)}/answer`,
    orderAddress: (order: string) => `/api/orders/${part(order)}/address`,
    orderWithdraw: (order: string) => `/api/orders/${part(order)}/withdraw`,
    orderChange: (order: string) => `/api/orders/${part(order)}/change`,
    orderChangeDraft: (order: string) => `/api/orders/${part(order)}/change/draft`,
    invoice: (invoice: string) => `/api/invoices/${part(invoice)}/paper.pdf`,
    accountOrders: '/api/account/orders',
    workshops: '/api/workshops',
    hostWorkshop: (workshop: string, deed: 'open' | 'suspend' | 'reopen') =>
      `/api/host/workshops/${part(workshop)}/${deed}`,
    admin: (workshop: string) => `/api/admin/${part(workshop)}`,
    adminAccount: (workshop: string) => `/api/admin/${part(workshop)}/payment-account`,
    adminSettings: (workshop: string, what: 'postage' | 'terms' | 'details' | 'destinations' | 'members') =>
      `/api/admin/${part(workshop)}/settings/${what}`,
    adminSettingsDeed: (workshop: string, deed: 'postage/remove' | 'members/remove' | 'members/withdraw') =>
      `/api/admin/${part(workshop)}/settings/${deed}`,
    adminOrderDeed: (workshop: string, order: string, deed: 'return' | 'cancel' | 'reinstate') =>
      `/api/admin/${part(workshop)}/orders/${part(order)}/${deed}`,
    adminRunOrders: (workshop: string, run: string) =>
      `/api/admin/${part(workshop)}/runs/${part(run)}/orders`,
    adminMoneyDeed: (workshop: string, deed: 'compare' | 'resolve') =>
      `/api/admin/${part(workshop)}/money/${deed}`,
    adminLedger: (workshop: string) => `/api/admin/${part(workshop)}/ledger.csv`,
    adminTax: (workshop: string, year: string) => `/api/admin/${part(workshop)}/tax.csv?year=${part(year)}`,
    join: '/api/workshops/join',
    adminModules: (workshop: string) => `/api/admin/${part(workshop)}/modules`,
    adminModule: (workshop: string, module: string) => `/api/admin/${part(workshop)}/modules/${part(module)}`,
    adminModulePart: (
      workshop: string,
      module: string,
      what:
        | 'offers'
        | 'revisions'
        | 'lessons'
        | 'lessons/mend'
        | 'lessons/waive'
        | 'publish'
        | 'archive'
        | 'first-unit'
        | 'parts'
        | 'parts/import'
        | 'parts/import/settings'
        | 'parts/import/confirm'
        | 'parts/quotes'
        | 'parts/stock'
        | 'parts/alternates'
        | 'parts/alternates/remove'
        | 'choices'
        | 'choices/retire'
        | 'files'
        | 'files/remove'
        | 'samples'
        | 'plan',
    ) => `/api/admin/${part(workshop)}/modules/${part(module)}/${what}`,
    adminModuleInterest: (workshop: string, module: string) =>
      `/api/admin/${part(workshop)}/modules/${part(module)}/interest`,
    adminRunDemand: (workshop: string, run: string) =>
      `/api/admin/${part(workshop)}/runs/${part(run)}/demand`,
    adminRunActuals: (workshop: string, run: string) =>
      `/api/admin/${part(workshop)}/runs/${part(run)}/actuals`,
    adminRuns: (workshop: string) => `/api/admin/${part(workshop)}/runs`,
    adminRun: (workshop: string, run: string) => `/api/admin/${part(workshop)}/runs/${part(run)}`,
    adminRunDeed: (
      workshop: string,
      run: string,
      deed:
        | 'open'
        | 'lock'
        | 'call-off'
        | 'ask-balances'
        | 'lower-minimum'
        | 'move-decide-by'
        | 'close'
        | 'plan'
        | 'plan/try'
        | 'what-ifs'
        | 'what-ifs/remove'
        | 'closed-days',
    ) => `/api/admin/${part(workshop)}/runs/${part(run)}/${deed}`,
    adminBulk: (workshop: string, bulk: string) => `/api/admin/${part(workshop)}/bulk/${part(bulk)}`,
    packingQueue: (workshop: string) => `/api/packing/${part(workshop)}/queue`,
    packingParcel: (
      workshop: string,
      parcel: string,
      deed: 'pack' | 'hand-over' | 'reopen' | 'hold' | 'release' | 'report',
    ) => `/api/packing/${part(workshop)}/parcels/${part(parcel)}/${deed}`,
    packingBatches: (workshop: string) => `/api/packing/${part(workshop)}/batches`,
    packingTracking: (workshop: string) => `/api/packing/${part(workshop)}/tracking`,
    packingPostCsv: (workshop: string) => `/api/packing/${part(workshop)}/post.csv`,
    packingBatchHandOver: (workshop: string, batch: string) =>
      `/api/packing/${part(workshop)}/batches/${part(batch)}/hand-over`,
    packingBatchReturn: (workshop: string, batch: string) =>
      `/api/packing/${part(workshop)}/batches/${part(batch)}/return`,
    adminRunUnits: (workshop: string, run: string) => `/api/admin/${part(workshop)}/runs/${part(run)}/units`,
    packingPaper: (workshop: string, paper: PaperKind) => `/api/packing/${part(workshop)}/papers/${paper}`,
    packingFill: (workshop: string) => `/api/packing/${part(workshop)}/fill`,
    packingList: (workshop: string) => `/api/packing/${part(workshop)}/list.pdf`,
    packingSlips: (workshop: string) => `/api/packing/${part(workshop)}/slips.pdf`,
    packingSlip: (workshop: string, parcel: string) =>
      `/api/packing/${part(workshop)}/parcels/${part(parcel)}/slip.pdf`,
    webhook: '/api/webhooks/stripe',
  },
} as const
