import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a workshop stands; suspending stops new money only. */
export type WorkshopState = 'pending' | 'open' | 'suspended'

/** What moves a workshop on. */
export type WorkshopEvent = 'start' | 'open' | 'suspend' | 'reopen'

/**
 * The moves of a workshop. A pending one may be edited and previewed; the host opens it.
 * Source: states.md of the design.
 * @example next(WORKSHOP_MOVES, 'pending', 'open')  // → ok('open')
 */
export const WORKSHOP_MOVES: readonly Move<WorkshopState, WorkshopEvent>[] = [
  { from: null, event: 'start', to: 'pending' },
  { from: 'pending', event: 'open', to: 'open' },
  { from: 'open', event: 'suspend', to: 'suspended' },
  { from: 'suspended', event: 'reopen', to: 'open' },
]
