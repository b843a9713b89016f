import 'server-only'
import type { CostPlan } from '@/lib/core/costs/plan'
import type { ConversionClass } from '@/lib/core/demand/conversion'
import type { OrderState } from '@/lib/core/states/order'
import type { Day } from '@/lib/core/brand'
import type { PartsLine } from '@/lib/core/parts/lint'
import type { Waiver } from '@/lib/core/states/run-readiness'
import type { PlannedStep } from '@/lib/core/schedule/closures'
import type { RunState } from '@/lib/core/states/run'
import type { OfferKind, OrderKind } from '@/models/words'

export type OfferFacts = {
  kind: OfferKind
  priceMinor: number
  depositMinor: number
  postedByOn: Day
  hasWeight: boolean
  hasCustomsCode: boolean
  hasOrigin: boolean
  hasCautions: boolean
  openDestinations: number
}

/** Units ordered, by what decides how they count. */
export type OrderTally = {
  state: OrderState
  kind: OrderKind
  offer: OfferKind
  country: string
  units: number
}

/** Orders and sums per state; `orders` counts each order once. */
export type OrderSums = {
  state: OrderState
  kind: OrderKind
  orders: number
  balanceMinor: number
}

export type SignUpFacts = {
  quantity: number
  offer: OfferKind
  certainty: ConversionClass
  /** Part of the run's window gone when invited, 0 to 1; null while not invited. */
  invitedAt: number | null
}

/** People who came though they were on no list. */
export type NewcomerFacts = {
  /** Those under deposit here, with what they took. */
  here: { offer: OfferKind; quantity: number; people: number }[]
  /** Days since everyone may order, up to now or the decision. */
  daysHere: number
  /** What earlier runs of the workshop saw, and in how many days. */
  before: { people: number; days: number }
}

export type PartLine = PartsLine & {
  partId: string
  perUnit: number
  needsSample: boolean
  sampleFits: boolean
  onHand: number
  attrition: { basisPoints: number; atLeast: number }
}

export type QuoteFacts = {
  partId: string
  quotedOn: Day
  stockSeen: number | null
  stockSeenOn: Day | null
  moq: number
  multiple: number
  breaks: { from: number; unitPrice: string }[]
}

/** Everything a decision about a run is computed from, as it stands in the database at one moment. */
export type RunFacts = {
  today: Day
  run: {
    id: string
    workshopId: string
    moduleId: string
    state: RunState
    minimum: number
    maximum: number
    decideByOn: Day
    lockedOn: Day | null
    /** When balances fall due. */
    balanceWhen: 'at_lock' | 'units_passed' | 'before_packing'
    currency: string
  }
  revision: string
  offers: OfferFacts[]
  orders: OrderTally[]
  sums: OrderSums[]
  signUps: {
    confirmed: number
    notOrdered: SignUpFacts[]
    /** Per class, those who have answered: under deposit or on the way to it, and those who will not be. */
    answered: { certainty: ConversionClass; ordered: number; declined: number }[]
  }
  /** The time deposits may be placed in: its length, the part gone, and the part gone when everyone was let in. */
  window: { days: number; gone: number; opensToAll: number }
  /** When the deposits of the workshop's earlier runs came, as parts of their windows. */
  arrivalsSeen: number[]
  newcomers: NewcomerFacts
  /** What earlier runs of the workshop taught, per class. */
  outcomes: { className: ConversionClass; converted: number; notConverted: number }[]
  plan: { costs: CostPlan; steps: PlannedStep[]; names: Record<string, string> } | null
  closedDays: Day[]
  firstUnits: { tried: number; good: number }
  /** Built units of the module's runs whose fate is known. */
  built: { passed: number; scrapped: number }
  openLessons: number
  lines: PartLine[]
  quotes: QuoteFacts[]
  page: { terms: boolean; cautions: boolean; postalAddress: boolean }
  waivers: Waiver[]
  money: {
    /** Taken and not gone back, of this run. */
    heldMinor: number
    /** What would have to go back today: of this run and of the workshop's runs still taking deposits. */
    owedMinor: number
    /** Payments that would be paid back one by one. */
    owedPayments: number
  }
}
