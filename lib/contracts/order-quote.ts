import type { OfferKind } from './fields'

/** An order as it would be placed: what the buyer reads once more before the button. */
export type OrderQuoteView = {
  run: string
  workshop: { slug: string; name: string; country: string }
  module: { slug: string; name: string }
  currency: string
  lines: {
    offer: OfferKind
    quantity: number
    /** Tax in. */
    totalMinor: number
    choices: { question: string; answer: string }[]
    postedBy: string
    /** What may follow on arrival, as the workshop wrote it; '' when nothing. */
    note: string
  }[]
  country: string
  /** Tax in. */
  postageMinor: number
  service: string
  taxMinor: number
  totalMinor: number
  depositMinor: number
  balanceMinor: number
  balanceWhen: 'at_lock' | 'units_passed' | 'before_packing'
  minimum: number
  decideBy: string
  /** No place is left for it as things stand: it would enter the waiting list, and nothing is paid. */
  willWait: boolean
  holdMinutes: number
  terms: { number: number; body: string }
}

/** An offer as the order form shows it. */
export type OrderFormOffer = {
  offer: OfferKind
  priceMinor: number
  depositMinor: number
  postedBy: string
  choices: {
    id: string
    question: string
    askedAfterLock: boolean
    answers: { id: string; label: string; surchargeMinor: number; isDefault: boolean }[]
  }[]
}

/** What the order form needs; `closedBecause` says why nobody, or this person, may order now. */
export type OrderFormView = {
  run: string
  workshop: { slug: string; name: string; country: string }
  timeZone: string
  module: { slug: string; name: string }
  currency: string
  pricesIncludeTax: boolean
  closedBecause: 'run_not_open' | 'decide_by_past' | 'not_open_to_all_yet' | 'workshop_suspended' | null
  decideBy: string
  minimum: number
  limitPerPerson: number
  free: number
  opensToAllAt: string | null
  offers: OrderFormOffer[]
  countries: string[]
}

/** What an order would become by a change, beside what it is. */
export type ChangeQuoteView = {
  order: string
  number: number
  currency: string
  lines: {
    offer: OfferKind
    quantity: number
    totalMinor: number
    choices: { question: string; answer: string }[]
    postedBy: string
  }[]
  before: { totalMinor: number; depositMinor: number; balanceMinor: number }
  after: {
    goodsMinor: number
    postageMinor: number
    taxMinor: number
    totalMinor: number
    depositMinor: number
    balanceMinor: number
  }
}
