import type { ForecastFigures } from './runs'

/** How many people, asking for how many units, share one answer. */
export type DemandCount = { key: string; people: number; units: number }

/** Confirmed sign-ups of a module, counted; nothing about who they are. */
export type InterestBoard = {
  module: { slug: string; name: string }
  currency: string
  locale: string
  people: number
  units: number
  /** Sign-ups by the day, week or month they were confirmed in, oldest first; `from` is its first day. */
  overTime: { step: 'day' | 'week' | 'month'; buckets: { from: string; people: number; units: number }[] }
  byOffer: DemandCount[]
  byCertainty: DemandCount[]
  /** The twelve countries asking for most, and the others together under '' . */
  byCountry: DemandCount[]
  /** Per offer, people at each highest price stated, in minor units; key '' was not asked. */
  byPrice: { offer: string; prices: DemandCount[] }[]
}

export type ClassBelief = {
  name: 'certain' | 'likely' | 'curious' | 'oldSignUp' | 'depositHolder'
  /** Share that orders (deposit holders: that pays), before anything was seen. */
  starting: number
  /** Seen in closed runs of the workshop. */
  seen: { converted: number; notConverted: number }
  /** Seen in this run. */
  here: { ordered: number; declined: number; silent: number }
  /** What is believed of those who are silent, or of deposit holders, with its 80 % range. */
  believed: { mean: number; low: number; high: number }
}

export type PricePoint = {
  priceMinor: number
  /** Sign-ups of the offer that would still join. */
  members: number
  expectedUnits: number
  chanceToGo: number
  /** Null without a cost plan. */
  expectedProfitMinor: number | null
}

/** What a run may expect, and where that comes from. */
export type DemandBoard = InterestBoard & {
  run: { id: string; number: number; state: string; minimum: number; maximum: number; decideBy: string }
  isExpecting: boolean
  daysLeft: number
  deposited: number
  total: ForecastFigures
  byForecast: { offer: string; deposited: number; mean: number; low: number; high: number }[]
  /** Expected units of the silent and of newcomers. */
  fromListed: number
  fromNewcomers: number
  newcomers: { seen: number; days: number }
  /** Share of deposits that is usually in by now. */
  arrivedBy: number
  learnedFrom: number
  beliefs: ClassBelief[]
  /** How many more sign-ups of one unit make the minimum as sure as four in five. */
  needed: { name: 'certain' | 'likely' | 'curious'; more: number | 'already_there' | 'out_of_reach' }[]
  invitations: { sent: number; ordered: number; declined: number; expired: number }
  byChoice: { question: string; answer: string; units: number }[]
  prices: { offer: string; best: number | null; points: PricePoint[] }[]
}
