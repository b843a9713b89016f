import type { ReadinessFigures } from '@/lib/core/states/readiness-figures'
import type { ReadinessKey, ReadinessState, RunFigures, RunView, RunWeighed } from './runs'

export type OrderCounts = {
  /** Orders per state, those of the run's own buyers. */
  [state: string]: number
}

export type RunLine = {
  /** Steps with the days they are expected at, one after another as they depend on each other. */
  steps: { key: string; name: string; from: string; to: string; state: 'done' | 'now' | 'to_come' }[]
  /** The earliest promise, and the chance from 0 to 1 of keeping it. */
  postedBy: string
  chance: number
}

export type ProfitCurve = {
  /** Profit in minor units at 1, 2, 3 … units of today's mix. */
  profits: number[]
  breakEven: {
    firstProfit: number | null
    safeFrom: number | null
    lossGaps: readonly (readonly [number, number])[]
  }
  /** What the mix was taken from. */
  mixOf: 'deposits' | 'signups' | 'even'
}

/** Whether everyone under deposit could be paid back today; unknown while the provider does not answer. */
export type RepayAnswer = { state: 'yes' } | { state: 'short'; shortByMinor: number } | { state: 'unknown' }

export type BulkSummary = {
  id: string
  kind: string
  total: number
  done: number
  failed: number
  createdAt: string
}

/** The owner's page of a run: what the API gives, and what the page draws besides. */
export type RunPage = Omit<RunView, 'readiness'> & {
  workshop: { id: string; slug: string; timeZone: string; locale: string }
  number: number
  /** Today in the workshop's zone. */
  today: string
  headStartHours: number
  /** Decide-by moves once. */
  decideByMoved: boolean
  limitPerPerson: number
  openedAt: string | null
  lockedAt: string | null
  lockReason: string | null
  calledOffAt: string | null
  callOffReason: string | null
  balancesAskedAt: string | null
  readiness: { key: ReadinessKey; state: ReadinessState; waivedFor: string | null }[]
  readinessFigures: ReadinessFigures
  weighed: RunWeighed
  curve: ProfitCurve | null
  runLine: RunLine | null
  repay: RepayAnswer
  orders: OrderCounts
  money: {
    /** Taken and not paid back, of this run. */
    heldMinor: number
    /** Still to be asked for, of orders under deposit. */
    balancesMinor: number
  }
  /** Units in orders whose buyers may withdraw by law until 14 days after they arrive. */
  withdrawableUnits: number
  /** Confirmed sign-ups of the module, and how many of them have not ordered in this run. */
  signUps: { confirmed: number; notOrdered: number }
  bulk: BulkSummary[]
  /** What the run was locked on; null while it was not. */
  decided: {
    at: string
    figures: RunFigures
    weighed: RunWeighed
    coreVersion: string
    waived: { key: ReadinessKey; reason: string }[]
  } | null
}

export type RunOrderItem = {
  id: string
  number: number
  name: string | null
  country: string
  state: string
  kind: 'paid' | 'manual'
  units: number
  lines: { offer: 'boards' | 'kit' | 'built'; quantity: number }[]
  totalMinor: number
  depositMinor: number
  balanceMinor: number
  placedAt: string
  isDisputed: boolean
}

/** What a new run is drafted from. */
export type RunTemplate = {
  module: { slug: string; name: string; state: string }
  revisions: { letter: string; state: string }[]
  offers: { offer: 'boards' | 'kit' | 'built'; priceMinor: number | null; depositMinor: number | null }[]
  currency: string
  headStartHours: number
  today: string
}

export type BulkView = {
  id: string
  kind: string
  run: string | null
  total: number
  done: number
  failed: number
  failures: { subject: string; reason: string; count: number }[]
}
