import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a unit stands. */
export type UnitState = 'started' | 'passed' | 'rework' | 'scrapped' | 'allocated' | 'posted' | 'returned'

/** What moves a unit on. */
export type UnitEvent =
  | 'start'
  | 'pass'
  | 'fail'
  | 'scrap'
  | 'fault_found'
  | 'allocate'
  | 'release'
  | 'hand_over'
  | 'return'
  | 'rework'

/**
 * The moves of a unit: one physical piece with a serial number.
 * Source: states.md of the design.
 * @example next(UNIT_MOVES, 'started', 'fail')  // → ok('rework')
 */
export const UNIT_MOVES: readonly Move<UnitState, UnitEvent>[] = [
  { from: null, event: 'start', to: 'started' },
  { from: 'started', event: 'pass', to: 'passed' },
  { from: 'started', event: 'fail', to: 'rework' },
  { from: 'rework', event: 'pass', to: 'passed' },
  ...movesFrom(['started', 'rework'], 'scrap', 'scrapped'),
  { from: 'passed', event: 'fault_found', to: 'rework' },
  { from: 'passed', event: 'allocate', to: 'allocated' },
  { from: 'allocated', event: 'release', to: 'passed' },
  { from: 'allocated', event: 'hand_over', to: 'posted' },
  { from: 'posted', event: 'return', to: 'returned' },
  { from: 'returned', event: 'rework', to: 'rework' },
  { from: 'returned', event: 'scrap', to: 'scrapped' },
]
