import { runOnce, Logger, type TaskList } from 'graphile-worker'
import { Pool } from 'pg'
import { QueryTypes } from 'sequelize'
import { env } from '@/lib/config/env'
import { sequelize } from '@/lib/db/sequelize'
import type { DueKind } from '@/lib/jobs/due-kinds'
import { clock } from '@/lib/gateways/clock'
import { closeSandboxMailbox, readSandboxMails } from '@/lib/gateways/mailer/sandbox-mailbox'
import { payments } from '@/lib/gateways/payments'
import { addFunds } from '@/lib/gateways/payments/fake/controls'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { finishOnboarding } from '@/lib/gateways/payments/fake/onboarding'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import { payAsCustomer } from '@/lib/gateways/payments/fake/pay-as-customer'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { JOBS, type JobName } from '@/lib/jobs/names'
import type { Tasks } from '@/lib/jobs/task'
import { receiveProviderEvent } from '@/lib/services/payments/receive-provider-event'
import { refreshPaymentAccount } from '@/lib/services/workshops/refresh-payment-account'
import { TASKS } from '@/lib/tasks'
import { Membership, Person, User, Workshop } from '@/models'
import type { Stage } from '@/seeders/demo/stage'
import { openMailStore } from '../sandbox-mail/mail-store'
import { startMailServer } from '../sandbox-mail/start-mail-server'

const CONCURRENCY = 6
/** What falls due is done a few hours late, together with what fell due meanwhile: fewer stops. */
const LATE_MS = 6 * 3_600_000
const DAILY: DueKind[] = ['compare_books', 'owner_digest']
/** A job that makes another that makes another: a demo must end. */
const MOST_ROUNDS = 200

/**
 * The demo's world in one process: its own mail server where SMTP_URL points, its own worker, the provider's events handed
 * in as they come. Nothing else may be running yet; `close` lets go of everything. `beginAt` is an instant of the past.
 */
export async function openDemoStage(beginAt: Date): Promise<Stage & { close: () => Promise<void> }> {
  const store = await openMailStore(env().DATABASE_URL)
  const mailServer = await startMailServer({ port: Number(new URL(env().SMTP_URL).port), keep: store.keep })
  const pool = new Pool({ connectionString: env().DATABASE_URL, max: CONCURRENCY + 3 })
  // A lost connection shows in the query that needed it.
  pool.on('error', () => {})
  pool.on('connect', (client) => client.on('error', () => {}))
  const tasks = taskListOf(TASKS)
  await passTime()
  await clock.beginAt(beginAt)

  const work = () =>
    runOnce({ pgPool: pool, taskList: tasks, concurrency: CONCURRENCY, logger: quiet, noHandleSignals: true })

  async function settle(): Promise<void> {
    for (let round = 0; round < MOST_ROUNDS; round += 1) {
      await deliverDueEvents({ deliver: takeIn, isHurried: true })
      if ((await waiting()) === 0) return
      await work()
    }
    throw new Error('the demo never settles: jobs make jobs')
  }

  async function doDue(): Promise<void> {
    await passTime()
    await TASKS.due({}, { jobId: 'demo', attempt: 1, maxAttempts: 1 })
    await settle()
  }

  async function goTo(instant: Date): Promise<void> {
    for (;;) {
      const now = await clock.now()
      const next = Math.min(instant.getTime(), ((await nextDue()) ?? Infinity) + LATE_MS)
      if (next > now.getTime()) await clock.advance((next - now.getTime()) / 3_600_000)
      await doDue()
      if (next >= instant.getTime()) return
    }
  }

  return {
    now: () => clock.now(),
    goTo,
    settle,
    person,
    tokenFrom: async (email, path) => {
      for (const { text } of await readSandboxMails({ to: email, limit: 20 })) {
        const token = new RegExp(`${path}/([\\w-]+)`).exec(text)?.[1]
        if (token) return token
      }
      throw new Error(`no mail to ${email} leads to ${path}`)
    },
    pay: async (payUrl, card) => (await payAsCustomer({ payUrl, card })).outcome,
    finishAccount: async (slug, floatMinor) => {
      const workshop = await Workshop.findOne({ where: { slug }, rejectOnEmpty: true })
      if (!workshop.providerAccountId) throw new Error(`${slug} has no account to finish`)
      await finishOnboarding(workshop.providerAccountId)
      await addFunds(workshop.providerAccountId, floatMinor, workshop.currency)
      await settle()
      await refreshPaymentAccount({ account: workshop.providerAccountId, now: await clock.now() })
    },
    close: async () => {
      await mailServer.close()
      await store.close()
      await pool.end()
      await closeSandboxMailbox()
      await closeSandboxPool()
    },
  }
}

/** The webhook without its HTTP: checked by its signature, stored, applied by a job. */
async function takeIn(rawBody: string, signature: string): Promise<number> {
  const read = payments().verifyWebhook(rawBody, signature, env().STRIPE_WEBHOOK_SECRETS)
  if (!read.ok) return 400
  await receiveProviderEvent(read.value, await clock.now())
  return 200
}

async function person(email: string): Promise<Awaited<ReturnType<Stage['person']>>> {
  const emailNormal = email.toLowerCase()
  const now = await clock.now()
  const [row] = await Person.findOrCreate({
    where: { emailNormal },
    defaults: { emailNormal, emailShown: email, createdAt: now },
  })
  await User.findOrCreate({
    where: { personId: row.id },
    defaults: { personId: row.id, createdAt: now, emailVerifiedAt: now },
  })
  const memberships = await Membership.findAll({ where: { personId: row.id, endedAt: null } })
  return {
    kind: 'person',
    personId: row.id,
    email: emailNormal,
    memberships: memberships.map(({ workshopId, role }) => ({ workshopId, role })),
    host: env().HOST_EMAILS.includes(emailNormal),
    secondFactorAt: now,
  }
}

/** When something next falls due, here or at the provider; what comes daily is done together with the rest. */
async function nextDue(): Promise<number | null> {
  const [row] = await sequelize.query<{ ours: Date | null; theirs: string | null }>(
    `select (select min(due_at) from due_items where done_at is null and kind not in (:daily)) as ours,
            (select min(due_at) from sandbox.objects) as theirs`,
    { type: QueryTypes.SELECT, replacements: { daily: DAILY } },
  )
  const instants = [row?.ours?.getTime(), row?.theirs ? Number(row.theirs) * 1000 : undefined]
  const known = instants.filter((each) => each !== undefined)
  return known.length > 0 ? Math.min(...known) : null
}

async function waiting(): Promise<number> {
  const [row] = await sequelize.query<{ count: number }>(
    'select count(*)::int as count from graphile_worker.jobs where run_at <= now() and attempts < max_attempts',
    { type: QueryTypes.SELECT },
  )
  return row?.count ?? 0
}

function taskListOf(tasks: Tasks): TaskList {
  const entries = (Object.keys(JOBS) as JobName[]).map((name) => [
    name,
    async (payload: unknown) => {
      const task = tasks[name] as (payload: unknown, context: object) => Promise<void>
      await task(JOBS[name].parse(payload ?? {}), { jobId: 'demo', attempt: 1, maxAttempts: 25 })
    },
  ])
  return Object.fromEntries(entries) as TaskList
}

const quiet = new Logger(() => (level, message) => {
  if (level === 'error') process.stderr.write(`${message}\n`)
})
