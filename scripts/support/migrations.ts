import { runMigrations } from 'graphile-worker'
import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { Client } from 'pg'
import { Umzug, type UmzugStorage } from 'umzug'

/** A number of our own, the same for every deploy, so that two of them wait for each other. */
const LOCK = 7_270_101
const FOLDER = fileURLToPath(new URL('../../migrations', import.meta.url))

type Run = (sql: string) => Promise<unknown>
type Step = (run: Run) => Promise<unknown>
type Migration = { name: string; isAlone: boolean; up: Step; down: Step }
type Options = { folder?: string; say?: (line: string) => void }

/**
 * Brings a database up to date: our tables, then the job queue's. Several may be started at once: one works, the rest
 * wait and find nothing left to do. A file that fails takes the files of its transaction with it and nothing else.
 */
export async function migrateUp(url: string, options: Options = {}): Promise<void> {
  await underLock(url, async (client) => {
    const all = await readFolder(options.folder)
    const umzug = umzugOn(client, all)
    const pending = new Set((await umzug.pending()).map((each) => each.name))
    for (const batch of batches(all.filter((each) => pending.has(each.name)))) {
      await maybeInTransaction(client, batch, (migrations) => umzug.up({ migrations }))
      for (const { name } of batch) options.say?.(`migrated ${name}`)
    }
    await runMigrations({ connectionString: url })
  })
}

/** Takes the newest `count` files back, as far as they are neighbours in one transaction. */
export async function migrateDown(url: string, count: number, options: Options = {}): Promise<void> {
  await underLock(url, async (client) => {
    const all = await readFolder(options.folder)
    const umzug = umzugOn(client, all)
    const done = new Set((await umzug.executed()).map((each) => each.name))
    const newest = all.filter((each) => done.has(each.name)).slice(-count)
    for (const batch of batches(newest.reverse())) {
      await maybeInTransaction(client, batch, (migrations) => umzug.down({ migrations }))
      for (const { name } of batch) options.say?.(`took back ${name}`)
    }
  })
}

/** The lock is a session's, on a connection of its own: it outlives the transactions and dies with the process. */
async function underLock(url: string, work: (client: Client) => Promise<void>): Promise<void> {
  const guard = new Client({ connectionString: url })
  const client = new Client({ connectionString: url })
  await guard.connect()
  try {
    await guard.query('select pg_advisory_lock($1)', [LOCK])
    await client.connect()
    await client.query(
      'create table if not exists migrations (name text primary key, applied_at timestamptz not null default now())',
    )
    await work(client)
  } finally {
    await client.end()
    await guard.end()
  }
}

/** Neighbours share a transaction; a file that exports `transaction = false` stands alone. */
function batches(migrations: Migration[]): Migration[][] {
  const made: Migration[][] = []
  for (const each of migrations) {
    const last = made.at(-1)
    if (last && !each.isAlone && !last[0]?.isAlone) last.push(each)
    else made.push([each])
  }
  return made
}

async function maybeInTransaction(
  client: Client,
  batch: Migration[],
  work: (names: string[]) => Promise<unknown>,
) {
  const names = batch.map((each) => each.name)
  if (batch[0]?.isAlone) return work(names)
  await client.query('begin')
  try {
    await work(names)
    await client.query('commit')
  } catch (error) {
    await client.query('rollback')
    throw error
  }
}

function umzugOn(client: Client, migrations: Migration[]) {
  const run: Run = (sql) => client.query(sql)
  return new Umzug({
    migrations: migrations.map(({ name, up, down }) => ({ name, up: () => up(run), down: () => down(run) })),
    storage: storageOn(client),
    logger: undefined,
  })
}

/** On the same connection as the files, so that what is noted as done is done. */
function storageOn(client: Client): UmzugStorage {
  return {
    logMigration: async ({ name }) =>
      void (await client.query('insert into migrations (name) values ($1)', [name])),
    unlogMigration: async ({ name }) =>
      void (await client.query('delete from migrations where name = $1', [name])),
    executed: async () => {
      const { rows } = await client.query<{ name: string }>('select name from migrations order by name')
      return rows.map((row) => row.name)
    },
  }
}

async function readFolder(folder = FOLDER): Promise<Migration[]> {
  const names = readdirSync(folder).filter((name) => name.endsWith('.ts'))
  return Promise.all(
    names.sort().map(async (file) => {
      const loaded = (await import(pathToFileURL(join(folder, file)).href)) as {
        transaction?: false
        up: Step
        down: Step
      }
      return {
        name: file.replace(/\.ts$/, ''),
        isAlone: loaded.transaction === false,
        up: loaded.up,
        down: loaded.down,
      }
    }),
  )
}
