import { checkEnv, env } from '@/lib/config/env'
import { log } from '@/lib/config/log'
import { sequelize } from '@/lib/db/sequelize'
import { startWorker } from './support/start-worker'
import { TASKS } from '@/lib/tasks'

// Does the queued work. Run as many as you like beside each other.
const problems = checkEnv()
if (problems.length > 0) {
  process.stderr.write(`${problems.join('\n')}\n`)
  process.exit(78)
}

const worker = await startWorker({ databaseUrl: env().DATABASE_URL, tasks: TASKS, everyMinute: ['due'] })
process.stdout.write('ready\n')

let isEnding = false
async function end() {
  if (isEnding) return
  isEnding = true
  await worker.stop()
  await sequelize.close()
  process.exit(0)
}
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void end())

// Ended unasked, or its lock is lost: begin afresh under the supervisor.
worker.ended.then(
  () => !isEnding && process.exit(1),
  (error: unknown) => {
    if (isEnding) return
    log().fatal({ error }, 'worker ended')
    process.exit(1)
  },
)
