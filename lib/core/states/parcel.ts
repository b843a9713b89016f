import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a parcel stands. */
export type ParcelState = 'open' | 'packed' | 'discarded' | 'handed_over' | 'delivered' | 'lost' | 'returned'

/** What moves a parcel on. */
export type ParcelEvent =
  'open' | 'pack' | 'reopen' | 'discard' | 'hand_over' | 'deliver' | 'lose' | 'return' | 'find'

/**
 * The moves of a parcel, from open to delivered, returned or discarded.
 * Source: states.md of the design.
 * @example next(PARCEL_MOVES, 'packed', 'hand_over')  // → ok('handed_over')
 */
export const PARCEL_MOVES: readonly Move<ParcelState, ParcelEvent>[] = [
  { from: null, event: 'open', to: 'open' },
  { from: 'open', event: 'pack', to: 'packed' },
  { from: 'packed', event: 'reopen', to: 'open' },
  { from: 'open', event: 'discard', to: 'discarded' },
  { from: 'packed', event: 'hand_over', to: 'handed_over' },
  { from: 'handed_over', event: 'deliver', to: 'delivered' },
  { from: 'handed_over', event: 'lose', to: 'lost' },
  { from: 'handed_over', event: 'return', to: 'returned' },
  { from: 'lost', event: 'find', to: 'delivered' },
  { from: 'delivered', event: 'return', to: 'returned' },
]
