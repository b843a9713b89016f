import { Pool } from 'pg'
import { sandboxPool } from '@/lib/gateways/payments/fake/pool'
import { JOBS, type JobName } from '@/lib/jobs/names'
import { TASKS } from '@/lib/tasks'

type Job = { id: string; name: JobName; payload: unknown; attempts: number; max: number }

/** The next job that waits, of those in turn; a killed worker's counts as waiting, as its pool's lock is free. */
const TAKE = `
  update graphile_worker._private_jobs as job set attempts = job.attempts + 1, locked_at = now(), locked_by = 'here'
  from (
    select j.id, t.identifier from graphile_worker._private_jobs j
    join graphile_worker._private_tasks t on t.id = j.task_id
    where j.run_at <= now() and t.identifier = any($1) and j.attempts < j.max_attempts
    order by j.run_at, j.id limit 1) as next
  where job.id = next.id
  returning job.id::text, next.identifier as name, job.payload, job.attempts, job.max_attempts as max`

const MOST_JOBS = 500
let pool: Pool | undefined

const queue = () => (pool ??= new Pool({ connectionString: process.env.DATABASE_URL, max: 2 }))

/**
 * Does the jobs that wait, and those they make, one after the other in this process: what the worker does, without its
 * polling. One that fails comes again after its pause (`wakeQueue`). Answers how many failed.
 */
export async function work(names: readonly JobName[]): Promise<number> {
  let failed = 0
  for (let done = 0; done < MOST_JOBS; done += 1) {
    const { rows } = await queue().query<Job>(TAKE, [names])
    const job = rows[0]
    if (!job) return failed
    try {
      const task = TASKS[job.name] as (payload: unknown, context: object) => Promise<void>
      await task(JOBS[job.name].parse(job.payload), {
        jobId: job.id,
        attempt: job.attempts,
        maxAttempts: job.max,
      })
      await queue().query('delete from graphile_worker._private_jobs where id = $1', [job.id])
    } catch (error) {
      failed += 1
      await queue().query(
        `update graphile_worker._private_jobs set locked_at = null, locked_by = null, last_error = $2,
           run_at = now() + interval '1 hour' where id = $1`,
        [job.id, String(error)],
      )
    }
  }
  throw new Error('the jobs make jobs without end')
}

/** The pauses of jobs that failed are over. */
export const wakeQueue = () =>
  queue().query(`update graphile_worker._private_jobs set run_at = now() where run_at > now()`)

/** Jobs still there, with why they failed last. */
export async function jobsLeft(): Promise<string[]> {
  const { rows } = await queue().query<{ name: string; error: string | null }>(
    `select t.identifier as name, j.last_error as error from graphile_worker._private_jobs j
     join graphile_worker._private_tasks t on t.id = j.task_id where t.identifier <> 'send_mail'`,
  )
  return rows.map(({ name, error }) => `${name}: ${error ?? 'waits'}`)
}

/** Takes a world that is done with out of everybody's way: its jobs, dues and the provider's plans. */
export async function clearAway(): Promise<void> {
  // Makes the provider's books where there are none.
  await sandboxPool()
  await queue().query('delete from graphile_worker._private_jobs')
  await queue().query('delete from due_items')
  await queue().query('update sandbox.objects set due_at = null where due_at is not null')
  await queue().query('delete from sandbox.events')
}

export async function closeQueue(): Promise<void> {
  await pool?.end()
  pool = undefined
}
