import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a lot stands. */
export type LotState = 'received' | 'accepted' | 'rejected' | 'sorted' | 'sent_back'

/** What moves a lot on. */
export type LotEvent = 'receive' | 'accept' | 'reject' | 'sort' | 'send_back' | 'waive'

/**
 * The moves of a received lot of parts.
 * Source: states.md of the design.
 * @example next(LOT_MOVES, 'rejected', 'waive')  // → ok('accepted')
 */
export const LOT_MOVES: readonly Move<LotState, LotEvent>[] = [
  { from: null, event: 'receive', to: 'received' },
  { from: 'received', event: 'accept', to: 'accepted' },
  { from: 'received', event: 'reject', to: 'rejected' },
  { from: 'received', event: 'sort', to: 'sorted' },
  { from: 'rejected', event: 'send_back', to: 'sent_back' },
  { from: 'rejected', event: 'waive', to: 'accepted' },
]
