import 'server-only'
import type { PoolClient } from 'pg'
import { idFor } from '@/lib/gateways/payments/fake/chance'
import { missing, SandboxBug } from '@/lib/gateways/payments/fake/errors'
import { PREFIX, type Hidden, type Kind, type Kinds } from '@/lib/gateways/payments/fake/kinds'
import { sandboxPool } from '@/lib/gateways/payments/fake/pool'

/** An event to be written with everything else when the books close. */
export type Outgoing = { id: string; type: string; body: string; delayMs: number; isLost: boolean }

/** The books of one account, open in one transaction under the account's lock. */
export type Books = {
  readonly sql: PoolClient
  readonly account: string
  readonly now: number
  readonly numbers: number[]
  readonly outbox: Outgoing[]
}

const NUMBERS_AT_ONCE = 24
const OPEN = `select pg_advisory_xact_lock(hashtext('sandbox'), hashtext($1)),
  array(select nextval('sandbox.numbers')::float8 from generate_series(1, ${NUMBERS_AT_ONCE})) as numbers,
  (select to_regclass('public.clock_offset') is not null) as has_clock`

async function open(sql: PoolClient, account: string): Promise<Books> {
  await sql.query('begin')
  const { numbers, has_clock: hasClock } = (await sql.query(OPEN, [account])).rows[0]
  const offset = hasClock
    ? (await sql.query('select offset_ms from public.clock_offset')).rows[0]?.offset_ms
    : 0
  const now = Math.floor((Date.now() + Number(offset ?? 0)) / 1000)
  return { sql, account, now, numbers, outbox: [] }
}

async function close({ sql, account, outbox }: Books): Promise<void> {
  if (outbox.length > 0) {
    await sql.query(
      `insert into sandbox.events (id, account, type, body, due_at, state)
       select id, $1, type, body, clock_timestamp() + make_interval(secs => delay / 1000.0),
         case when lost then 'lost' else 'waiting' end
       from unnest($2::text[], $3::text[], $4::text[], $5::int[], $6::bool[]) as e (id, type, body, delay, lost)`,
      [
        account,
        outbox.map(({ id }) => id),
        outbox.map(({ type }) => type),
        outbox.map(({ body }) => body),
        outbox.map(({ delayMs }) => delayMs),
        outbox.map(({ isLost }) => isLost),
      ],
    )
  }
  await sql.query('commit')
}

/** Opens the books of an account ('' for the platform's own), one caller at a time; commits unless `work` throws. */
export async function withBooks<T>(account: string, work: (books: Books) => Promise<T>): Promise<T> {
  const sql = await (await sandboxPool()).connect()
  try {
    const books = await open(sql, account)
    const done = await work(books)
    await close(books)
    sql.release()
    return done
  } catch (error) {
    const isBroken = await sql.query('rollback').then(
      () => false,
      () => true,
    )
    sql.release(isBroken)
    throw error
  }
}

/** A number nobody else has; drawn in advance, so that gaps are usual. */
export async function nextNumber({ sql, numbers }: Books): Promise<number> {
  const drawn = numbers.shift()
  if (drawn !== undefined) return drawn
  return Number((await sql.query("select nextval('sandbox.numbers') as n")).rows[0].n)
}

/** An id of the provider’s kind, never used before. */
export async function newId(books: Books, kind: Kind): Promise<string> {
  return idFor(PREFIX[kind], await nextNumber(books))
}

type Extra<K extends Kind> = { hidden: Hidden[K]; dueAt?: number | null }

/** Writes a new object into the books. */
export async function insert<K extends Kind>(
  books: Books,
  kind: K,
  body: Kinds[K],
  extra: Extra<K>,
): Promise<Kinds[K]> {
  await books.sql.query(
    'insert into sandbox.objects (id, account, kind, created, body, hidden, due_at) values ($1, $2, $3, $4, $5, $6, $7)',
    [body.id, books.account, kind, books.now, body, extra.hidden, extra.dueAt ?? null],
  )
  return body
}

/** The object, or the provider's 404. */
export async function load<K extends Kind>(books: Books, kind: K, id: string): Promise<Kinds[K]> {
  const { rows } = await books.sql.query(
    'select body from sandbox.objects where id = $1 and kind = $2 and account = $3',
    [id, kind, books.account],
  )
  if (rows.length === 0) throw missing(kind, id)
  return rows[0].body
}

/** What the provider knows of an object and never tells. */
export async function hiddenOf<K extends Kind>(books: Books, kind: K, id: string): Promise<Hidden[K]> {
  const { rows } = await books.sql.query('select hidden from sandbox.objects where id = $1 and kind = $2', [
    id,
    kind,
  ])
  if (rows.length === 0) throw missing(kind, id)
  return rows[0].hidden
}

/** Replaces an object; `hidden` and `dueAt` stay unless given. */
export async function save<K extends Kind>(
  books: Books,
  kind: K,
  body: Kinds[K],
  extra?: Partial<Extra<K>>,
): Promise<Kinds[K]> {
  const { rowCount } = await books.sql.query(
    `update sandbox.objects set body = $3, hidden = coalesce($4, hidden), due_at = case when $5 then $6 else due_at end
     where id = $1 and kind = $2`,
    [body.id, kind, body, extra?.hidden ?? null, extra?.dueAt !== undefined, extra?.dueAt ?? null],
  )
  if (rowCount !== 1) throw new SandboxBug(`save: no ${kind} ${body.id}`)
  return body
}

/** The account whose books hold the object; null when nobody's do. */
export async function accountOf(id: string): Promise<string | null> {
  const { rows } = await (
    await sandboxPool()
  ).query('select account from sandbox.objects where id = $1', [id])
  return rows[0]?.account ?? null
}
