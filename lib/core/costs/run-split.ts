import type { CostPlan } from '@/lib/core/costs/plan'
import { divide } from '@/lib/core/money/allocate'
import { startsForYield } from '@/lib/core/size/starts'
import { wholeFrom } from '@/lib/core/stats/argument'

/** One number per run of a series: column[k] belongs to the k-th run. */
export type Column = Float64Array

/** Units of one offer in each run of a series: sold, put into work, and each of them by answer of its choices. */
export type OfferColumns = {
  readonly units: Column
  readonly starts: Column
  readonly unitsByAnswer: ReadonlyMap<string, Column>
  readonly startsByAnswer: ReadonlyMap<string, Column>
}

/** A split by fixed weights that remembers its answers: a series asks for the same few over and over. */
export function splitter(weights: readonly number[]): (total: number) => readonly number[] {
  const known = new Map<number, readonly number[]>()
  return (total) => {
    const before = known.get(total)
    if (before !== undefined) return before
    const parts = divide(total, weights)
    // Without any weight nothing is known about the split; the first answer takes all.
    const split = parts.ok ? parts.value : weights.map((_, i) => (i === 0 ? total : 0))
    known.set(total, split)
    return split
  }
}

/**
 * How the units of each offer fall on the answers, and how many are put into work to get them, for a series of runs.
 * Units:  runs[k][i] units of the plan's i-th offer in the k-th run.
 * Domain: yield basis points from 1 to 10,000, confidence from 1 to 9,999 → otherwise RangeError.
 */
export function offerColumns(plan: CostPlan, runs: readonly (readonly number[])[]): readonly OfferColumns[] {
  const startsFor = startsOf(plan)
  return plan.offers.map((offer, i) => {
    const units = Float64Array.from(runs, (run) => run[i]!)
    const starts = offer.isAssembled ? units.map(startsFor) : new Float64Array(units.length)
    const choices = plan.choices.filter((choice) => choice.offer === offer.offer)
    const byAnswer = (totals: Column) =>
      new Map(
        choices.flatMap(({ answers }) => {
          const split = splitter(answers.map(({ weight }) => weight))
          return answers.map(({ id }, at) => [id, totals.map((total) => split(total)[at]!)] as const)
        }),
      )
    return { units, starts, unitsByAnswer: byAnswer(units), startsByAnswer: byAnswer(starts) }
  })
}

function startsOf({ yield: { basisPoints, confidenceBasisPoints } }: CostPlan): (units: number) => number {
  wholeFrom(1, 'costRun: yield.basisPoints', basisPoints)
  wholeFrom(1, 'costRun: yield.confidenceBasisPoints', confidenceBasisPoints)
  if (basisPoints > 10_000) {
    throw new RangeError(`costRun: yield.basisPoints must be at most 10000, got ${basisPoints}`)
  }
  if (basisPoints === 10_000) return (units) => units
  const share = { yield: basisPoints / 10_000, confidence: confidenceBasisPoints / 10_000 }
  const known = new Map([[0, 0]])
  return (need) => {
    const starts = known.get(need) ?? startsForYield({ need, ...share })
    known.set(need, starts)
    return starts
  }
}
