import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { callOffUndecided } from '@/lib/services/runs/call-off-run'
import { lowerMinimum } from '@/lib/services/runs/lower-minimum'
import { moveDecideBy } from '@/lib/services/runs/move-decide-by'
import { type DeedAhead, previewRunMails } from '@/lib/services/runs/preview-run-mails'
import { Decision, DueItem, MailOutbox } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { NOW } from '@/tests/support/worlds/base'
import { moneyWorld, reserved } from '@/tests/support/worlds/money'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf, makeUser } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ minimum: 4, maximum: 9 })
})
afterAll(closeSandboxPool)

const which = async () => ({
  actor: await actorOf(world.owner),
  workshopId: world.workshop.id,
  runId: world.run.id,
  now: NOW,
})
const move = async (decideBy: string, over: object = {}) =>
  moveDecideBy({ ...(await which()), decideBy, ...over })
const lower = async (minimum: number) => lowerMinimum({ ...(await which()), minimum })
const ahead = async (deed: DeedAhead) => {
  const seen = await previewRunMails({ ...(await which()), ahead: deed })
  if (!seen.ok) throw new Error(seen.reason)
  return seen.value
}
const told = () =>
  MailOutbox.findAll({
    where: { kind: 'run_changed', workshopId: world.workshop.id },
    order: [['version', 'ASC']],
  })

describe('decide-by', () => {
  test('moves once, by at most 30 days, and everyone who has ordered is told the very mail shown before', async () => {
    const { order } = await reserved(world.run)
    const waiting = await makeOrder(
      { run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] },
      { state: 'waiting' },
    )
    const shown = await ahead({ deed: 'move_decide_by', decideBy: '2027-05-01' })
    expect(await move('2027-05-01')).toMatchObject({ ok: true, value: { decideBy: '2027-05-01' } })
    // The day ends at midnight in Hamburg, two hours before it ends in Greenwich.
    expect(await world.run.reload()).toMatchObject({
      decideByOn: '2027-05-01',
      decideByFirstOn: '2027-04-01',
      decideByAt: new Date('2027-05-01T22:00:00Z'),
      decideByMovedAt: NOW,
    })
    const due = await DueItem.findOne({ where: { kind: 'decide_by_passed', subjectId: world.run.id } })
    expect(due?.dueAt).toEqual(new Date('2027-05-07T22:00:00Z'))
    await runJobs()
    const mails = await told()
    expect(mails.map(({ subjectId }) => subjectId).sort()).toEqual([order.id, waiting.order.id].sort())
    expect(shown?.count).toBe(2)
    expect(mails.map(({ props }) => props)).toContainEqual(shown?.props)
    const decideBy = { from: '2027-04-01', to: '2027-05-01', callsOffOn: '2027-05-08' }
    expect(shown?.props).toMatchObject({ decideBy, minimum: null, deposited: 1 })
    expect(await move('2027-05-02')).toEqual({ ok: false, reason: 'already_moved' })
  })

  test('moved, the clock calls the run off only after the new day', async () => {
    await move('2027-04-20')
    const at = async (now: string) => {
      await callOffUndecided({ runId: world.run.id, now: new Date(now) })
      return (await world.run.reload()).state
    }
    expect(await at('2027-04-10T10:00:00Z')).toBe('taking_deposits')
    expect(await at('2027-04-26T22:00:00Z')).toBe('called_off')
  })

  test.each([
    ['2027-04-01', 'not_later'],
    ['2027-05-02', 'too_far'],
  ])('refuses %s: %s', async (day, reason) => {
    expect(await move(day)).toEqual({ ok: false, reason })
    expect(await Decision.count({ where: { runId: world.run.id } })).toBe(0)
  })

  test('is not moved beyond the time the provider keeps deposits, unless a plan is stated', async () => {
    await world.workshop.update({ holdingLimitDays: 40 })
    expect(await move('2027-04-20')).toEqual({ ok: false, reason: 'beyond_holding_limit' })
    await world.run.update({ holdingPlan: 'Deposits are paid back and asked for again.' })
    expect(await move('2027-04-20')).toMatchObject({ ok: true })
  })

  test('is its owner’s to move', async () => {
    const { person } = await makeUser({ workshopId: world.workshop.id, role: 'packer' })
    expect(await move('2027-04-20', { actor: await actorOf(person) })).toEqual({
      ok: false,
      reason: 'forbidden',
    })
  })
})

describe('the minimum', () => {
  test('falls, and each fall is told once', async () => {
    await reserved(world.run)
    const shown = await ahead({ deed: 'lower_minimum', minimum: 3 })
    await lower(3)
    await lower(2)
    await runJobs()
    const mails = await told()
    expect(mails.map(({ props }) => props['minimum'])).toEqual([
      { from: 4, to: 3 },
      { from: 3, to: 2 },
    ])
    expect(mails[0]?.props).toEqual(shown?.props)
  })
})

describe('the mails shown before', () => {
  test('a lock and a call-off: the first order’s own, and how many get theirs', async () => {
    const { order } = await reserved(world.run)
    await reserved(world.run)
    const locked = await ahead({ deed: 'lock', reason: 'A friend takes two.' })
    expect(locked).toMatchObject({ kind: 'run_locked', count: 2 })
    expect(locked?.props).toMatchObject({
      orderNumber: String(order.number),
      deposited: 2,
      belowMinimum: 'A friend takes two.',
    })
    const calledOff = await ahead({ deed: 'call_off', reason: 'Too few.' })
    // One kit’s deposit of 25.00.
    expect(calledOff?.props).toMatchObject({ refundMinor: 2500, reason: 'Too few.', cause: 'owner' })
  })

  test('none where nobody has ordered', async () => {
    expect(await ahead({ deed: 'call_off', reason: 'Too few.' })).toBeNull()
  })

  test('nothing to somebody else', async () => {
    const seen = await previewRunMails({
      ...(await which()),
      actor: { kind: 'visitor' },
      ahead: { deed: 'lock', reason: '' },
    })
    expect(seen).toEqual({ ok: false, reason: 'forbidden' })
  })
})
