import { certain, type Duration, inParallel, inSeries } from './duration'
import type { Expression } from './expression'

/** Shared lengths rarer than this are left out and the rest scaled up. */
const RARE = 1e-12

/** Works out expressions for given shared lengths, each part once as long as what it depends on stays the same. */
export type Evaluator = {
  readonly of: (expression: Expression) => Duration
  /** Takes a shared length as given, in cells. */
  readonly give: (shared: number, cells: number) => void
}

/**
 * An evaluator over the lengths of the steps.
 * Domain: `of` only after every shared length it needs has been given.
 */
export function evaluator(steps: readonly Duration[]): Evaluator {
  const given: number[] = []
  const known: Map<Expression, Duration>[] = []
  const compute = (expression: Expression): Duration => {
    if (expression.kind === 'nothing') return certain(0)
    if (expression.kind === 'step') return steps[expression.step] as Duration
    if (expression.kind === 'shared') {
      return {
        from: given[expression.shared] as number,
        atoms: new Float64Array([1]),
        smooth: new Float64Array(1),
      }
    }
    const join = expression.kind === 'series' ? inSeries : inParallel
    return join(of(expression.first), of(expression.second))
  }
  const of = (expression: Expression): Duration => {
    const level = (known[expression.level] ??= new Map())
    const found = level.get(expression) ?? compute(expression)
    level.set(expression, found)
    return found
  }
  const give = (shared: number, cells: number) => {
    given[shared] = cells
    for (let level = shared + 1; level < known.length; level += 1) known[level]?.clear()
  }
  return { of, give }
}

/**
 * A length as single days with their chances, half of each even cell at either of its edges; first edge − 1 to last + 1,
 * so that the neighbours of every day are there too. Rare days have chance 0.
 */
export function daysOf({ from, atoms, smooth }: Duration): { from: number; chances: Float64Array } {
  const chances = new Float64Array(atoms.length + 3)
  for (let i = 0; i < atoms.length; i += 1) {
    const half = (smooth[i] as number) / 2
    chances[i + 1] = (chances[i + 1] as number) + (atoms[i] as number) + half
    chances[i + 2] = (chances[i + 2] as number) + half
  }
  let total = 0
  for (let i = 0; i < chances.length; i += 1) {
    if ((chances[i] as number) < RARE) chances[i] = 0
    total += chances[i] as number
  }
  return { from: from - 1, chances: chances.map((chance) => chance / total) }
}

/** Adds up lengths with weights into one. */
export function mixture(): { add: (part: Duration, weight: number) => void; whole: () => Duration } {
  const parts: { part: Duration; weight: number }[] = []
  return {
    add: (part, weight) => void parts.push({ part, weight }),
    whole: () => {
      const from = Math.min(...parts.map(({ part }) => part.from))
      const end = Math.max(...parts.map(({ part }) => part.from + part.atoms.length))
      const atoms = new Float64Array(end - from)
      const smooth = new Float64Array(end - from)
      for (const { part, weight } of parts) {
        const shift = part.from - from
        for (let i = 0; i < part.atoms.length; i += 1) {
          atoms[shift + i] = (atoms[shift + i] as number) + weight * (part.atoms[i] as number)
          smooth[shift + i] = (smooth[shift + i] as number) + weight * (part.smooth[i] as number)
        }
      }
      return { from, atoms, smooth }
    },
  }
}
