import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { runMigrations } from 'graphile-worker'
import { Client, Pool } from 'pg'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { PoolLock } from '@/lib/jobs/pool-lock'

const databaseUrl = process.env.DATABASE_URL ?? ''
const client = new Client({ connectionString: databaseUrl })
const started: ChildProcess[] = []

async function startOne() {
  const child = spawn(process.execPath, ['--import', 'tsx', 'tests/jobs/fixtures/worker.ts'], {
    env: { ...process.env, TSX_TSCONFIG_PATH: 'tsconfig.scripts.json' },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  started.push(child)
  const [first] = await Promise.race([once(child.stdout!, 'data'), once(child, 'exit')])
  if (typeof first === 'number') throw new Error(`the worker ended with ${first} before it was ready`)
  return child
}

const addJob = (path: string, queue: string | null) =>
  client.query('select graphile_worker.add_job($1, payload => $2::json, queue_name => $3)', [
    'evict_pages',
    JSON.stringify({ paths: [path] }),
    queue,
  ])

const begun = async (path: string) =>
  (
    await client.query<{ pid: number; attempt: number }>(
      'select pid, attempt from begun where path = $1 order by attempt',
      [path],
    )
  ).rows

beforeAll(async () => {
  await client.connect()
  await runMigrations({ connectionString: databaseUrl })
  await client.query('create table begun (path text, pid integer, attempt integer)')
  await Promise.all([startOne(), startOne()])
})

afterAll(async () => {
  for (const child of started) child.kill('SIGKILL')
  await client.end()
})

describe('with two workers running', () => {
  test.each([
    ['a plain job', null],
    ['a job of a queue', 'one-at-a-time'],
  ])('%s of a killed worker begins again on the other within seconds', async (path, queue) => {
    await addJob(path, queue)
    await expect.poll(() => begun(path), { timeout: 5_000 }).toHaveLength(1)
    const [first] = await begun(path)
    const victim = started.find((child) => child.pid === first?.pid)
    if (!victim) throw new Error('the job began in no worker of this test')

    victim.kill('SIGKILL')
    const killedAt = performance.now()
    await expect.poll(() => begun(path), { timeout: 10_000, interval: 50 }).toHaveLength(2)

    expect(performance.now() - killedAt).toBeLessThan(6_000)
    const [, second] = await begun(path)
    expect(second?.pid).not.toBe(first?.pid)
    await expect
      .poll(
        async () =>
          (
            await client.query(
              'select 1 from graphile_worker.jobs where task_identifier = $1 and locked_at is null',
              ['evict_pages'],
            )
          ).rowCount,
      )
      .toBe(0)
    await startOne()
  })
})

test('the jobs of a living worker stay its own', async () => {
  await addJob('long', null)
  await expect.poll(() => begun('long'), { timeout: 5_000 }).toHaveLength(1)
  const pool = new Pool({ connectionString: databaseUrl })
  const onlooker = await PoolLock.open(databaseUrl, pool, fail)

  const looks = [
    await onlooker.freeDeadPools(),
    await onlooker.freeDeadPools(),
    await onlooker.freeDeadPools(),
  ]

  expect(looks).toEqual([[], [], []])
  expect(await begun('long')).toHaveLength(1)
  await onlooker.close()
  await pool.end()
})

function fail(error: unknown): never {
  throw error
}
