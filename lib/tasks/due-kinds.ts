import 'server-only'
import type { DueKind } from '@/lib/jobs/due-kinds'
import { attemptLookUp, compareBooksDue, holdEnded, refundLookUp, refundRetry } from './due-money'
import { ownerDigest, runForecast, runReminder } from './due-owners'
import { balanceCharge, balanceReminder, decideByPassed, orderLapse, runPage } from './due-runs'
import { deleteUnconfirmedSignUp } from '@/lib/services/signups/delete-unconfirmed-signup'

export type DueItem = { kind: DueKind; subjectId: string; workshopId: string | null; dueAt: Date }

/**
 * Does what has fallen due. May run again after a crash: it asks the state of its subject first and does
 * nothing when the moment has passed. It may set the same kind again for a later instant.
 */
export type DueHandler = (item: DueItem, now: Date) => Promise<void>

export const DUE_HANDLERS: { readonly [K in DueKind]: DueHandler } = {
  signup_unconfirmed: async (item) => void (await deleteUnconfirmedSignUp({ signUpId: item.subjectId })),
  hold_ended: holdEnded,
  attempt_look_up: attemptLookUp,
  refund_look_up: refundLookUp,
  refund_retry: refundRetry,
  balance_charge: balanceCharge,
  balance_reminder: balanceReminder,
  order_lapse: orderLapse,
  decide_by_passed: decideByPassed,
  run_page: runPage,
  compare_books: compareBooksDue,
  run_forecast: runForecast,
  run_reminder: runReminder,
  owner_digest: ownerDigest,
}
