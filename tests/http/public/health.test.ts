import { QueryTypes } from 'sequelize'
import { afterEach, expect, test } from 'vitest'
import { GET } from '@/app/api/health/route'
import { sequelize } from '@/lib/db/sequelize'
import { version } from '@/package.json'

const clear = () => sequelize.query('delete from graphile_worker._private_jobs')
afterEach(clear)

/** A job that was due so many minutes ago and that nobody has taken. */
const jobDue = (minutes: number) =>
  sequelize.query(
    `select graphile_worker.add_job('due', run_at := now() - make_interval(mins => :minutes))`,
    { replacements: { minutes }, type: QueryTypes.SELECT },
  )

test('says that database and jobs are well, and which version this is', async () => {
  await jobDue(1)
  const answer = await GET()
  expect(answer.status).toBe(200)
  expect(await answer.json()).toEqual({ status: 'ok', database: 'ok', jobs: 'ok', version })
})

test('says when no worker takes what is due', async () => {
  await jobDue(6)
  const answer = await GET()
  expect(answer.status).toBe(200)
  expect(await answer.json()).toMatchObject({ status: 'degraded', database: 'ok', jobs: 'late' })
})
