import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { getTrackRecord } from '@/lib/queries/record/get-track-record'
import { getRunOutcome } from '@/lib/queries/runs/get-run-outcome'
import { callOffRun } from '@/lib/services/runs/call-off-run'
import { lockRun } from '@/lib/services/runs/lock-run'
import { saveActuals } from '@/lib/services/runs/save-actuals'
import { Forecast, Outcome } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { FEES_WAIVED, makeReady } from '@/tests/support/worlds/decision'
import { moneyWorld, reserved } from '@/tests/support/worlds/money'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makeUser } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ minimum: 2, maximum: 9 })
  await makeReady(world)
})
afterAll(closeSandboxPool)

const which = async () => ({
  actor: await actorOf(world.owner),
  workshopId: world.workshop.id,
  runId: world.run.id,
  now: NOW,
})
const outcome = async () => (await getRunOutcome(await which()))!
const keepForecast = (quarter: number, chance: number, low: number, high: number) =>
  Forecast.create({
    workshopId: world.workshop.id,
    runId: world.run.id,
    quarter,
    at: hoursAfter(NOW, quarter),
    deposited: 1,
    minimum: 2,
    figures: { mean: (low + high) / 2, low, high, chance },
    coreVersion: '2',
  })
const actuals = async (input: { costMinor: number; started: number; good: number }, over: object = {}) =>
  saveActuals({ ...(await which()), input, ...over })

describe('a run held against what was thought of it', () => {
  test('ranges that held, figures and reasons as they were frozen, and what the next run believes', async () => {
    await keepForecast(1, 0.4, 0, 1)
    await keepForecast(2, 0.9, 1, 3)
    expect((await outcome()).forecasts.map(({ held }) => held)).toEqual([null, null])
    await reserved(world.run)
    await reserved(world.run)
    await lockRun({ ...(await which()), input: { waivers: FEES_WAIVED } })
    await Outcome.create({
      ...{ workshopId: world.workshop.id, runId: world.run.id, className: 'certain' },
      ...{ converted: 30, notConverted: 0, storedAt: NOW },
    })
    const seen = await outcome()
    expect(seen.decidedUnits).toBe(2)
    expect(seen.forecasts.map(({ held }) => held)).toEqual([false, true])
    const [decision] = seen.decisions.filter(({ kind }) => kind === 'lock')
    // Two of Beta(38, 2) are worth 1.9; tooling of 300.00 beats them in every case.
    expect(decision?.figures).toMatchObject({ deposited: 2, breakEven: 4, weighed: { likelyToPay: 1.9 } })
    expect(seen.waivers).toMatchObject([{ key: 'repay', reason: FEES_WAIVED[0]!.reason }])
    // 6 of 10 before; 36 of 40 after.
    expect(seen.learned).toEqual([
      {
        name: 'certain',
        seen: { converted: 30, notConverted: 0 },
        before: expect.closeTo(0.6, 12) as number,
        after: expect.closeTo(0.9, 12) as number,
      },
    ])
  })

  test('cost and yield as typed stand beside the plan; dates beside the first promise', async () => {
    const lines = [{ offer: world.runOffers.kit, quantity: 3 }]
    await makeOrder({ run: world.run, lines }, { state: 'posted', paidAt: NOW, postedAt: NOW })
    expect(await actuals({ costMinor: 1, started: 1, good: 1 })).toEqual({
      ok: false,
      reason: 'nothing_built',
    })
    await world.run.update({ state: 'locked', lockedAt: NOW })
    await actuals({ costMinor: 40_000, started: 4, good: 2 })
    await actuals({ costMinor: 35_000, started: 4, good: 3 })
    const { money, units, dates } = await outcome()
    // Three kits: 300.00 of tooling, and 5.00 of packaging each.
    expect(money).toMatchObject({
      plannedYield: 0.95,
      actual: { costMinor: 35_000, started: 4, good: 3 },
    })
    expect(money.plannedCostMinor).toBe(30_000 + 3 * 500)
    expect(units).toMatchObject({ paid: 3, open: 0 })
    // Posted on 1 March, promised by 31 August: 30 + 30 + 31 + 30 + 31 + 31 days early.
    expect(dates.find(({ offer }) => offer === 'kit')).toEqual({
      offer: 'kit',
      promisedBy: '2027-08-31',
      postedOn: '2027-03-01',
      daysLate: -183,
    })
  })

  test('is its owner’s to see and to type', async () => {
    const { person } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    const actor = await actorOf(person)
    expect(await getRunOutcome({ ...(await which()), actor })).toBeNull()
    const typed = { costMinor: 1, started: 1, good: 1 }
    expect(await actuals(typed, { actor })).toEqual({ ok: false, reason: 'forbidden' })
    expect(await getTrackRecord({ actor, slug: world.workshop.slug })).toBeNull()
  })
})

describe('the track record', () => {
  test('scores the forecasts of decided runs, and gives conversions with intervals', async () => {
    await keepForecast(1, 0.4, 0, 1)
    await keepForecast(3, 0.9, 1, 3)
    await reserved(world.run)
    await callOffRun({ ...(await which()), reason: 'The jacks cannot be had.' })
    await Outcome.create({
      ...{ workshopId: world.workshop.id, runId: world.run.id, className: 'likely' },
      ...{ converted: 2, notConverted: 8, storedAt: NOW },
    })
    const record = (await getTrackRecord({ actor: await actorOf(world.owner), slug: world.workshop.slug }))!
    // One of two units: the minimum was not reached. (0.4² + 0.9²) / 2; both ranges hold one.
    expect(record.forecasts).toMatchObject({ stated: 2, held: 2 })
    expect(record.forecasts.brier).toBeCloseTo(0.485, 12)
    expect(record.forecasts.table.map(({ from, stated, came }) => [from, stated, came])).toEqual([
      [0.4, 1, 0],
      [0.8, 1, 0],
    ])
    // Wilson at 95 % for 2 of 10, from the published formula: 0.0567 to 0.5098.
    expect(record.classes[0]).toMatchObject({ name: 'likely', converted: 2, asked: 10 })
    expect(record.classes[0]?.low).toBeCloseTo(0.0567, 4)
    expect(record.classes[0]?.high).toBeCloseTo(0.5098, 4)
    expect(record.runs).toMatchObject([{ state: 'called_off', deposited: 1, minimum: 2, daysLate: null }])
  })
})
