import { z } from 'zod'
import type { BreakEven } from '@/lib/core/costs/break-even'
import type { MoverKey } from '@/lib/core/costs/movers'
import type { LineKind, Unpriced } from '@/lib/core/costs/run-line'
import { wholeNumber, type OfferKind } from './fields'
import { PlanInput } from './plan-forms'
import { blank } from './rows'
import type { ProfitCurve } from './run-page'

/** How many units a sheet of costs is made for; the run's own number when left out. */
export const CostsQuery = z.object({ units: blank(wholeNumber(1, 10_000)).catch(undefined) })

/** A plan tried out, nothing of it saved. */
export const CostTrial = PlanInput.and(z.object({ units: blank(wholeNumber(1, 10_000)) }))
export type CostTrial = z.infer<typeof CostTrial>

/** Everything a run's sheet of costs shows, computed from one plan; amounts in minor units of `currency`. */
export type CostFigures = {
  currency: string
  locale: string
  /** The quantity everything but the curve stands at, and how it falls on the offers. */
  units: number
  byOffer: { offer: OfferKind; units: number }[]
  minimum: number
  maximum: number
  deposited: number
  /** Units in the end, 80 % range; null once the run is decided. */
  forecast: { mean: number; low: number; high: number } | null
  mixOf: ProfitCurve['mixOf']
  profits: number[]
  breakEven: BreakEven
  expectedProfit: number
  chanceOfLoss: number
  perUnit: {
    paid: number
    tax: number
    revenue: number
    costs: { kind: LineKind; amount: number }[]
    cost: number
    profit: number
  }
  lines: { kind: LineKind; name: string; amount: number }[]
  totals: { revenue: number; cost: number; profit: number }
  unpriced: Unpriced[]
  movers: { key: MoverKey; name: string; less: number; more: number }[]
  cash: {
    series: { day: string; balance: number }[]
    low: number
    lowOn: string | null
    canLayOut: number | null
    boughtOn: string
    balancesOn: string
    postedOn: string
  }
  callOff: { atDeposited: number; atMinimum: number }
  build: {
    /** Assembled units asked for, to put into work, and what that rests on. */
    need: number
    starts: number
    yieldBasisPoints: number
    confidenceBasisPoints: number
    spares: number
    failureBasisPoints: number
    /** Units more for stock, with what one too few and one too many cost; null when nobody is expected later. */
    extra: { quantity: number; laterUnits: number; missed: number; leftOver: number } | null
  }
  rates: { currency: string; rate: string; on: string; ageDays: number; marginBasisPoints: number }[]
}

/** The page of a run's costs: its figures, and the plan they rest on as a form. */
export type CostDesk = {
  run: {
    id: string
    number: number
    state: 'draft' | 'taking_deposits' | 'locked' | 'called_off' | 'closed'
    revision: string
    currency: string
  }
  module: { slug: string; name: string }
  offers: OfferKind[]
  values: Record<string, string>
  /** Whose plan is shown: the run's own, the module's, or none yet. */
  planOf: 'run' | 'module' | 'none'
  /** Lines of the revision's parts list that differ from those the plan was saved with. */
  changedParts: number
  /** null without a plan that knows every offer of the run. */
  figures: CostFigures | null
}
