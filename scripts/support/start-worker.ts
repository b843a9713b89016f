import { Logger, parseCronItems, run, type TaskList, type WorkerEvents } from 'graphile-worker'
import { EventEmitter } from 'node:events'
import { Pool } from 'pg'
import { log } from '@/lib/config/log'
import { JOBS, type JobName, type JobPayload } from '@/lib/jobs/names'
import { PoolLock } from '@/lib/jobs/pool-lock'
import type { Task, Tasks } from '@/lib/jobs/task'

type Options = { databaseUrl: string; tasks: Tasks; concurrency?: number; everyMinute?: JobName[] }

/** A running worker: `stop` lets the jobs in hand finish; `ended` settles when it has stopped, by itself or not. */
export type RunningWorker = { stop: () => Promise<void>; ended: Promise<void> }

/**
 * Takes jobs from the queue, several at once. Any number of workers may run beside each other; a killed
 * one's jobs begin again on the others within seconds.
 */
export async function startWorker(options: Options): Promise<RunningWorker> {
  const { databaseUrl, tasks, concurrency = 5, everyMinute = [] } = options
  const pool = new Pool({ connectionString: databaseUrl, max: concurrency + 3 })
  const sayLost = (error: unknown) => log().warn({ error }, 'worker lost a connection')
  pool.on('error', sayLost)
  pool.on('connect', (client) => client.on('error', sayLost))

  let lose!: (error: unknown) => void
  const lost = new Promise<never>((_, reject) => (lose = reject))
  // Without its lock the worker counts as dead and others take its jobs: it has to end.
  const lock = await PoolLock.open(databaseUrl, pool, lose)

  const events = new EventEmitter() as WorkerEvents
  events.on('pool:create', ({ workerPool }) => void lock.hold(workerPool.id).catch(lose))
  const runner = await run({
    pgPool: pool,
    taskList: taskListOf(tasks),
    parsedCronItems: parseCronItems(everyMinute.map(eachMinute)),
    concurrency,
    events,
    logger: quietLogger(),
    noHandleSignals: true,
    gracefulShutdownAbortTimeout: 20_000,
    maxPoolSize: concurrency + 3,
  })
  lock.startLooking()

  const close = async () => {
    await lock.close().catch(() => {})
    await pool.end()
  }
  return {
    stop: async () => {
      await runner.stop()
      await close()
    },
    ended: Promise.race([runner.promise, lost]),
  }
}

function taskListOf(tasks: Tasks): TaskList {
  return Object.fromEntries((Object.keys(JOBS) as JobName[]).map((name) => [name, taskOf(name, tasks)]))
}

function taskOf<N extends JobName>(name: N, tasks: Tasks): TaskList[string] {
  const task: Task<N> = tasks[name]
  return async (payload, { job }) => {
    const began = performance.now()
    const context = { jobId: job.id, attempt: job.attempts, maxAttempts: job.max_attempts }
    try {
      await task(JOBS[name].parse(payload ?? {}) as JobPayload<N>, context)
      log().debug({ job: name, ...context, ms: Math.round(performance.now() - began) }, 'job done')
    } catch (error) {
      log().error({ job: name, ...context, error }, 'job failed')
      throw error
    }
  }
}

/** One waiting at a time, never two side by side: a slow minute must not pile up. */
function eachMinute(task: JobName) {
  return { task, match: '* * * * *', options: { queueName: task, jobKey: task, maxAttempts: 1 } }
}

/** Failures are logged where they happen, with the job's name; the queue's own chatter is for debugging. */
function quietLogger(): Logger {
  return new Logger(() => (level, message) => {
    if (level === 'warning') log().warn({ from: 'queue' }, message)
    else if (level === 'error' && !message.startsWith('Failed task')) log().error({ from: 'queue' }, message)
    else log().debug({ from: 'queue' }, message)
  })
}
