import { join, resolve } from 'node:path'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { forgetEnv } from '@/lib/config/env'
import { Order, PaymentAttempt } from '@/models'
import { moneyWorld, orderInput } from '@/tests/support/worlds/money'
import { ensureDatabase, removeDatabase, startDatabase, stopDatabase } from '../../../scripts/database.mjs'
import { run } from '../../../scripts/support/shell.mjs'
import { customerOf } from './customer'
import { isLong, Stage, WITHIN } from './stage'

// PostgreSQL goes away and comes back while people order and pay, on a server of this test's own.
const FOLDER = join('.data/test', `restart-${process.pid}`)
const BUYERS = 4

describe.runIf(isLong)('the database is restarted', () => {
  let stage: Stage
  let world: Awaited<ReturnType<typeof moneyWorld>>
  let port: number

  beforeAll(async () => {
    const server = await startDatabase(FOLDER, { throwAway: true })
    port = server.port
    process.env.DATABASE_URL = await ensureDatabase(server.url)
    forgetEnv()
    await run(process.execPath, ['scripts/run.mjs', 'scripts/migrate.ts'], { env: process.env })
    stage = await Stage.open()
    world = await moneyWorld({ minimum: 2, maximum: 60 })
  }, 400_000)

  afterAll(async () => {
    await stage.close()
    await removeDatabase(resolve(FOLDER))
  })

  async function restart(): Promise<void> {
    await stopDatabase(FOLDER)
    await startDatabase(FOLDER, { port, throwAway: true })
    await stage.revive()
  }

  /** Orders and pays, and does again what was not answered, until the order is paid. */
  async function persist(buyer: Awaited<ReturnType<typeof customerOf>>): Promise<void> {
    const tryOnce = async () => {
      const mine = (await buyer.orders())?.items[0]
      if (mine && mine.state !== 'awaiting_deposit') return mine.state
      const order = mine?.id ?? (await buyer.place(orderInput(world.run)))?.order
      const link = order ? await buyer.pay(order) : null
      if (link) await buyer.typeCard(link.payUrl)
      return 'under way'
    }
    await expect
      .poll(() => tryOnce().catch(() => 'broken'), { timeout: 90_000, interval: 400 })
      .toBe('reserved')
  }

  test.each([0, 400, 900])(
    '%i ms after people began: each pays once',
    async (delayMs) => {
      const buyers = await Promise.all(Array.from({ length: BUYERS }, () => customerOf(stage.baseUrl)))
      const under = Promise.all(buyers.map(persist))
      await new Promise((done) => setTimeout(done, delayMs))
      await restart()
      await under
      stage.noteRecovered()
      for (const { person } of buyers) {
        const orders = await Order.findAll({ where: { personId: person.id } })
        expect(orders.map(({ state }) => state)).toEqual(['reserved'])
        const captured = { orderId: orders[0]!.id, state: 'captured' }
        await expect.poll(() => PaymentAttempt.count({ where: captured }), WITHIN).toBe(1)
      }
      await stage.expectBooks({ charged: BUYERS })
    },
    300_000,
  )

  test('and everything goes on quickly', () => stage.expectSwift())
})
