import { SAMPLING_105E } from '../data/sampling-105e'
import { ok, refuse, type Result } from '../result'
import { positive, wholeFrom } from '../stats/argument'

/** How much to look for: general levels I to III (II is usual), special levels for costly tests. */
export type InspectionLevel = 'S-1' | 'S-2' | 'S-3' | 'S-4' | 'I' | 'II' | 'III'

/** How many pieces of a lot to inspect and how many defectives it may have. */
export type SamplingPlan = {
  /** The code letter of the lot size (table I); an arrow may lead to another letter's sample. */
  readonly letter: string
  /** Pieces to inspect; the whole lot when `inspectAll`. */
  readonly sample: number
  /** The lot is accepted with at most this many defectives … */
  readonly accept: number
  /** … and rejected from this many. */
  readonly reject: number
  /** The sample would be as large as the lot or larger. */
  readonly inspectAll: boolean
}

/**
 * The single sampling plan for a received lot, normal inspection. Arrows in the table are followed to the plan they
 * point at, which brings its own sample size.
 * Units: pieces; aqlPercent in defectives per hundred, one of 0.10 … 6.5 as the table prints them.
 * Domain: whole lot ≥ 1, aqlPercent > 0 → otherwise RangeError.
 * Refuses: 'not_in_table' when the lot is a single piece, the level unknown, or the AQL not a column of the table.
 * Source: MIL-STD-105E (1989), tables I and II-A.
 * @example samplingPlan({ lot: 100, level: 'II', aqlPercent: 1 })  // → ok({ letter: 'F', sample: 13, accept: 0, reject: 1, inspectAll: false })
 */
export function samplingPlan(ask: {
  readonly lot: number
  readonly level: InspectionLevel
  readonly aqlPercent: number
}): Result<SamplingPlan, 'not_in_table'> {
  const { lot, level, aqlPercent } = ask
  wholeFrom(1, 'lot', lot)
  positive('aqlPercent', aqlPercent)
  const { codeLetters, plans } = SAMPLING_105E
  const letter = codeLetters.find(({ from, to }) => lot >= from && (to === null || lot <= to))?.letters[level]
  let at = plans.findIndex((plan) => plan.letter === letter)
  const column = SAMPLING_105E.aqlPercents.indexOf(aqlPercent)
  if (letter === undefined || at < 0 || column < 0) return refuse('not_in_table')
  for (;;) {
    const plan = plans[at]
    const accept = plan?.accept[column]
    if (plan === undefined || accept === undefined) return refuse('not_in_table')
    if (typeof accept === 'number') {
      const inspectAll = plan.sample >= lot
      return ok({ letter, sample: inspectAll ? lot : plan.sample, accept, reject: accept + 1, inspectAll })
    }
    at += accept === 'down' ? 1 : -1
  }
}
