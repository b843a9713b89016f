import { type Move } from '@/lib/core/states/next'

export { next } from '@/lib/core/states/next'

/** Where a mail stands. */
export type MailState = 'queued' | 'sending' | 'sent' | 'given_up' | 'dropped' | 'bounced'

/** What moves a mail on. */
export type MailEvent = 'queue' | 'claim' | 'accept' | 'defer' | 'give_up' | 'drop' | 'bounce'

/**
 * The moves of a mail in the outbox. A queued mail that is no longer true is dropped.
 * Source: states.md of the design.
 * @example next(MAIL_MOVES, 'sending', 'defer')  // → ok('queued')
 */
export const MAIL_MOVES: readonly Move<MailState, MailEvent>[] = [
  { from: null, event: 'queue', to: 'queued' },
  { from: 'queued', event: 'claim', to: 'sending' },
  { from: 'sending', event: 'accept', to: 'sent' },
  { from: 'sending', event: 'defer', to: 'queued' },
  { from: 'sending', event: 'give_up', to: 'given_up' },
  { from: 'queued', event: 'drop', to: 'dropped' },
  { from: 'sent', event: 'bounce', to: 'bounced' },
]
