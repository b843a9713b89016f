import 'server-only'
import Stripe from 'stripe'
import { env } from '@/lib/config/env'
import { sandboxPool } from '@/lib/gateways/payments/fake/pool'

/** Sends one signed event to the application and answers its HTTP status. */
export type Deliver = (rawBody: string, signatureHeader: string) => Promise<number>

type Due = { seq: string; id: string; body: string; tries: number }

const BATCH = 8
/** Tries before the fake gives up; with its pauses more than three days, as published. */
const MOST_TRIES = 40
/** How long a taken event is ours; when the process dies, another one sends it again. */
const LEASE = '20 seconds'

/** Over HTTP, as the provider does it. */
export const overHttp: Deliver = async (rawBody, signatureHeader) => {
  const answer = await fetch(`${env().BASE_URL}/api/webhooks/stripe`, {
    method: 'POST',
    headers: { 'content-type': 'application/json; charset=utf-8', 'stripe-signature': signatureHeader },
    body: rawBody,
    redirect: 'manual',
    signal: AbortSignal.timeout(10_000),
  })
  await answer.arrayBuffer()
  return answer.status
}

/** Signed at the moment of sending, by real time, with the newest secret. */
function signatureOf(rawBody: string): string {
  const secret = env().STRIPE_WEBHOOK_SECRETS[0]
  if (secret === undefined) throw new Error('STRIPE_WEBHOOK_SECRETS is missing')
  return Stripe.webhooks.generateTestHeaderString({ payload: rawBody, secret })
}

async function takeDue(isHurried: boolean, taken: readonly string[]): Promise<Due[]> {
  const { rows } = await (
    await sandboxPool()
  ).query<Due>(
    `update sandbox.events set due_at = clock_timestamp() + $2::interval, tries = tries + 1
     where seq in (
       select seq from sandbox.events
       where state = 'waiting' and (due_at <= clock_timestamp() or $3) and seq <> all($4::bigint[])
       order by due_at, seq limit $1 for update skip locked)
     returning seq::text, id, body, tries`,
    [BATCH, LEASE, isHurried, taken],
  )
  return rows.sort((a, b) => Number(a.seq) - Number(b.seq))
}

async function sendOne({ seq, body, tries }: Due, deliver: Deliver): Promise<boolean> {
  const status = await deliver(body, signatureOf(body)).catch(() => 0)
  const isTaken = status >= 200 && status < 300
  const state = isTaken ? 'delivered' : tries >= MOST_TRIES ? 'given_up' : 'waiting'
  const pauseMs = Math.min(250 * 2 ** (tries - 1), 3 * 3600 * 1000)
  await (
    await sandboxPool()
  ).query(
    `update sandbox.events set state = $2, answered = $3, due_at = clock_timestamp() + make_interval(secs => $4 / 1000.0)
     where seq = $1`,
    [seq, state, status, pauseMs],
  )
  return isTaken
}

type Options = {
  deliver?: Deliver
  /** Waits for no delay and no pause: everything unsent is tried once. */
  isHurried?: boolean
}

/**
 * Sends the events that are due, each once. An event the application does not answer with 2xx is tried again
 * at a later call (pauses doubling from 250 ms): at least once, in no promised order.
 */
export async function deliverDueEvents({ deliver = overHttp, isHurried = false }: Options = {}): Promise<{
  delivered: number
  refused: number
}> {
  const count = { delivered: 0, refused: 0 }
  const seen: string[] = []
  for (;;) {
    const due = await takeDue(isHurried, seen)
    if (due.length === 0) break
    seen.push(...due.map(({ seq }) => seq))
    const taken = await Promise.all(due.map((event) => sendOne(event, deliver)))
    count.delivered += taken.filter(Boolean).length
    count.refused += taken.filter((isTaken) => !isTaken).length
  }
  return count
}

/** How many events are still to be sent, and how many were lost on purpose or given up. */
export async function waitingEvents(): Promise<{ waiting: number; lost: number }> {
  const { rows } = await (
    await sandboxPool()
  ).query(
    `select count(*) filter (where state = 'waiting')::int as waiting,
            count(*) filter (where state in ('lost', 'given_up'))::int as lost from sandbox.events`,
  )
  return rows[0]
}
