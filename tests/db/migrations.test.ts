import { fileURLToPath } from 'node:url'
import { Client } from 'pg'
import { afterAll, beforeEach, describe, expect, inject, test } from 'vitest'
import { migrateDown, migrateUp } from '../../scripts/support/migrations'

const folder = (name: string) => fileURLToPath(new URL(`./fixtures/${name}`, import.meta.url))
const NAME = `migrations_${process.pid}_${Math.random().toString(36).slice(2, 8)}`
const server = new URL(inject('serverUrl'))
const own = new URL(server)
own.pathname = `/${NAME}`

async function query<Row extends object>(url: URL, sql: string): Promise<Row[]> {
  const client = new Client({ connectionString: url.href })
  await client.connect()
  try {
    return (await client.query<Row>(sql)).rows
  } finally {
    await client.end()
  }
}

const names = (sql: string) => query<{ name: string }>(own, sql).then((rows) => rows.map(({ name }) => name))
const tables = () =>
  names(`select table_name as name from information_schema.tables where table_schema = 'public' order by 1`)
const applied = () => names('select name from migrations order by 1')

beforeEach(async () => {
  await query(server, `drop database if exists "${NAME}" with (force)`)
  await query(server, `create database "${NAME}"`)
})
afterAll(() => query(server, `drop database if exists "${NAME}" with (force)`))

test('up brings everything, twice changes nothing, down takes everything back', async () => {
  const said: string[] = []
  await migrateUp(own.href, { say: (line) => said.push(line) })
  const after = await tables()
  expect(said.length).toBe((await applied()).length)
  expect(after).toContain('orders')
  await migrateUp(own.href, { say: (line) => said.push(line) })
  expect(await tables()).toEqual(after)
  expect(said.length).toBe((await applied()).length)

  await migrateDown(own.href, said.length)
  expect(await tables()).toEqual(['migrations'])
  expect(
    await names(`select proname as name from pg_proc where pronamespace = 'public'::regnamespace`),
  ).toEqual([])
  await migrateUp(own.href)
  expect(await tables()).toEqual(after)
})

test('the job queue’s tables are there as well', async () => {
  await migrateUp(own.href)
  const [row] = await query<{ id: string }>(own, `select id from graphile_worker.add_job('due', '{}')`)
  expect(row?.id).toBeTruthy()
})

test('four started at once: one works, none fails', async () => {
  const said: string[] = []
  const start = () => migrateUp(own.href, { say: (line) => said.push(line) })
  await Promise.all([start(), start(), start(), start()])
  expect(said.length).toBe((await applied()).length)
})

describe('a file', () => {
  test('that fails takes its transaction with it', async () => {
    await expect(migrateUp(own.href, { folder: folder('broken') })).rejects.toThrow('2-wrong')
    expect(await tables()).toEqual(['migrations'])
    expect(await applied()).toEqual([])
  })

  test('that asks for no transaction runs alone, between the others', async () => {
    await migrateUp(own.href, { folder: folder('alone') })
    expect(await applied()).toEqual(['1-before', '2-alone', '3-after'])
    expect(await names(`select indexname as name from pg_indexes where tablename = 'before'`)).toEqual([
      'before_id_idx',
    ])
    await migrateDown(own.href, 2, { folder: folder('alone') })
    expect(await applied()).toEqual(['1-before'])
    expect(await tables()).toEqual(['before', 'migrations'])
  })
})
