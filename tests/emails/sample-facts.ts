import { type MailKind, type MailProps, type MailSender } from '@/lib/contracts/mails'

/** Invented facts for one mail of every kind. */
export const sampleSender: MailSender = {
  workshop: 'Hollow Pier Modular',
  maker: 'Ines Tidewell',
  replyTo: 'ines@hollow-pier.example',
  postalAddress: ['Hollow Pier Modular', 'Kai 7', '20457 Hamburg', 'Germany'],
  timeZone: 'Europe/Berlin',
}

const site = 'https://brimline.example'
const token = 'q8Hn2mYw4tZr6vKs0pLd1xCf3gJb5aUe7iOoT9zN_Xk'
const order = {
  orderNumber: 'HP-1042',
  module: 'Rowlock',
  orderUrl: `${site}/account/orders/7c0e`,
  currency: 'EUR',
}
const ofOrder = { orderNumber: order.orderNumber, module: order.module, orderUrl: order.orderUrl }
const kit = { module: 'Rowlock', offer: 'kit' as const, quantity: 2 }
const choices = [{ question: 'Front panel finish', answer: 'Sand' }]
const promises = [{ offer: 'kit' as const, postedBy: '2027-09-30' }]

export const sampleFacts: { readonly [K in MailKind]: MailProps<K> } = {
  confirm_signup: { ...kit, confirmUrl: `${site}/confirm/${token}`, deleteOn: '2027-03-15' },
  signup_confirmed: {
    ...kit,
    moduleUrl: `${site}/w/hollow-pier/rowlock`,
    updates: true,
    takeBackUrl: `${site}/take-back/${token}`,
  },
  deposits_open: {
    module: 'Rowlock',
    currency: 'EUR',
    moduleUrl: `${site}/w/hollow-pier/rowlock`,
    offers: [
      { offer: 'boards', priceMinor: 4500, depositMinor: 1000, postedBy: '2027-08-31' },
      { offer: 'kit', priceMinor: 9500, depositMinor: 2500, postedBy: '2027-09-30' },
      { offer: 'built', priceMinor: 16500, depositMinor: 2500, postedBy: '2027-10-31' },
    ],
    pricesIncludeTax: true,
    minimum: 60,
    maximum: 120,
    decideBy: '2027-05-04',
    opensToAllAt: '2027-03-03T09:00:00Z',
    takeBackUrl: `${site}/take-back/${token}`,
  },
  deposit_received: {
    ...order,
    lines: [{ ...kit, choices, totalMinor: 19000, postedBy: '2027-09-30' }],
    postageMinor: 1190,
    taxMinor: 3224,
    taxIncluded: true,
    totalMinor: 20190,
    depositMinor: 5000,
    balanceMinor: 15190,
    balanceWhen: 'units_passed',
    minimum: 60,
    decideBy: '2027-05-04',
    withdrawal: 'by_law',
    terms: {
      version: 'version 3, 1 February 2027',
      text: '1. Who you buy from\nHollow Pier Modular, Kai 7, 20457 Hamburg.\n\n2. What you buy\nA kit is a set of parts & boards that you solder <yourself>.',
    },
  },
  place_released: {
    orderNumber: order.orderNumber,
    module: order.module,
    moduleUrl: `${site}/w/hollow-pier/rowlock`,
    canOrderAgain: true,
  },
  place_free: {
    ...order,
    depositMinor: 5000,
    payUrl: `${site}/account/orders/7c0e/pay`,
    holdUntil: '2027-04-02T16:30:00Z',
  },
  run_locked: {
    ...order,
    deposited: 57,
    minimum: 60,
    belowMinimum: 'A dealer takes the other five.\nThe boards are cheaper than we feared.',
    balanceMinor: 15190,
    balanceWhen: 'units_passed',
    promises,
  },
  run_called_off: { ...order, cause: 'owner', reason: 'The slider is no longer made.', refundMinor: 5000 },
  balance_coming: {
    ...order,
    amountMinor: 15190,
    payUrl: `${site}/account/orders/7c0e/pay`,
    chargeOn: '2027-08-12',
    cardEnding: '4242',
    promises,
  },
  balance_paid: {
    ...order,
    amountMinor: 15190,
    paidTotalMinor: 20190,
    cardEnding: '4242',
    invoiceUrl: `${site}/account/orders/7c0e/invoice`,
    promises,
  },
  card_needs_you: {
    ...order,
    amountMinor: 15190,
    payUrl: `${site}/account/orders/7c0e/pay`,
    cardEnding: '4242',
    why: 'bank_asks',
    lapseOn: '2027-08-26',
  },
  balance_reminder: {
    ...order,
    amountMinor: 15190,
    payUrl: `${site}/account/orders/7c0e/pay`,
    nth: 3,
    lapseOn: '2027-08-26',
    depositMinor: 5000,
    depositThen: 'returned',
  },
  order_lapsed: { ...order, depositMinor: 5000, depositThen: 'returned' },
  run_update: {
    module: 'Rowlock',
    title: 'the boards are here',
    text: 'All 70 boards arrived on Tuesday.\n\nWe start with the power stage next week:\nthree a day, then the clock inputs.',
    updateUrl: `${site}/w/hollow-pier/rowlock#updates`,
  },
  delay_notice: {
    ...order,
    occasion: 'delay',
    delays: [{ offer: 'kit', promisedBy: '2027-09-30', revisedBy: '2027-11-15' }],
    reason: 'The jacks are late by six weeks.',
    silenceMeans: 'cancel',
    answerBy: '2027-09-28',
    refundMinor: 20190,
    refundBy: '2027-10-07',
    noticeUrl: `${site}/account/orders/7c0e/notice/2`,
  },
  change_notice: {
    ...order,
    what: 'part',
    text: 'The knobs are now ribbed instead of smooth.',
    answerBy: '2027-07-01',
    refundMinor: 5000,
    noticeUrl: `${site}/account/orders/7c0e/notice/1`,
  },
  parcel_handed_over: {
    ...ofOrder,
    lines: [{ ...kit, choices }],
    service: 'Registered letter, international',
    tracking: 'RR473124829DE',
    trackingUrl: 'https://post.example/track/RR473124829DE',
    handedOverOn: '2027-09-21',
    more: false,
    isReplacement: false,
    crossesCustoms: true,
    problemUrl: `${site}/account/orders/7c0e/problem`,
  },
  problem_opened: {
    ...ofOrder,
    what: 'missing_part',
    answerBy: '2027-10-05',
    problemUrl: `${site}/account/orders/7c0e/problem/1`,
  },
  problem_answered: {
    ...order,
    answer: 'part_refund',
    text: 'Sorry about the scratch.\n\nWe pay 15.00 back.',
    refundMinor: 1500,
    problemUrl: `${site}/account/orders/7c0e/problem/1`,
  },
  withdrawal_acknowledged: {
    ...order,
    receivedAt: '2027-10-03T20:15:00Z',
    refundMinor: 20190,
    refundBy: '2027-10-17',
    returnTo: ['Hollow Pier Modular', 'Kai 7', '20457 Hamburg', 'Germany'],
    returnBy: '2027-10-17',
  },
  refund_sent: { ...order, amountMinor: 20190, cause: 'withdrawn', cardEnding: '4242' },
  order_cancelled: { ...order, cause: 'customer', reason: null, refundMinor: 5000 },
  sign_in_link: { signInUrl: `${site}/signin/link/${token}`, validMinutes: 10 },
  staff_invitation: {
    role: 'packer',
    invitedBy: 'Ines Tidewell',
    acceptUrl: `${site}/invitation/${token}`,
    validUntil: '2027-03-08',
  },
  owner_digest: {
    on: '2027-03-01',
    deskUrl: `${site}/admin/hollow-pier`,
    settingsUrl: `${site}/admin/hollow-pier/settings`,
    items: [
      { what: 'problems_open', count: 1, url: `${site}/admin/hollow-pier/runs/f/messages` },
      { what: 'parcels_ready', count: 12, url: `${site}/packing/hollow-pier` },
    ],
  },
}
