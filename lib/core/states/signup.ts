import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a sign-up stands; only a confirmed one counts. */
export type SignupState = 'unconfirmed' | 'confirmed' | 'superseded' | 'taken_back'

/** What moves a sign-up on. */
export type SignupEvent = 'submit' | 'confirm' | 'supersede' | 'take_back'

/**
 * The moves of a sign-up. An unconfirmed one is deleted after 14 days, which is no state.
 * Source: states.md of the design.
 * @example next(SIGNUP_MOVES, 'unconfirmed', 'confirm')  // → ok('confirmed')
 */
export const SIGNUP_MOVES: readonly Move<SignupState, SignupEvent>[] = [
  { from: null, event: 'submit', to: 'unconfirmed' },
  { from: 'unconfirmed', event: 'confirm', to: 'confirmed' },
  { from: 'confirmed', event: 'supersede', to: 'superseded' },
  { from: 'confirmed', event: 'take_back', to: 'taken_back' },
]
