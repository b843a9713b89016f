import { Logger, runOnce, type TaskList } from 'graphile-worker'
import { JOBS, type JobName } from '@/lib/jobs/names'
import { TASKS } from '@/lib/tasks'

const quiet = new Logger(() => () => {})

/**
 * Does the jobs that wait, and those they make, in this process and now; mails stay in the outbox unless asked for. One
 * that fails waits for its next try, as with a worker.
 */
export async function runJobs(names: JobName[] = namesBut('send_mail')): Promise<void> {
  const taskList: TaskList = Object.fromEntries(
    names.map((name) => [
      name,
      (payload, { job }) =>
        (TASKS[name] as (payload: unknown, context: object) => Promise<void>)(JOBS[name].parse(payload), {
          jobId: job.id,
          attempt: job.attempts,
          maxAttempts: job.max_attempts,
        }),
    ]),
  )
  await runOnce({
    connectionString: process.env.DATABASE_URL!,
    taskList,
    logger: quiet,
    noHandleSignals: true,
    noPreparedStatements: true,
  })
}

function namesBut(left: JobName): JobName[] {
  return (Object.keys(JOBS) as JobName[]).filter((name) => name !== left)
}
