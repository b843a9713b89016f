import { plural } from '@/lib/messages/plural'

/** What the mails of every domain share: names of the offers, and when the balance is asked for. */
export const offerNames = {
  boards: 'PCB and front panel set',
  kit: 'kit',
  built: 'built and tested',
} as const

export const units = (count: number) => plural(count, { one: '# unit', other: '# units' })

export const balanceAsked = {
  at_lock: 'The balance is asked for when the run is locked; you are told at least 7 days before.',
  units_passed:
    'The balance is asked for when your units have passed their tests; you are told at least 7 days before.',
  before_packing: 'The balance is asked for before packing; you are told at least 7 days before.',
} as const

export const labels = {
  order: 'Order',
  module: 'Module',
  orderPage: 'Your order page',
  modulePage: 'The module page',
  deposit: 'Deposit',
  balance: 'Balance',
  postage: 'Postage',
  taxIncluded: 'Tax included',
  taxAdded: 'Tax',
  total: 'Total',
  postedBy: (offer: string) => `Posted by (${offer})`,
}

/** The foot of every mail. */
export const foot = {
  signedBy: (maker: string, workshop: string) => (maker === workshop ? maker : `${maker}, ${workshop}`),
  replies: (maker: string) => `Answer this mail to reach ${maker}.`,
  noReplies: 'Nobody reads answers to this address.',
  sentThrough: (workshop: string) =>
    workshop === 'Brimline' ? 'Sent by Brimline.' : `Sent for ${workshop} by Brimline.`,
  unsubscribe: 'Stop news and invitations of this workshop',
}
