/**
 * Every place on the way of a deposit, and on its way back, at which the tests of faults kill the process, in the order
 * they are passed. A name that no test reaches makes the fault tests fail.
 */
export const DEPOSIT_CRASH_POINTS = [
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

/** The same for what follows the lock: announcing, charging, lapsing. */
export const BALANCE_CRASH_POINTS = [
  'run_locked',
  'bulk_item_before_commit',
  'balance_requested',
  'balance_provider_answered',
  'balance_sent',
  'due_handled',
  'lapse_payments_ended',
] as const

export type CrashPoint = (typeof DEPOSIT_CRASH_POINTS)[number] | (typeof BALANCE_CRASH_POINTS)[number]
