/**
 * Every place at which the tests of faults kill the process, in the order of a deposit's path. A name that no test
 * reaches makes the fault tests fail.
 */
export const CRASH_POINTS = [
  'order_placed',
  'attempt_requested',
  'provider_answered',
  'attempt_sent',
  'event_stored',
  'event_before_apply',
  'event_before_commit',
  'event_applied',
  'hold_session_ended',
  'refund_requested',
  'refund_provider_answered',
  'refund_before_commit',
  'refund_sent',
  'mail_claimed',
  'mail_accepted',
  'mail_sent',
  'bulk_item_done',
] as const

export type CrashPoint = (typeof CRASH_POINTS)[number]
