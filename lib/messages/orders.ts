import { exponentOf } from '@/lib/core/money/currency'
import { plainMoney } from '@/lib/core/money/plain'
import { LOCALE } from './ui'
import { writtenDay } from './written'

/** A sum as the order button names it: the amount first, its symbol behind. */
function sum(minor: number, currency: string): string {
  const digits = exponentOf(currency)
  const parts = new Intl.NumberFormat(LOCALE, {
    style: 'currency',
    currency,
    currencyDisplay: 'narrowSymbol',
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  }).formatToParts(plainMoney(minor, currency))
  const symbol = parts.find(({ type }) => type === 'currency')?.value ?? currency
  const amount = parts
    .filter(({ type }) => type !== 'currency' && type !== 'literal')
    .map(({ value }) => value)
    .join('')
  return `${amount} ${symbol}`
}

/** The order form and the page on which it is read once more. */
export const orderFormWords = {
  title: (module: string) => `Order ${module}`,
  lead: 'You see every sum once more before anything is ordered.',
  runTrail: 'The module’s page',
  what: 'What you want',
  offerLine: (price: string, deposit: string, postedBy: string) =>
    `${price} each, ${deposit} of it as deposit now. Posted by ${writtenDay(postedBy)}.`,
  quantity: (offer: string) => `How many: ${offer}`,
  none: 'None',
  choiceOf: (offer: string, question: string) => `${question} (${offer})`,
  asksLater: 'Asked again after the lock; until then this answer stands in.',
  surcharge: (label: string, sum: string) => `${label} (+ ${sum})`,
  limit: (limit: number) => `At most ${limit} units per person in this run.`,
  places: (free: number) =>
    free > 0
      ? `${free} ${free === 1 ? 'place is' : 'places are'} free at the moment.`
      : 'No place is free at the moment: your order enters the waiting list, and nothing is paid until a place is offered to you.',
  where: 'Where it goes',
  next: 'Go on: see every sum',
  draftGone: 'What you typed was kept for 15 minutes and is gone. Please fill the form in again.',
  closedTitle: 'No orders at the moment',
  closed: {
    run_not_open: 'This run takes no orders now: it is being built, or has not opened yet.',
    decide_by_past: 'The day of deciding has passed, so this run takes no new orders.',
    not_open_to_all_yet: 'People who signed up first may order now.',
    workshop_suspended: 'This workshop takes no payments at the moment.',
  },
  opensAt: 'Everyone may order from',
  noRun: 'This module has no run that takes orders.',

  checkTitle: 'Check your order',
  checkLead: (module: string, workshop: string) =>
    `${module}, from ${workshop}. Nothing is ordered until you press the button at the foot.`,
  address: 'It goes to',
  postage: (service: string) => `Postage (${service})`,
  total: 'Total',
  taxWithin: 'Tax in it',
  now: 'Now, as deposit',
  later: 'Later, as balance',
  when: 'When the balance is asked for',
  balanceWhen: {
    at_lock: 'When the run is locked. You are told at least 7 days before your card is charged.',
    units_passed:
      'When the units have passed their tests. You are told at least 7 days before your card is charged.',
    before_packing: 'Before packing. You are told at least 7 days before your card is charged.',
  },
  condition: (minimum: number, decideBy: string) =>
    `The run goes ahead when ${minimum} units are under deposit; that is decided by ${writtenDay(decideBy)}. If it does not, you get everything back without asking.`,
  cancelling: 'Until the run is locked you can cancel with two clicks and get everything back.',
  holding: (minutes: number) =>
    `Your place is held for ${minutes} minutes while you pay. On the card page you agree that the same card is charged for the balance.`,
  terms: (number: number) => `Terms of this order (version ${number})`,
  postedBy: 'Posted by',
  arrival: 'On arrival',
  change: 'Change the order',
  order: (deposit: number, balance: number, currency: string) =>
    `Order with obligation to pay: ${sum(deposit, currency)} now, ${sum(balance, currency)} when your modules are ready`,
  wait: 'Join the waiting list; nothing is paid now',
  waitTitle: 'No place is free at the moment',
  waitLead:
    'Your order enters the waiting list in order of arrival. When a place is free you get a mail and 48 hours to pay the deposit; until then you can leave the list at any time.',
} as const

/** The address of an order, wherever it is asked for. */
export const addressWords = {
  country: 'Country',
  name: 'Name on the parcel',
  organization: 'Company',
  line: (n: number) => (n === 1 ? 'Street and number' : `Address line ${n}`),
  city: 'Town or city',
  region: 'State, province or prefecture',
  postcode: 'Postcode',
  postcodeHint: 'Leave it empty where there is none.',
  phone: 'Telephone',
  phoneHint: 'With its country code; the carrier uses it. Some countries need it.',
  taxNumber: 'Tax number',
  taxNumberHint: 'Only where customs there asks for it.',
  latinSummary: 'Written in another script? Add the same address in Latin letters',
  latinHint: 'The post here needs Latin letters; the post there reads the address above.',
  latinName: 'Name, in Latin letters',
  latinLine: 'Street and number, in Latin letters',
  latinCity: 'Town or city, in Latin letters',
  latinRegion: 'State, province or prefecture, in Latin letters',
} as const
