import { movesFrom, type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a revision stands. */
export type RevisionState = 'draft' | 'testing' | 'proven' | 'superseded'

/** What moves a revision on. */
export type RevisionEvent = 'create' | 'test' | 'prove' | 'supersede'

/**
 * The moves of a revision of a module's electronics.
 * Source: states.md of the design.
 * @example next(REVISION_MOVES, 'testing', 'prove')  // → ok('proven')
 */
export const REVISION_MOVES: readonly Move<RevisionState, RevisionEvent>[] = [
  { from: null, event: 'create', to: 'draft' },
  { from: 'draft', event: 'test', to: 'testing' },
  { from: 'testing', event: 'prove', to: 'proven' },
  ...movesFrom(['draft', 'testing', 'proven'], 'supersede', 'superseded'),
]
