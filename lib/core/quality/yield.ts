import { share } from '../stats/argument'

/** A verdict of the bench on one step or one unit. */
export type Verdict = 'pass' | 'fail'

/**
 * All-steps yield: the share of starts that passes every step at once, the product of the steps' own yields.
 * Units: shares.
 * Domain: each yield from 0 to 1 → otherwise RangeError; no steps lose nothing (1).
 * Source: T. Pyzdek, *Six Sigma Project Planner* (2003), rolled throughput yield.
 * @example rolledYield([0.5, 0.5])  // → 0.25
 */
export function rolledYield(stepYields: readonly number[]): number {
  return stepYields.reduce((product, each) => product * share('stepYields', each), 1)
}

/**
 * The share of tested units that passed at their first test, rework not counted.
 * Units: `results` = a unit's verdicts in the order given; units never tested are left out.
 * Domain: at least one unit tested → otherwise RangeError, as there is no share of nothing.
 * Source: usual definition; common practice, no source.
 * @example firstPassYield([{ results: ['pass'] }, { results: ['fail', 'pass'] }, { results: [] }])  // → 0.5
 */
export function firstPassYield(units: readonly { readonly results: readonly Verdict[] }[]): number {
  const first = units.flatMap(({ results }) => results.slice(0, 1))
  if (first.length === 0)
    throw new RangeError(`units must hold at least one tested unit, got ${units.length} untested`)
  return first.filter((verdict) => verdict === 'pass').length / first.length
}

/** How often a step failed. */
export type StepFailures = {
  readonly step: string
  readonly failed: number
  readonly tested: number
  /** failed / tested. */
  readonly share: number
  /** The share of all failures that this step and those before it in the list make up. */
  readonly cumulative: number
}

/**
 * The steps that fail, the most frequent first: where to look before the next run.
 * Units: one result per step tested, in the order given.
 * Rounding: none; ties keep the order in which the steps first appear. Steps without a failure are left out.
 * Source: J. Juran's ranking of causes after Pareto, *Quality Control Handbook* (1951), from memory.
 * @example frequentFailures([{ step: 'power', result: 'fail' }, { step: 'audio', result: 'pass' }])  // → [{ step: 'power', failed: 1, tested: 1, share: 1, cumulative: 1 }]
 */
export function frequentFailures(
  results: readonly { readonly step: string; readonly result: Verdict }[],
): StepFailures[] {
  const steps = new Map<string, { failed: number; tested: number }>()
  for (const { step, result } of results) {
    const { failed, tested } = steps.get(step) ?? { failed: 0, tested: 0 }
    steps.set(step, { failed: failed + (result === 'fail' ? 1 : 0), tested: tested + 1 })
  }
  const failing = [...steps]
    .filter(([, { failed }]) => failed > 0)
    .sort(([, a], [, b]) => b.failed - a.failed)
  const all = failing.reduce((sum, [, { failed }]) => sum + failed, 0)
  let sum = 0
  return failing.map(([step, { failed, tested }]) => {
    sum += failed
    return { step, failed, tested, share: failed / tested, cumulative: sum / all }
  })
}
