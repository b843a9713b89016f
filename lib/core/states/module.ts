import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a module stands. */
export type ModuleState = 'draft' | 'published' | 'archived'

/** What moves a module on. */
export type ModuleEvent = 'create' | 'publish' | 'archive'

/**
 * The moves of a module; an archived one may be published again.
 * Source: states.md of the design.
 * @example next(MODULE_MOVES, 'archived', 'publish')  // → ok('published')
 */
export const MODULE_MOVES: readonly Move<ModuleState, ModuleEvent>[] = [
  { from: null, event: 'create', to: 'draft' },
  { from: 'draft', event: 'publish', to: 'published' },
  { from: 'published', event: 'archive', to: 'archived' },
  { from: 'archived', event: 'publish', to: 'published' },
]
