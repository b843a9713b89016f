/**
 * The finish of a network as sums and maxima of lengths. `level` is 0 where nothing shared occurs, else one more than
 * the number of the last shared length in it; `point` marks what is a single day once the shared lengths are given.
 */
export type Expression = { readonly level: number; readonly point: boolean; readonly widthDays: number } & (
  | { readonly kind: 'nothing' }
  | { readonly kind: 'step'; readonly step: number }
  | { readonly kind: 'shared'; readonly shared: number }
  | { readonly kind: 'series' | 'parallel'; readonly first: Expression; readonly second: Expression }
)

/**
 * No time at all: the length of a bare "after".
 * @example NOTHING.point  // → true
 */
export const NOTHING: Expression = { kind: 'nothing', level: 0, point: true, widthDays: 0 }

/**
 * The length of a step; `widthDays` = pessimistic − optimistic.
 * @example stepLength(0, 3).point  // → false
 */
export function stepLength(step: number, widthDays: number): Expression {
  return { kind: 'step', step, level: 0, point: widthDays === 0, widthDays }
}

/**
 * A length that several ways to the finish share, taken as given.
 * @example sharedLength(0).level  // → 1
 */
export function sharedLength(shared: number): Expression {
  return { kind: 'shared', shared, level: shared + 1, point: true, widthDays: 0 }
}

/**
 * One after the other.
 * @example series(NOTHING, NOTHING).kind  // → 'nothing'
 */
export function series(first: Expression, second: Expression): Expression {
  if (first.kind === 'nothing') return second
  if (second.kind === 'nothing') return first
  return {
    kind: 'series',
    first,
    second,
    level: Math.max(first.level, second.level),
    point: first.point && second.point,
    widthDays: first.widthDays + second.widthDays,
  }
}

/**
 * Side by side, done when both are.
 * @example parallel(NOTHING, stepLength(0, 3)).kind  // → 'step'
 */
export function parallel(first: Expression, second: Expression): Expression {
  // Nothing takes as long as any step at least: lengths are never negative.
  if (first.kind === 'nothing') return second
  if (second.kind === 'nothing') return first
  return {
    kind: 'parallel',
    first,
    second,
    level: Math.max(first.level, second.level),
    point: first.point && second.point,
    widthDays: Math.max(first.widthDays, second.widthDays),
  }
}
