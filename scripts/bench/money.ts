import { once } from 'node:events'
import { randomBytes } from 'node:crypto'
import { type ChildProcess, spawn } from 'node:child_process'
import { resolve } from 'node:path'
import { pathToFileURL } from 'node:url'
import type { Request } from 'autocannon'
import { Client } from 'pg'
import Stripe from 'stripe'
import { CHARGES_PER_SECOND } from '@/lib/tasks/run-bulk'
import { run } from '../support/shell.mjs'
import { load, ratio } from './load'
import { openServers } from './servers'

type Measure = { name: string; value: number; unit: string }

/** An event of a payment, of its usual size, under an id of its own. */
function event(): string {
  const id = randomBytes(12).toString('hex')
  const object = { id: `pi_${id}`, object: 'payment_intent', amount: 2500, currency: 'eur', metadata: {} }
  return JSON.stringify({
    id: `evt_${id}`,
    object: 'event',
    account: 'acct_of_the_bench',
    api_version: Stripe.API_VERSION,
    created: Math.floor(Date.now() / 1000),
    data: { object: { ...object, description: 'x'.repeat(1200), status: 'succeeded' } },
    livemode: false,
    type: 'payment_intent.succeeded',
  })
}

/** A webhook signed as the provider signs, each event new. */
const signed = (secret: string): Request => ({
  method: 'POST',
  setupRequest: (request) => {
    const payload = event()
    const signature = Stripe.webhooks.generateTestHeaderString({ payload, secret })
    const headers = { 'content-type': 'application/json', 'stripe-signature': signature }
    return { ...request, headers, body: payload }
  },
})

/** The same body to a handler that inserts one row and looks at nothing. */
const bareEvent: Request = {
  method: 'POST',
  headers: { 'content-type': 'application/json' },
  setupRequest: (request) => ({
    ...request,
    body: JSON.stringify({ email: 'somebody@bench.brimline.example', event: event() }),
  }),
}

/** How quickly events are taken in, beside a bare insert. */
async function webhooks(): Promise<Measure[]> {
  const servers = await openServers(async () => {})
  try {
    const { ours, bare, env } = servers
    const secret = env.STRIPE_WEBHOOK_SECRETS!.split(',')[0]!
    const taken = await ratio(
      () => load(`${ours}/api/webhooks/stripe`, signed(secret)),
      () => load(`${bare}/api/rows`, bareEvent),
    )
    return [
      { name: 'webhook taken in against a bare insert', value: taken.ratio, unit: '×' },
      { name: 'webhook taken in', value: taken.ours, unit: 'requests/s' },
    ]
  } finally {
    await servers.close()
  }
}

const ORDERS = Number(process.env.BENCH_ORDERS ?? 1000)
const KILLS = 5

/** Charges the balances of a run whose worker is killed five times on the way; in processes of their own. */
async function charges(): Promise<Measure[]> {
  const servers = await openServers(async (env) => {
    await run(process.execPath, ['scripts/run.mjs', 'scripts/bench/prepare-charges.ts', String(ORDERS)], {
      env,
    })
  })
  const { env } = servers
  const client = new Client({ connectionString: env.DATABASE_URL })
  await client.connect()
  let worker = startWorker(env)
  try {
    let killed = 0
    let began = 0
    for (;;) {
      const { done, charged } = await count(client)
      if (done > 0 && began === 0) began = performance.now()
      if (done > ((killed + 1) * ORDERS) / (KILLS + 1) && killed < KILLS) {
        killed += 1
        worker.kill('SIGKILL')
        await once(worker, 'exit')
        worker = startWorker(env)
      }
      if (done >= ORDERS) {
        const rate = ORDERS / ((performance.now() - began) / 1000)
        return [
          { name: `charges of ${ORDERS} balances under ${killed} kills`, value: rate, unit: 'charges/s' },
          { name: 'charges against the rate asked for', value: rate / CHARGES_PER_SECOND, unit: '×' },
          { name: 'balances charged twice', value: charged - ORDERS, unit: 'charges' },
        ]
      }
      await new Promise((look) => setTimeout(look, 250))
    }
  } finally {
    worker.kill('SIGKILL')
    await client.end()
    await servers.close()
  }
}

/** Orders whose charge is over, and charges of balances in the provider's own books. */
async function count(client: Client): Promise<{ done: number; charged: number }> {
  const { rows } = await client.query<{ done: number; charged: number }>(
    `select (select count(*)::int from bulk_items i join bulk_jobs j on j.id = i.bulk_job_id
               where j.kind = 'charge_balances' and i.state <> 'waiting') as done,
            (select count(*)::int from sandbox.objects where kind = 'charge') - $1::int as charged`,
    [ORDERS],
  )
  return rows[0]!
}

function startWorker(env: Record<string, string>): ChildProcess {
  return spawn(process.execPath, ['--import', 'tsx', 'scripts/worker.ts'], {
    env: { ...env, NODE_ENV: 'production', TSX_TSCONFIG_PATH: resolve('tsconfig.scripts.json') },
    stdio: ['ignore', 'ignore', 'inherit'],
  })
}

/** What moves money: taking in the provider's events, and charging a whole run. */
export async function benchMoney(): Promise<Measure[]> {
  return [...(await webhooks()), ...(await charges())]
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  for (const { name, value, unit } of await benchMoney())
    console.log(`${name.padEnd(66)} ${value.toFixed(value < 10 ? 2 : 0).padStart(8)} ${unit}`)
}
