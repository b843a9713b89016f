/**
 * What can fall due. Each kind has a handler in `lib/tasks/due-kinds.ts`; the subject is the id of the row
 * it is about (an order for `hold_ended`, a run for `decide_by`, …).
 */
export const DUE_KINDS = [
  'signup_unconfirmed',
  'hold_ended',
  'attempt_look_up',
  'refund_look_up',
  'refund_retry',
  'balance_charge',
  'balance_reminder',
  'order_lapse',
  'decide_by_passed',
  'run_page',
  'compare_books',
  'run_forecast',
  'run_reminder',
  'owner_digest',
] as const

export type DueKind = (typeof DUE_KINDS)[number]
