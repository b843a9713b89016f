import 'server-only'
import { Client, type Pool } from 'pg'

/** First key of the advisory locks that say "the worker of this pool lives". */
const LOCK_SPACE = 727
const EVERY_MS = 1000

/**
 * Gives killed workers' jobs back within seconds. Each worker holds a session lock on its pool's id; the
 * server drops it when the process dies. Every second each worker looks for jobs locked by pools whose lock
 * it can take, and frees them when that held on two looks running (a pool that has just begun may not hold
 * its lock yet). Left to itself the queue would wait four hours.
 */
export class PoolLock {
  private suspects = new Set<string>()
  private timer: NodeJS.Timeout | undefined
  private looking: Promise<unknown> = Promise.resolve()

  private constructor(
    private readonly client: Client,
    private readonly pool: Pool,
    private readonly onError: (error: unknown) => void,
  ) {}

  /** Opens the connection whose life is the lock's life. `onError` hears of its loss: the worker must end then. */
  static async open(databaseUrl: string, pool: Pool, onError: (error: unknown) => void): Promise<PoolLock> {
    const client = new Client({ connectionString: databaseUrl, keepAlive: true })
    client.on('error', onError)
    await client.connect()
    return new PoolLock(client, pool, onError)
  }

  async hold(poolId: string): Promise<void> {
    await this.client.query('select pg_advisory_lock($1, hashtext($2))', [LOCK_SPACE, poolId])
  }

  startLooking(): void {
    this.timer = setInterval(() => {
      this.looking = this.freeDeadPools().catch(this.onError)
    }, EVERY_MS)
  }

  async close(): Promise<void> {
    clearInterval(this.timer)
    await this.looking
    await this.client.end()
  }

  /** One look; gives back the pools whose jobs it freed. */
  async freeDeadPools(): Promise<string[]> {
    const { rows } = await this.pool.query<{ id: string }>(
      `select id from (
         select distinct locked_by as id from graphile_worker._private_jobs where locked_by is not null
         union select distinct locked_by from graphile_worker._private_job_queues where locked_by is not null
       ) as holders
       where not exists (
         select 1 from pg_locks
         where locktype = 'advisory' and objsubid = 2 and granted
           and database = (select oid from pg_database where datname = current_database())
           and classid = $1::int and objid = hashtext(id)::bit(32)::bigint::oid)`,
      [LOCK_SPACE],
    )
    const unheld = new Set(rows.map((row) => row.id))
    const dead = [...unheld].filter((id) => this.suspects.has(id))
    this.suspects = unheld
    if (dead.length > 0)
      await this.pool.query('select graphile_worker.force_unlock_workers($1::text[])', [dead])
    return dead
  }
}
