import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a purchase line stands. */
export type PurchaseLineState = 'planned' | 'ordered' | 'part_received' | 'received' | 'cancelled'

/** What moves a purchase line on. */
export type PurchaseLineEvent = 'plan' | 'order' | 'receive_some' | 'receive_all' | 'close_short' | 'cancel'

/**
 * The moves of a purchase line: one part bought from one supplier.
 * Source: states.md of the design.
 * @example next(PURCHASE_LINE_MOVES, 'ordered', 'receive_some')  // → ok('part_received')
 */
export const PURCHASE_LINE_MOVES: readonly Move<PurchaseLineState, PurchaseLineEvent>[] = [
  { from: null, event: 'plan', to: 'planned' },
  { from: 'planned', event: 'order', to: 'ordered' },
  ...movesFrom(['ordered', 'part_received'], 'receive_some', 'part_received'),
  ...movesFrom(['ordered', 'part_received'], 'receive_all', 'received'),
  ...movesFrom(['ordered', 'part_received'], 'close_short', 'received'),
  ...movesFrom(['planned', 'ordered'], 'cancel', 'cancelled'),
]
