import { z } from 'zod'

/**
 * Every job and the shape of its payload: ids only, since a payload outlives the row it was made from.
 * The handler of each is the file of its name in `lib/tasks`.
 */
export const JOBS = {
  apply_provider_event: z.object({ eventId: z.uuid() }),
  due: z.object({}),
  evict_pages: z.object({ paths: z.array(z.string()) }),
  offer_freed_place: z.object({ runId: z.uuid() }),
  run_bulk: z.object({ bulkId: z.uuid() }),
  send_mail: z.object({ mailId: z.uuid() }),
  send_refund: z.object({ refundId: z.uuid() }),
  settle_attempt: z.object({ attemptId: z.uuid() }),
} as const

export type JobName = keyof typeof JOBS
export type JobPayload<N extends JobName> = z.infer<(typeof JOBS)[N]>
