import { share } from '../stats/argument'

/** What share of the deposits is in by each part of the time they may be placed in. */
export type Arrivals = {
  /** The share in by a part of the window: 0 at 0, 1 at 1, never falling. */
  readonly shareBy: (part: number) => number
  /** The share that came in each tenth of the window; adds up to 1. */
  readonly tenths: readonly number[]
}

/** How many deposits the starting curve weighs against those seen. Our own value; common practice, no source. */
const STARTING_WEIGHT = 20

/** The starting curve: a third in the first tenth, a quarter in the last, evenly between. Common practice, no source. */
const STARTING_CURVE: readonly (readonly [part: number, share: number])[] = [
  [0, 0],
  [0.1, 0.33],
  [0.9, 0.75],
  [1, 1],
]

function startingShare(part: number): number {
  for (let i = 1; i < STARTING_CURVE.length; i += 1) {
    const [from, low] = STARTING_CURVE[i - 1] as readonly [number, number]
    const [to, high] = STARTING_CURVE[i] as readonly [number, number]
    if (part <= to) return low + ((high - low) * (part - from)) / (to - from)
  }
  return 1
}

/**
 * What share of the deposits is in by each part of the window, learned from closed runs. The first and the last days
 * are heavy, so elapsed time alone is a poor guide. Feeds `stillToCome` as `arrivedShare`.
 * Units: each run is a list with, for each deposit, the part of the window gone when it came (0 = opening, 1 = decide-by).
 * Domain: parts from 0 to 1 → otherwise RangeError. No history: the starting curve alone.
 * Rounding: none; every deposit weighs the same, the starting curve as much as 20 of them.
 * Source: own rule; the starting curve is common practice, no source.
 * Cost: O(deposits · log deposits) once, then O(log deposits).
 * @example arrivals([]).shareBy(0.1)  // → ≈ 0.33
 * @example arrivals([Array(80).fill(0.5)]).shareBy(1)  // → 1
 */
export function arrivals(history: readonly (readonly number[])[]): Arrivals {
  const seen = history.flat().sort((a, b) => a - b)
  for (const part of seen) share('history', part)
  const shareBy = (part: number) => {
    share('part', part)
    if (part === 1) return 1
    let low = 0
    let high = seen.length
    while (low < high) {
      const middle = (low + high) >> 1
      if ((seen[middle] as number) <= part) low = middle + 1
      else high = middle
    }
    // Deposits at the very opening came after it: nothing is in at part 0.
    const arrived = part === 0 ? 0 : low
    return (STARTING_WEIGHT * startingShare(part) + arrived) / (STARTING_WEIGHT + seen.length)
  }
  const tenths = Array.from({ length: 10 }, (_, i) => shareBy((i + 1) / 10) - shareBy(i / 10))
  return { shareBy, tenths }
}
