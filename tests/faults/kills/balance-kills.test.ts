import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { BALANCE_CRASH_POINTS, type CrashPoint } from '@/lib/db/crash-points'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { clock } from '@/lib/gateways/clock'
import { lockRun } from '@/lib/services/runs/lock-run'
import { paths } from '@/lib/paths'
import { MailOutbox, Order, PaymentAttempt } from '@/models'
import { sessionOf } from '@/tests/http/matrix/people'
import { FEES_WAIVED, makeReady } from '@/tests/support/worlds/decision'
import { CARD, moneyWorld, orderInput } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'
import { customerOf } from './customer'
import { isLong, ROUNDS, Stage, WITHIN } from './stage'

// After the lock: announcing, charging and lapsing, killed at every point, for the long version. Each time a run of its own.
const ORDERS = 3
const WEEK_HOURS = 7 * 24 + 1
const LAPSE_HOURS = 15 * 24

let stage: Stage
let world: Awaited<ReturnType<typeof moneyWorld>>
let ordered: string[] = []

describe.runIf(isLong)('once a run is locked', () => {
  beforeAll(async () => {
    stage = await Stage.open()
  }, 400_000)
  afterAll(() => stage.close())

  describe.each(ROUNDS)('round %i', () => {
    test('web, killed once the run is locked: locked it is, and everybody is told once', async () => {
      await runOf(CARD.pays)
      const answer = await stage.killedAt('web', 'run_locked', pressLock)
      expect(answer).toBeNull()
      await expectAll('balance_due')
      expect((await world.run.reload()).state).toBe('locked')
      expect(await MailOutbox.count({ where: { kind: 'run_locked', workshopId: world.workshop.id } })).toBe(
        ORDERS,
      )
      expect(
        await MailOutbox.count({ where: { kind: 'balance_coming', workshopId: world.workshop.id } }),
      ).toBe(ORDERS)
    })

    test('the worker, killed while balances are announced: each is, once', async () => {
      await runOf(CARD.pays)
      await stage.killedAt('worker', 'bulk_item_before_commit', lock)
      await expectAll('balance_due')
      expect(
        await MailOutbox.count({ where: { kind: 'balance_coming', workshopId: world.workshop.id } }),
      ).toBe(ORDERS)
    })

    test.each<CrashPoint>(['balance_requested', 'balance_provider_answered', 'balance_sent', 'due_handled'])(
      'the worker, killed at %s while balances are charged: each once',
      async (point) => {
        await runOf(CARD.pays)
        await lock()
        await expectAll('balance_due')
        await stage.killedAt('worker', point, () => goOn(WEEK_HOURS))
        await stage.letTimeFall()
        await expectAll('paid')
        const where = { workshopId: world.workshop.id, purpose: 'balance', state: 'captured' }
        expect(await PaymentAttempt.count({ where })).toBe(ORDERS)
        await stage.expectBooks({ charged: ORDERS })
      },
    )

    test('the worker, killed while orders lapse: places and deposits go back once', async () => {
      await runOf(CARD.refusedLater)
      await lock()
      await expectAll('balance_due')
      await goOn(WEEK_HOURS)
      const failed = () => Order.count({ where: { id: ordered, balanceFailedAt: null } })
      await expect.poll(failed, WITHIN).toBe(0)
      await stage.killedAt('worker', 'lapse_payments_ended', () => goOn(LAPSE_HOURS))
      await stage.letTimeFall()
      await expectAll('lapsed')
      expect((await world.run.reload()).committedUnits).toBe(0)
      await stage.expectBooks({ repaid: ORDERS })
    })
  })

  test('every crash point of a balance was reached, and left behind quickly', () => {
    expect([...stage.reached].sort()).toEqual([...BALANCE_CRASH_POINTS].sort())
    stage.expectSwift()
  })
})

/** A run with orders under deposit, whose balances fall due at the lock. */
async function runOf(card: string): Promise<void> {
  world = await moneyWorld({ minimum: 2, maximum: 10, balanceWhen: 'at_lock' })
  await makeReady(world)
  ordered = []
  while (ordered.length < ORDERS) {
    const buyer = await customerOf(stage.baseUrl)
    // The web process may not have heard yet that business time begins anew: the provider then refuses the session.
    const placed = await buyer.place(orderInput(world.run)).catch(() => null)
    if (!placed?.payUrl) continue
    await buyer.typeCard(placed.payUrl, card.replaceAll(' ', ''))
    ordered.push(placed.order)
  }
  await expectAll('reserved')
  await stage.expectBooks({ charged: ORDERS })
}

async function expectAll(state: Order['state']): Promise<void> {
  const states = async () => (await Order.findAll({ where: { id: ordered } })).map((order) => order.state)
  await expect.poll(states, WITHIN).toEqual(Array(ORDERS).fill(state))
  stage.noteRecovered()
}

const lock = async () =>
  lockRun({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    input: { waivers: FEES_WAIVED },
    now: await clock.now(),
  })

async function pressLock(): Promise<Response | null> {
  const path = paths.api.adminRunDeed(world.workshop.slug, world.run.id, 'lock')
  return fetch(`${stage.baseUrl}${path}`, {
    method: 'POST',
    headers: {
      cookie: `${SESSION_COOKIE}=${await sessionOf(world.owner)}`,
      origin: stage.baseUrl,
      'content-type': 'application/json',
    },
    body: JSON.stringify({ waivers: FEES_WAIVED }),
  }).catch(() => null)
}

async function goOn(hours: number): Promise<void> {
  await clock.advance(hours)
  await stage.letTimeFall()
}
