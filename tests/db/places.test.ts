import { expect, test } from 'vitest'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { Run } from '@/models'
import { makeRun } from '../support/worlds/run'
import { refusedBy } from './refused-by'

test('a run never takes more units than its maximum, nor fewer than none', async () => {
  const { run, runOffers } = await makeRun(undefined, { maximum: 5 })
  expect(await refusedBy(() => run.increment('committedUnits', { by: 6 }))).toBe(
    'runs_committed_within_maximum_check',
  )
  expect(await refusedBy(() => run.decrement('committedUnits', { by: 1 }))).toBe('runs_committed_units_check')
  await runOffers.kit.update({ maximum: 2 })
  const third = () => runOffers.kit.increment('committedUnits', { by: 3 })
  expect(await refusedBy(third)).toBe('run_offers_committed_within_maximum_check')
})

test('the maximum cannot be set below what is taken', async () => {
  const { run } = await makeRun(undefined, { maximum: 5, committedUnits: 4 })
  expect(await refusedBy(() => run.update({ maximum: 3 }))).toBe('runs_committed_within_maximum_check')
})

test('of twenty who want the last place at once, one gets it', async () => {
  const { run } = await makeRun(undefined, { maximum: 5, committedUnits: 4 })
  const take = () =>
    inTransaction(async (tx): Promise<Result<number, 'full'>> => {
      const row = await Run.findByPk(run.id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
      if (row.committedUnits + 1 > row.maximum) return refuse('full')
      await row.update({ committedUnits: row.committedUnits + 1 }, { transaction: tx })
      return ok(row.committedUnits)
    })
  const taken = await Promise.all(Array.from({ length: 20 }, take))
  expect(taken.filter((result) => result.ok)).toEqual([ok(5)])
  expect((await run.reload()).committedUnits).toBe(5)
})

test('a run is told apart from a wish: minimum, maximum and decide-by hold together', async () => {
  const { run } = await makeRun(undefined, { minimum: 3, maximum: 5 })
  expect(await refusedBy(() => run.update({ minimum: 6 }))).toBe('runs_maximum_reaches_minimum_check')
  expect(await refusedBy(() => run.update({ minimum: 4 }))).toBe('runs_minimum_only_falls_check')
  expect(await refusedBy(() => run.update({ decideByOn: '2027-04-15' }))).toBe('runs_decide_by_moved_check')
  const moved = { decideByMovedAt: new Date('2027-03-02T00:00:00Z') }
  const tooFar = () => run.update({ decideByOn: '2027-05-02', ...moved })
  expect(await refusedBy(tooFar)).toBe('runs_decide_by_moved_check')
  await run.reload()
  await run.update({ decideByOn: '2027-05-01', ...moved })
  expect((await run.reload()).decideByOn).toBe('2027-05-01')
})
