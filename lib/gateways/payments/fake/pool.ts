import 'server-only'
import { Pool } from 'pg'
import { env } from '@/lib/config/env'
import { SCHEMA } from '@/lib/gateways/payments/fake/schema'

type Kept = { pool: Pool; url: string; ready: Promise<void> }
const kept = globalThis as typeof globalThis & { sandboxPool?: Kept | undefined }

async function prepare(pool: Pool): Promise<void> {
  const client = await pool.connect()
  try {
    // Web, worker and provider start together; only one may make the schema.
    await client.query("select pg_advisory_lock(hashtext('sandbox schema'))")
    await client.query(SCHEMA)
  } finally {
    await client.query("select pg_advisory_unlock(hashtext('sandbox schema'))").catch(() => {})
    client.release()
  }
}

/**
 * The fake's own connections: a rollback of the application must not undo the provider's books.
 * The schema is made at the first use.
 */
export async function sandboxPool(): Promise<Pool> {
  const url = env().DATABASE_URL
  if (kept.sandboxPool?.url !== url) {
    const pool = new Pool({ connectionString: url, max: 10, options: '-c TimeZone=UTC' })
    // A connection lost while idle (the server restarted) is replaced at the next use.
    pool.on('error', () => {})
    kept.sandboxPool = { pool, url, ready: prepare(pool) }
    kept.sandboxPool.ready.catch(() => (kept.sandboxPool = undefined))
  }
  await kept.sandboxPool.ready
  return kept.sandboxPool.pool
}

/** Ends the fake's connections; for scripts and tests that are done. */
export async function closeSandboxPool(): Promise<void> {
  const { sandboxPool: mine } = kept
  kept.sandboxPool = undefined
  await mine?.pool.end()
}
