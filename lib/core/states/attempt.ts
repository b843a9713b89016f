import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a payment attempt stands. */
export type AttemptState =
  'requested' | 'sent' | 'unknown' | 'needs_customer' | 'abandoned' | 'failed' | 'captured'

/** What moves an attempt on. */
export type AttemptEvent =
  'request' | 'send' | 'lose_answer' | 'abandon' | 'needs_customer' | 'capture' | 'fail'

/**
 * The moves of one call for money. An unknown outcome is a state that only a webhook or a look-up ends;
 * a capture may still come late, after failed or abandoned.
 * Source: states.md of the design.
 * @example next(ATTEMPT_MOVES, 'unknown', 'capture')  // → ok('captured')
 */
export const ATTEMPT_MOVES: readonly Move<AttemptState, AttemptEvent>[] = [
  { from: null, event: 'request', to: 'requested' },
  { from: 'requested', event: 'send', to: 'sent' },
  ...movesFrom(['requested', 'sent'], 'lose_answer', 'unknown'),
  ...movesFrom(['requested', 'unknown', 'sent', 'needs_customer'], 'abandon', 'abandoned'),
  ...movesFrom(['requested', 'sent', 'unknown'], 'needs_customer', 'needs_customer'),
  ...movesFrom(
    ['requested', 'sent', 'unknown', 'needs_customer', 'failed', 'abandoned'],
    'capture',
    'captured',
  ),
  ...movesFrom(['requested', 'sent', 'unknown', 'needs_customer'], 'fail', 'failed'),
]
