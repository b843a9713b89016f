import { expect, test } from 'vitest'
import { publicWords } from '@/lib/messages/public'
import { getPublicRecord } from '@/lib/queries/public/get-public-record'
import { at, hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeAttempt, makeRefund } from '@/tests/support/worlds/payment'
import { makeRun } from '@/tests/support/worlds/run'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

const off = {
  state: 'called_off',
  calledOffAt: NOW,
  callOffReason: 'Too few.',
  callOffCause: 'owner',
} as const

async function house() {
  const made = await makeWorkshop()
  const design = await makeModule(made.workshop)
  return { ...made, ...design }
}
type House = Awaited<ReturnType<typeof house>>

/** A run promised for 31 August 2027 whose orders were posted at these instants. */
async function runPosted(world: House, instants: string[], over: Parameters<typeof makeRun>[1] = {}) {
  const { run, runOffers } = await makeRun(world, {
    state: 'closed',
    closedAt: at('2027-10-01T09:00:00Z'),
    lockedAt: NOW,
    maximum: 50,
    ...over,
  })
  for (const instant of instants)
    await makeOrder(
      { run, lines: [{ offer: runOffers.kit, quantity: 1 }] },
      { state: 'posted', postedAt: at(instant) },
    )
  return { run, runOffers }
}

test('a workshop that has ended no run has no record', async () => {
  const world = await house()
  await makeRun(world)
  expect(await getPublicRecord(world.workshop)).toEqual({ daysLate: [], repaidInDays: [] })
})

test('counts from the day first promised to the last parcel, in the workshop’s days', async () => {
  const world = await house()
  // 23:30 UTC on 26 August is 27 August in Hamburg: four days before 31 August.
  await runPosted(world, ['2027-08-01T09:00:00Z', '2027-08-26T23:30:00Z'])
  const late = await runPosted(world, ['2027-09-19T09:00:00Z'])
  await late.runOffers.kit.update({ postedByOn: '2027-09-30', delayedAt: NOW })
  expect((await getPublicRecord(world.workshop)).daysLate.sort((a, b) => a - b)).toEqual([-4, 19])
})

test('a locked run counts once its last parcel is posted, not before', async () => {
  const world = await house()
  const { run, runOffers } = await runPosted(world, ['2027-08-31T09:00:00Z'], {
    state: 'locked',
    closedAt: null,
  })
  expect((await getPublicRecord(world.workshop)).daysLate).toEqual([0])
  await makeOrder({ run, lines: [{ offer: runOffers.kit, quantity: 1 }] }, { state: 'paid' })
  expect((await getPublicRecord(world.workshop)).daysLate).toEqual([])
})

test('a run called off tells in how many days everyone was repaid, or that not everyone is yet', async () => {
  const world = await house()
  const { run, runOffers } = await makeRun(world, off)
  const { order } = await makeOrder(
    { run, lines: [{ offer: runOffers.kit, quantity: 1 }] },
    { state: 'cancelled', cancelCause: 'run_called_off' },
  )
  const attempt = await makeAttempt(order)
  expect((await getPublicRecord(world.workshop)).repaidInDays).toEqual([null])
  await makeRefund(attempt, {
    state: 'succeeded',
    providerId: 're_1',
    sentAt: NOW,
    succeededAt: hoursAfter(NOW, 72),
  })
  expect((await getPublicRecord(world.workshop)).repaidInDays).toEqual([3])
})

test('a draft called off before it opened is nobody’s business', async () => {
  const world = await house()
  await makeRun(world, { ...off, openedAt: null, opensToAllAt: null })
  expect((await getPublicRecord(world.workshop)).repaidInDays).toEqual([])
})

test('the record of one workshop holds no runs of another', async () => {
  const world = await house()
  await runPosted(await house(), ['2027-08-31T09:00:00Z'])
  expect((await getPublicRecord(world.workshop)).daysLate).toEqual([])
})

test('stands on the page as one sentence', () => {
  const { record } = publicWords
  expect(record({ daysLate: [-4, 19], repaidInDays: [3] })).toBe(
    '3 runs: posted 4 days early, 19 days late, 1 called off, all repaid in 3 days.',
  )
  expect(record({ daysLate: [0], repaidInDays: [] })).toBe('1 run: posted on the day.')
  expect(record({ daysLate: [], repaidInDays: [0, 0] })).toBe(
    '2 runs: 2 called off, all repaid the same day.',
  )
  expect(record({ daysLate: [1], repaidInDays: [2, null] })).toBe(
    '3 runs: posted 1 day late, 2 called off, not everyone repaid yet.',
  )
})
