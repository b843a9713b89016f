import { QueryTypes } from 'sequelize'
import { expect, test } from 'vitest'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { recordMove } from '@/lib/services/_steps/record-move'
import { AuditEntry, ClockOffset, StockMove, Part } from '@/models'
import { NOW } from '../support/worlds/base'
import { makeRun } from '../support/worlds/run'
import { makeWorkshop } from '../support/worlds/workshop'
import { refusedBy } from './refused-by'

test('these tables are only ever added to', async () => {
  const found = await sequelize.query<{ name: string }>(
    `select tgrelid::regclass::text as name from pg_trigger
     where tgfoid in ('refuse_change'::regproc, 'refuse_change_unless_erasing'::regproc) order by 1`,
    { type: QueryTypes.SELECT },
  )
  expect(found.map(({ name }) => name)).toEqual([
    'addresses',
    'audit_entries',
    'decisions',
    'forecasts',
    'invoices',
    'ledger_entries',
    'ledger_transfers',
    'readings',
    'stock_moves',
    'terms_versions',
  ])
})

test('an audit entry is written with the move and neither changed nor deleted', async () => {
  const { run } = await makeRun()
  const move = {
    workshopId: run.workshopId,
    subjectType: 'run',
    subjectId: run.id,
    byPersonId: null,
    at: NOW,
  }
  await inTransaction(async (tx) => {
    await recordMove(tx, { ...move, from: 'draft', event: 'open_deposits', to: 'taking_deposits' })
    await recordMove(tx, { ...move, from: 'taking_deposits', event: 'lock', to: 'locked', note: 'Reached.' })
    return ok(null)
  })
  const entries = await AuditEntry.findAll({
    where: { subjectType: 'run', subjectId: run.id },
    order: ['seq'],
  })
  expect(entries.map(({ fromState, event, toState, note }) => [fromState, event, toState, note])).toEqual([
    ['draft', 'open_deposits', 'taking_deposits', null],
    ['taking_deposits', 'lock', 'locked', 'Reached.'],
  ])
  expect(await refusedBy(() => entries[0]!.update({ note: 'Otherwise.' }))).toMatch(/never changed/)
  expect(await refusedBy(() => entries[0]!.destroy())).toMatch(/never changed/)
})

test('stock is what its moves add up to', async () => {
  const { workshop } = await makeWorkshop()
  const part = await Part.create({ workshopId: workshop.id, code: 'R-4K7', createdAt: NOW })
  const move = { workshopId: workshop.id, partId: part.id, byPersonId: workshop.createdByPersonId, at: NOW }
  const received = await StockMove.create({ ...move, change: 100, cause: 'received' })
  await StockMove.create({ ...move, change: -37, cause: 'used' })
  expect(await StockMove.sum('change', { where: { partId: part.id } })).toBe(63)
  expect(await refusedBy(() => StockMove.create({ ...move, change: 0, cause: 'counted' }))).toBe(
    'stock_moves_change_not_zero_check',
  )
  expect(await refusedBy(() => received.update({ change: 99 }))).toMatch(/never changed/)
})

test('business time only goes forward, and there is one of it', async () => {
  const clock = await ClockOffset.findByPk(1, { rejectOnEmpty: true })
  await clock.update({ offsetMs: 3_600_000 })
  expect(await refusedBy(() => clock.update({ offsetMs: 3_599_999 }))).toBe('clock_offset_forward')
  expect(await refusedBy(() => ClockOffset.create({ id: 2 }))).toBe('clock_offset_one_row_check')
})
