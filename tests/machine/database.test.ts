import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Client } from 'pg'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { databaseUrl, psql, removeDatabase, startDatabase, stopDatabase } from '../../scripts/database.mjs'

// A folder anybody may walk into, so that the server's own account can too.
const folder = mkdtempSync(join(tmpdir(), 'brimline-cluster-'))
const postmaster = join(folder, 'postgres', 'cluster', 'postmaster.pid')
const pidOfServer = () => Number(readFileSync(postmaster, 'utf8').split('\n')[0])

/** One start as a process of its own; gives back the address it printed. */
async function startOutside(): Promise<string> {
  const child = spawn(process.execPath, ['scripts/database.mjs', 'start', folder], {
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  let printed = ''
  child.stdout.on('data', (chunk: Buffer) => (printed += chunk.toString()))
  const [code] = (await once(child, 'close')) as [number]
  expect(code).toBe(0)
  return printed.trim()
}

const startThree = () => Promise.all([startOutside(), startOutside(), startOutside()])

async function answers(url: string): Promise<boolean> {
  const client = new Client({ connectionString: url })
  await client.connect()
  const { rowCount } = await client.query('select 1')
  await client.end()
  return rowCount === 1
}

// mkdtemp makes it for its owner alone.
beforeAll(() => chmodSync(folder, 0o755))

afterAll(async () => {
  await removeDatabase(folder)
})

describe("the project's own PostgreSQL", () => {
  test('three starts at once in an empty folder make one cluster and all know its address', async () => {
    const urls = await startThree()
    expect(new Set(urls).size).toBe(1)
    expect(await answers(urls[0] ?? '')).toBe(true)
  })

  test('three starts at once after kill -9 bring it back', async () => {
    process.kill(pidOfServer(), 'SIGKILL')
    const urls = await startThree()
    expect(new Set(urls).size).toBe(1)
    expect(await answers(urls[0] ?? '')).toBe(true)
  })

  test('it keeps its data safe and listens on this machine only', async () => {
    const { url } = await startDatabase(folder)
    expect(await psql(url, 'show fsync')).toBe('on')
    expect(await psql(url, 'show listen_addresses')).toBe('127.0.0.1')
    expect(await psql(url, 'show timezone')).toBe('UTC')
    expect(new URL(url).password.length).toBeGreaterThanOrEqual(32)
  })

  test('its port taken by another program, it moves and says where', async () => {
    const before = databaseUrl(folder) ?? ''
    const port = Number(new URL(before).port)
    await stopDatabase(folder)
    const squatter = createServer().listen(port, '127.0.0.1')
    await once(squatter, 'listening')

    const { url } = await startDatabase(folder)

    expect(new URL(url).port).not.toBe(String(port))
    expect(await answers(url)).toBe(true)
    expect(databaseUrl(folder, 'postgres')).toBe(url)
    squatter.close()
  })

  test('a pid file left by a power cut, whose number is now a stranger, does not fool it', async () => {
    await stopDatabase(folder)
    expect(databaseUrl(folder)).toBeNull()
    writeFileSync(
      postmaster,
      `${process.pid}\n${join(folder, 'postgres', 'cluster')}\n0\n5432\n\n127.0.0.1\n 1 1\nready\n`,
    )
    expect(databaseUrl(folder)).toBeNull()

    const { url, isStartedHere } = await startDatabase(folder)

    expect(isStartedHere).toBe(true)
    expect(await answers(url)).toBe(true)
  })

  test('an initdb that was cut short is begun again', async () => {
    await stopDatabase(folder)
    rmSync(join(folder, 'postgres', 'ready'))
    rmSync(join(folder, 'postgres', 'cluster', 'global'), { recursive: true })
    const { url } = await startDatabase(folder, { throwAway: true })
    expect(await psql(url, 'show fsync')).toBe('off')
    expect(existsSync(join(folder, 'postgres', 'ready'))).toBe(true)
  })
})
