import 'server-only'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

export type Health = { database: 'ok' | 'down'; jobs: 'ok' | 'late' | 'unknown' }

/** A job due this long without anybody taking it means that no worker runs. */
const LATE_MINUTES = 5

/** Whether the database answers and jobs are being taken. Never throws: a database that is down is an answer here. */
export function getHealth(): Promise<Health> {
  const asked = sequelize.query<{ late: boolean }>(
    `select exists (select 1 from graphile_worker.jobs
                    where locked_at is null and attempts = 0 and run_at < now() - make_interval(mins => :minutes)) as late`,
    { replacements: { minutes: LATE_MINUTES }, type: QueryTypes.SELECT },
  )
  return asked.then(
    ([row]): Health => ({ database: 'ok', jobs: row?.late ? 'late' : 'ok' }),
    (): Health => ({ database: 'down', jobs: 'unknown' }),
  )
}
