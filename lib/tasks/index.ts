import 'server-only'
import type { Tasks } from '@/lib/jobs/task'
import { applyProviderEventJob } from './apply-provider-event'
import { due } from './due'
import { evictPages } from './evict-pages'
import { offerFreedPlaceJob } from './offer-freed-place'
import { runBulk } from './run-bulk'
import { sendMail } from './send-mail'
import { sendRefundJob } from './send-refund'
import { settleAttemptJob } from './settle-attempt'

/** The handler of every job. */
export const TASKS: Tasks = {
  apply_provider_event: applyProviderEventJob,
  due,
  evict_pages: evictPages,
  offer_freed_place: offerFreedPlaceJob,
  run_bulk: runBulk,
  send_mail: sendMail,
  send_refund: sendRefundJob,
  settle_attempt: settleAttemptJob,
}
