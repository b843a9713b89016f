import { CELL_DAYS, type Duration, meanDays } from './duration'
import { daysOf, type Evaluator } from './evaluate'
import type { Expression } from './expression'
import type { Solved } from './reduce'

/**
 * The expected finish as a function of one length: `values[i]` when that length is the cell edge from + i, for edges from
 * one before its first to one after its last. Its slope is the chance that a little more of the length delays the finish.
 */
type Effect = { readonly from: number; readonly values: Float64Array }

function effectOver(length: Duration, valueAt: (edge: number) => number): Effect {
  const from = length.from - 1
  return { from, values: Float64Array.from({ length: length.atoms.length + 3 }, (_, i) => valueAt(from + i)) }
}

function at({ from, values }: Effect, edge: number): number {
  return values[Math.min(values.length - 1, Math.max(0, edge - from))] as number
}

/** The effect of one part of a sum: the mean over the other part. */
function effectInSeries(whole: Effect, own: Duration, other: Duration): Effect {
  return effectOver(own, (edge) => {
    let sum = 0
    for (let i = 0; i < other.atoms.length; i += 1) {
      const there = edge + other.from + i
      sum += (other.atoms[i] as number) * at(whole, there)
      sum += ((other.smooth[i] as number) * (at(whole, there) + at(whole, there + 1))) / 2
    }
    return sum
  })
}

/** The effect of one side of a maximum: nothing while the other is longer. */
function effectInParallel(whole: Effect, own: Duration, other: Duration): Effect {
  const count = other.atoms.length
  // longer[i]: the part of the mean in which the other side ends after its edge i.
  const longer = new Float64Array(count + 1)
  const shorter = new Float64Array(count + 1)
  for (let i = count - 1; i >= 0; i -= 1) {
    const edge = other.from + i
    const even = ((other.smooth[i] as number) * (at(whole, edge) + at(whole, edge + 1))) / 2
    const nextAtom = i + 1 < count ? (other.atoms[i + 1] as number) * at(whole, edge + 1) : 0
    longer[i] = (longer[i + 1] as number) + even + nextAtom
  }
  let sum = 0
  for (let i = 0; i <= count; i += 1) {
    shorter[i] = sum + (other.atoms[i] ?? 0)
    sum += (other.atoms[i] ?? 0) + (other.smooth[i] ?? 0)
  }
  const all = (longer[0] as number) + (other.atoms[0] as number) * at(whole, other.from)
  return effectOver(own, (edge) => {
    const i = edge - other.from
    if (i < 0) return all
    if (i >= count) return at(whole, edge)
    return (shorter[i] as number) * at(whole, edge) + (longer[i] as number)
  })
}

/** The mean slope of an effect over the length it belongs to; at a certain day the mean of both sides. */
function slopeOver({ values }: Effect, { atoms, smooth }: Duration): number {
  let sum = 0
  for (let i = 0; i < atoms.length; i += 1) {
    const [back, here, ahead] = [values[i], values[i + 1], values[i + 2]] as [number, number, number]
    sum += ((atoms[i] as number) * (ahead - back)) / 2 + (smooth[i] as number) * (ahead - here)
  }
  return sum / CELL_DAYS
}

/**
 * For each step the chance that it decides the finish: that the finish would come later if the step took a little longer.
 * Found backwards, from the effect of the finish on itself to the effect of each step; ties count half to either side.
 * Accuracy: to the half-day cells; the shares along any cut of the plan add up to 1.
 * Cost: some three times that of the finish itself.
 */
export function criticalShares(
  { shared, finish }: Solved,
  steps: readonly Duration[],
  evaluate: Evaluator,
): number[] {
  const shares = new Array<number>(steps.length).fill(0)
  const waiting = new Map<Expression, { from: number; values: Float64Array }>()

  const descend = (expression: Expression, effect: Effect, weight: number): void => {
    if (expression.kind === 'nothing' || expression.kind === 'shared') return
    if (expression.kind === 'step') {
      shares[expression.step] =
        (shares[expression.step] as number) + weight * slopeOver(effect, evaluate.of(expression))
      return
    }
    const { first, second } = expression
    const through = expression.kind === 'series' ? effectInSeries : effectInParallel
    reach(first, through(effect, evaluate.of(first), evaluate.of(second)), weight, expression.level)
    reach(second, through(effect, evaluate.of(second), evaluate.of(first)), weight, expression.level)
  }
  /** What depends on nothing shared is gone into once, with the sum of its effects. */
  const reach = (part: Expression, effect: Effect, weight: number, level: number): void => {
    if (part.level > 0 || level === 0) return descend(part, effect, weight)
    const sum = waiting.get(part) ?? { from: effect.from, values: new Float64Array(effect.values.length) }
    for (let i = 0; i < sum.values.length; i += 1) {
      sum.values[i] = (sum.values[i] as number) + weight * (effect.values[i] as number)
    }
    waiting.set(part, sum)
  }
  /** The expected finish with the first `level` shared lengths given; goes down wherever `weight` is above 0. */
  const expected = (level: number, weight: number): number => {
    const given = shared[level]
    if (given === undefined) {
      const whole = evaluate.of(finish)
      if (weight > 0)
        reach(
          finish,
          effectOver(whole, (edge) => edge * CELL_DAYS),
          weight,
          level,
        )
      return meanDays(whole)
    }
    const length = evaluate.of(given)
    const { from, chances } = daysOf(length)
    const values = new Float64Array(chances.length)
    let mean = 0
    chances.forEach((chance, i) => {
      evaluate.give(level, from + i)
      values[i] = expected(level + 1, weight * chance)
      mean += chance * (values[i] as number)
    })
    if (weight > 0) reach(given, { from, values }, weight, level)
    return mean
  }
  expected(0, 1)
  for (const [part, effect] of waiting) descend(part, effect, 1)
  return shares.map((share) => Math.min(1, Math.max(0, share)))
}
