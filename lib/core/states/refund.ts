import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a refund stands. */
export type RefundState = 'requested' | 'sent' | 'unknown' | 'pending' | 'succeeded' | 'failed'

/** What moves a refund on. */
export type RefundEvent = 'request' | 'send' | 'lose_answer' | 'pend' | 'succeed' | 'fail'

/**
 * The moves of a refund. It may fail even after it succeeded; a retry is a new row.
 * Source: states.md of the design.
 * @example next(REFUND_MOVES, 'succeeded', 'fail')  // → ok('failed')
 */
export const REFUND_MOVES: readonly Move<RefundState, RefundEvent>[] = [
  { from: null, event: 'request', to: 'requested' },
  { from: 'requested', event: 'send', to: 'sent' },
  ...movesFrom(['requested', 'sent'], 'lose_answer', 'unknown'),
  ...movesFrom(['requested', 'sent', 'unknown'], 'pend', 'pending'),
  ...movesFrom(['requested', 'sent', 'unknown', 'pending'], 'succeed', 'succeeded'),
  ...movesFrom(['requested', 'sent', 'unknown', 'pending', 'succeeded'], 'fail', 'failed'),
]
