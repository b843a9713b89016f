import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a problem stands. */
export type ProblemState = 'open' | 'answered' | 'closed'

/** What moves a problem on. */
export type ProblemEvent = 'open' | 'answer' | 'reopen' | 'close'

/**
 * The moves of a problem reported after posting; a closed one reopens within 30 days.
 * Source: states.md of the design.
 * @example next(PROBLEM_MOVES, 'answered', 'close')  // → ok('closed')
 */
export const PROBLEM_MOVES: readonly Move<ProblemState, ProblemEvent>[] = [
  { from: null, event: 'open', to: 'open' },
  { from: 'open', event: 'answer', to: 'answered' },
  { from: 'answered', event: 'reopen', to: 'open' },
  { from: 'answered', event: 'close', to: 'closed' },
  { from: 'closed', event: 'reopen', to: 'open' },
]
