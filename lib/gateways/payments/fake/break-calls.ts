import 'server-only'

/**
 * How a call is broken: `before` and `after` lose the connection before or after it was carried out, `error_500`
 * answers 500 after it was carried out (and again for the same key), `error_429` answers 429 without carrying it out.
 */
export type Break = 'before' | 'after' | 'error_500' | 'error_429'

/** Decides for the n-th call of this process, from 1; the SDK's own repeats count. */
export type BreakPlan = (call: { n: number; method: 'get' | 'post'; path: string }) => Break | null

let plan: BreakPlan | null = null
let calls = 0

/** Breaks calls of this process by plan, beside the faults of the seed; null ends it. For tests. */
export function breakCalls(wanted: BreakPlan | null): void {
  plan = wanted
  calls = 0
}

/** How the next call is to break. */
export function nextBreak(method: 'get' | 'post', path: string): Break | null {
  calls += 1
  return plan?.({ n: calls, method, path }) ?? null
}

/** How many calls were made since the last `breakCalls`. */
export function callsSoFar(): number {
  return calls
}
