import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where an invitation stands. */
export type InvitationState = 'sent' | 'ordered' | 'declined' | 'expired'

/** What moves an invitation on. */
export type InvitationEvent = 'send' | 'order' | 'decline' | 'end'

/**
 * The moves of an invitation of a sign-up to a run.
 * Source: states.md of the design.
 * @example next(INVITATION_MOVES, 'sent', 'order')  // → ok('ordered')
 */
export const INVITATION_MOVES: readonly Move<InvitationState, InvitationEvent>[] = [
  { from: null, event: 'send', to: 'sent' },
  { from: 'sent', event: 'order', to: 'ordered' },
  { from: 'sent', event: 'decline', to: 'declined' },
  { from: 'sent', event: 'end', to: 'expired' },
]
