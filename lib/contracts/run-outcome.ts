import { z } from 'zod'
import { minorAmount, wholeNumber } from './fields'
import type { RunFigures, RunWeighed } from './runs'

/** What a run really cost, and its boards, as its owner types it at the close. */
export const ActualsInput = z
  .object({ costMinor: minorAmount(), started: wholeNumber(0, 100_000), good: wholeNumber(0, 100_000) })
  .refine(({ started, good }) => good <= started, {
    path: ['good'],
    message: 'No more can be good than were put into work.',
  })
export type ActualsInput = z.infer<typeof ActualsInput>

/** A decision about a run with what it was taken on; `figures` only of a lock. */
export type DecisionTaken = {
  id: string
  kind: string
  at: string
  reason: string | null
  byClock: boolean
  coreVersion: string
  /** Of a lowered minimum or a moved decide-by: before and after. */
  change: { from: string; to: string } | null
  figures: (RunFigures & { weighed: RunWeighed }) | null
}

export type ForecastKept = {
  quarter: number
  at: string
  deposited: number
  minimum: number
  mean: number
  low: number
  high: number
  chance: number
  /** Whether the units in the end lay in the 80 % range; null while they are not known. */
  held: boolean | null
}

/** A run after the decision: what was thought, what came, what the next run will believe. */
export type RunOutcome = {
  run: { id: string; number: number; state: string; minimum: number; maximum: number; currency: string }
  module: { slug: string; name: string }
  workshop: { slug: string; timeZone: string; locale: string }
  forecasts: ForecastKept[]
  /** Units under deposit when the run was decided; null while it is not. */
  decidedUnits: number | null
  decisions: DecisionTaken[]
  waivers: { key: string; reason: string; at: string }[]
  units: { paid: number; lapsed: number; cancelled: number; withdrawn: number; open: number }
  /** Per offer, the first promise and the day its last unit was posted. */
  dates: { offer: string; promisedBy: string; postedOn: string | null; daysLate: number | null }[]
  money: {
    /** Planned cost at the units that were paid; null without a cost plan. */
    plannedCostMinor: number | null
    plannedYield: number | null
    actual: ActualsInput | null
    receivedMinor: number
    refundedMinor: number
  }
  learned: {
    name: 'certain' | 'likely' | 'curious' | 'oldSignUp' | 'depositHolder'
    seen: { converted: number; notConverted: number }
    before: number
    after: number
  }[]
}
