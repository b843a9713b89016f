import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a run stands; buying, building and posting are progress per offer, not states of the run. */
export type RunState = 'draft' | 'taking_deposits' | 'locked' | 'closed' | 'called_off'

/** What moves a run on. */
export type RunEvent = 'create' | 'open_deposits' | 'lock' | 'close' | 'call_off'

/**
 * The moves of a run, from draft to closed or called off.
 * Source: states.md of the design.
 * @example next(RUN_MOVES, 'draft', 'open_deposits')  // → ok('taking_deposits')
 */
export const RUN_MOVES: readonly Move<RunState, RunEvent>[] = [
  { from: null, event: 'create', to: 'draft' },
  { from: 'draft', event: 'open_deposits', to: 'taking_deposits' },
  { from: 'taking_deposits', event: 'lock', to: 'locked' },
  { from: 'locked', event: 'close', to: 'closed' },
  ...movesFrom(['draft', 'taking_deposits', 'locked'], 'call_off', 'called_off'),
]
