import 'server-only'
import type { Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { JOBS, type JobName, type JobPayload } from './names'

/** `key` makes a second waiting job of the same key replace the first; `runAt` is real time, for retries only. */
export type EnqueueOptions = { key?: string; runAt?: Date; maxAttempts?: number; queue?: string }

/**
 * Promises work in the same transaction as the change that calls for it: both happen or neither.
 * Throws for a payload that is not the job's.
 */
export async function enqueue<N extends JobName>(
  tx: Transaction,
  name: N,
  payload: JobPayload<N>,
  { key, runAt, maxAttempts, queue }: EnqueueOptions = {},
): Promise<void> {
  const checked = JOBS[name].parse(payload)
  await sequelize.query(
    `select graphile_worker.add_job(:name, payload => cast(:payload as json), queue_name => :queue,
       run_at => :runAt, max_attempts => :maxAttempts, job_key => :key)`,
    {
      replacements: {
        name,
        payload: JSON.stringify(checked),
        queue: queue ?? null,
        runAt: runAt?.toISOString() ?? null,
        maxAttempts: maxAttempts ?? null,
        key: key ?? null,
      },
      transaction: tx,
    },
  )
}
