import 'server-only'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

export type Waiting = { jobs: number; due: number; mails: number }

/**
 * What is still to be done at this instant of business time: jobs that run or will be tried within a minute, due rows,
 * mails in the outbox. One statement.
 */
export async function countWaiting(now: Date): Promise<Waiting> {
  const [row] = await sequelize.query<Waiting>(
    `select
       (select count(*)::int from graphile_worker.jobs
        where locked_at is not null
           or (attempts < max_attempts and run_at <= now() + interval '1 minute')) as jobs,
       (select count(*)::int from due_items where done_at is null and due_at <= :now) as due,
       (select count(*)::int from mail_outbox where state in ('queued', 'sending')) as mails`,
    { replacements: { now: now.toISOString() }, type: QueryTypes.SELECT },
  )
  return row ?? { jobs: 0, due: 0, mails: 0 }
}
