import { regularizedBeta } from '../stats/beta'
import { assertEstimates, pertShape } from './pert'

/** The width of a cell: half a day. */
export const CELL_DAYS = 0.5

/**
 * A length of time as chances on half-day cells: `atoms[i]` exactly at cell edge from + i, `smooth[i]` spread evenly over
 * the cell after that edge. Keeping the two apart lets certain days stay certain while the rest is continuous.
 */
export type Duration = { readonly from: number; readonly atoms: Float64Array; readonly smooth: Float64Array }

/** The longest step that is worked out, in days. Our own limit. */
const LONGEST_DAYS = 10_000

/**
 * A certain length. Units: days. Off the half-day grid it is shared between its two neighbours, the mean kept.
 * @example certain(3).from  // → 6
 */
export function certain(days: number): Duration {
  const from = Math.floor(days / CELL_DAYS)
  const beyond = days / CELL_DAYS - from
  const atoms = new Float64Array(beyond > 0 ? [1 - beyond, beyond] : [1])
  return { from, atoms, smooth: new Float64Array(atoms.length) }
}

/**
 * A step's length from its three estimates: the Beta of `pertShape`, its mass by the distribution function on half-day
 * cells; optimistic = pessimistic is a point.
 * Units: days. Domain: as `pertMean`, at most 10,000 days → otherwise RangeError.
 * @example estimated(2, 2, 2).from  // → 4
 */
export function estimated(optimistic: number, likely: number, pessimistic: number): Duration {
  assertEstimates(optimistic, likely, pessimistic)
  if (pessimistic > LONGEST_DAYS)
    throw new RangeError(`pessimistic must be at most ${LONGEST_DAYS}, got ${pessimistic}`)
  if (pessimistic === optimistic) return certain(optimistic)
  const { alpha, beta } = pertShape(optimistic, likely, pessimistic)
  const from = Math.floor(optimistic / CELL_DAYS)
  const cells = Math.ceil(pessimistic / CELL_DAYS) - from
  const smooth = new Float64Array(cells)
  let below = 0
  for (let i = 0; i < cells; i += 1) {
    const x = ((from + i + 1) * CELL_DAYS - optimistic) / (pessimistic - optimistic)
    const upTo = x >= 1 ? 1 : regularizedBeta(Math.max(0, x), alpha, beta)
    smooth[i] = upTo - below
    below = upTo
  }
  return { from, atoms: new Float64Array(cells), smooth }
}

/**
 * One after the other: the length of the sum of two independent lengths. Two even cells make a triangle over two cells,
 * half its mass in each.
 * Cost: O(cells · cells).
 * @example inSeries(certain(1), certain(2)).from  // → 6
 */
export function inSeries(a: Duration, b: Duration): Duration {
  const n = a.atoms.length
  const m = b.atoms.length
  const atoms = new Float64Array(n + m)
  const smooth = new Float64Array(n + m)
  for (let i = 0; i < n; i += 1) {
    const atom = a.atoms[i] as number
    const even = a.smooth[i] as number
    if (atom === 0 && even === 0) continue
    for (let k = 0; k < m; k += 1) {
      const otherAtom = b.atoms[k] as number
      const other = b.smooth[k] as number
      const half = (even * other) / 2
      atoms[i + k] = (atoms[i + k] as number) + atom * otherAtom
      smooth[i + k] = (smooth[i + k] as number) + atom * other + even * otherAtom + half
      smooth[i + k + 1] = (smooth[i + k + 1] as number) + half
    }
  }
  return trimmed({ from: a.from + b.from, atoms, smooth })
}

/** The same length without empty cells at its ends. */
function trimmed({ from, atoms, smooth }: Duration): Duration {
  let start = 0
  let end = atoms.length
  while (start < end - 1 && atoms[start] === 0 && smooth[start] === 0) start += 1
  while (end > start + 1 && atoms[end - 1] === 0 && smooth[end - 1] === 0) end -= 1
  return { from: from + start, atoms: atoms.slice(start, end), smooth: smooth.slice(start, end) }
}

/** P(length < edge) and P(length ≤ edge) at each cell edge from `first` on, `count` of them. */
function steps(a: Duration, first: number, count: number): { before: Float64Array; upTo: Float64Array } {
  const before = new Float64Array(count)
  const upTo = new Float64Array(count)
  let sum = 0
  for (let i = 0; i < Math.min(first - a.from, a.atoms.length); i += 1) {
    sum += (a.atoms[i] as number) + (a.smooth[i] as number)
  }
  for (let k = 0; k < count; k += 1) {
    const i = first + k - a.from
    before[k] = sum
    upTo[k] = sum + (a.atoms[i] ?? 0)
    sum += (a.atoms[i] ?? 0) + (a.smooth[i] ?? 0)
  }
  return { before, upTo }
}

/** How two distribution functions make a third: their product (independent) or the smaller (as tied as can be). */
type Joint = (a: number, b: number) => number

function joined(a: Duration, b: Duration, joint: Joint): Duration {
  const from = Math.max(a.from, b.from)
  const count = Math.max(a.from + a.atoms.length, b.from + b.atoms.length) - from + 1
  const x = steps(a, from, count)
  const y = steps(b, from, count)
  const atoms = new Float64Array(count)
  const smooth = new Float64Array(count)
  for (let k = 0; k < count; k += 1) {
    const upTo = joint(x.upTo[k] as number, y.upTo[k] as number)
    atoms[k] = Math.max(0, upTo - (k === 0 ? 0 : joint(x.before[k] as number, y.before[k] as number)))
    const next = k + 1 < count ? joint(x.before[k + 1] as number, y.before[k + 1] as number) : upTo
    smooth[k] = Math.max(0, next - upTo)
  }
  return trimmed({ from, atoms, smooth })
}

/**
 * Side by side: the longer of two independent lengths. Exact at every cell edge.
 * @example inParallel(certain(1), certain(2)).from  // → 4
 */
export function inParallel(a: Duration, b: Duration): Duration {
  return joined(a, b, (x, y) => x * y)
}

/**
 * The soonest the longer of two lengths can be when nothing is known of how they hang together: the smaller chance at
 * every day.
 * @example soonestOfBoth(certain(1), certain(2)).from  // → 4
 */
export function soonestOfBoth(a: Duration, b: Duration): Duration {
  return joined(a, b, Math.min)
}

/**
 * The chance that a length is over by a day; within a cell the even part counts in proportion.
 * Units: days.
 * @example chanceWithin(certain(3), 3)  // → 1
 */
export function chanceWithin({ from, atoms, smooth }: Duration, day: number): number {
  const place = day / CELL_DAYS - from
  if (place < 0) return 0
  if (place >= atoms.length) return 1
  const cell = Math.floor(place)
  let sum = 0
  for (let i = 0; i < Math.min(cell, atoms.length); i += 1)
    sum += (atoms[i] as number) + (smooth[i] as number)
  sum += (atoms[cell] ?? 0) + (place - cell) * (smooth[cell] ?? 0)
  return Math.min(1, sum)
}

/**
 * The expected length. Units: days.
 * @example meanDays(certain(2.3))  // → ≈ 2.3
 */
export function meanDays({ from, atoms, smooth }: Duration): number {
  let sum = 0
  for (let i = 0; i < atoms.length; i += 1) {
    sum += (from + i) * (atoms[i] as number) + (from + i + 0.5) * (smooth[i] as number)
  }
  return sum * CELL_DAYS
}
