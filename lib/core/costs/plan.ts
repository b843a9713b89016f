import type { PlanAssembly, PlanBoard, PlanPart, PlanRate, PlanSupplier } from '@/lib/core/costs/plan-buying'
import type {
  PlanChoice,
  PlanFees,
  PlanOffer,
  PlanOrders,
  PlanPayout,
  PlanTax,
} from '@/lib/core/costs/plan-selling'
import { exponentOf } from '@/lib/core/money/currency'

/** A sum that does not depend on how many are made, in its own currency. */
export type PlanSum = { readonly name: string; readonly amount: number; readonly currency: string }

/**
 * Everything that decides what a run costs and brings, at any quantity. Money is in the selling currency's minor units
 * unless a `currency` stands beside it; prices that may be fractions of a minor unit are decimal strings.
 */
export type CostPlan = {
  /** Selling currency, ISO 4217. */
  readonly currency: string
  readonly offers: readonly PlanOffer[]
  readonly choices: readonly PlanChoice[]
  /** Costs that come once: prototypes of this revision, tools, pictures, tests by others. */
  readonly oneOff: readonly PlanSum[]
  /** Costs per unit sold that are nothing else here (repairs set aside, lost parcels, a licence): decimal minor units. */
  readonly perUnit: readonly { readonly name: string; readonly offer: string; readonly amount: string }[]
  readonly boards: readonly PlanBoard[]
  readonly parts: readonly PlanPart[]
  /** null when no assembler is used. */
  readonly assembly: PlanAssembly | null
  readonly suppliers: readonly PlanSupplier[]
  readonly rates: readonly PlanRate[]
  /** Paid work: per hour, and minutes that come once per run (setting up, writing the guide). */
  readonly labour: { readonly perHour: number; readonly onceMinutes: number }
  /** Share of started units that end up good, at once or after rework, and how sure to be of having enough. */
  readonly yield: { readonly basisPoints: number; readonly confidenceBasisPoints: number }
  readonly orders: PlanOrders
  readonly fees: PlanFees
  readonly tax: PlanTax
  readonly payout: PlanPayout
  /** Sums spent or bound before the lock (parts bought at risk): already in the lines above, lost when the run is called off. */
  readonly atRisk: readonly PlanSum[]
  /** What the maker expects around the run; none of it is a cost of the run. Left out while nobody has said. */
  readonly outlook?: PlanOutlook
}

/** What is asked beside the costs of a run. */
export type PlanOutlook = {
  /** What the maker can lay out before money comes in, in the selling currency; null while not said. */
  readonly canLayOut: number | null
  /** Units expected to be wanted after the run, on top of its orders. */
  readonly laterUnits: number
  /** Share of posted units expected to need repair, for the spares to keep. */
  readonly failureBasisPoints: number
}

/**
 * A plan in which nothing costs or brings anything yet: no offers, no parts, a yield of 100 %, one unit per order, two
 * payments, no fees, no tax. Spread it and fill in what is known.
 * Domain:   an ISO 4217 currency → otherwise RangeError.
 * @example  emptyPlan('EUR').orders.unitsPerOrder  // → '1'
 */
export function emptyPlan(currency: string): CostPlan {
  exponentOf(currency)
  return {
    currency,
    offers: [],
    choices: [],
    oneOff: [],
    perUnit: [],
    boards: [],
    parts: [],
    assembly: null,
    suppliers: [],
    rates: [],
    labour: { perHour: 0, onceMinutes: 0 },
    yield: { basisPoints: 10_000, confidenceBasisPoints: 9500 },
    orders: { unitsPerOrder: '1', paymentsPerOrder: 2, postageCharged: 0, postagePaid: 0 },
    fees: {
      home: { basisPoints: 0, fixed: 0 },
      foreignCard: { basisPoints: 0, shareBasisPoints: 0 },
      conversion: { basisPoints: 0, shareBasisPoints: 0 },
      refund: { shareBasisPoints: 0, fixed: 0, isFeeLost: true },
      dispute: { shareBasisPoints: 0, fixed: 0 },
    },
    tax: { mode: 'not_registered', pricesIncludeTax: true, rates: [] },
    payout: { delayDays: 0, reserveBasisPoints: 0, reserveDays: 0 },
    atRisk: [],
  }
}
