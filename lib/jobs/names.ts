import { z } from 'zod'

/**
 * Every job and the shape of its payload: ids only, since a payload outlives the row it was made from.
 * The handler of each is the file of its name in `lib/tasks`.
 */
export const JOBS = {
  due: z.object({}),
  evict_pages: z.object({ paths: z.array(z.string()) }),
  send_mail: z.object({ mailId: z.uuid() }),
} as const

export type JobName = keyof typeof JOBS
export type JobPayload<N extends JobName> = z.infer<(typeof JOBS)[N]>
