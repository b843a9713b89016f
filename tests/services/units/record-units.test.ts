import { beforeAll, describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { listRunUnits } from '@/lib/queries/units/list-run-units'
import { recordUnits } from '@/lib/services/units/record-units'
import { AuditEntry, Unit } from '@/models'
import { elsewhere, packingWorld } from '@/tests/services/packing/packing-world'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof packingWorld>>
let owner: Awaited<ReturnType<typeof actorOf>>
beforeAll(async () => {
  world = await packingWorld()
  owner = await actorOf(world.owner)
})

const record = (serials: string, offer: 'boards' | 'kit' | 'built' = 'built', actor = owner) =>
  recordUnits({
    actor,
    workshopId: world.workshopId,
    runId: world.run.id,
    input: { offer, serials },
    now: NOW,
  })

test('a line each: the units are free, passed, with a trail', async () => {
  expect(await record('FL-1\nFL-2\n\nFL-3')).toEqual(ok({ entered: 3 }))
  const units = await listRunUnits({ actor: owner, workshopId: world.workshopId, runId: world.run.id })
  expect(units.map(({ serial, offer, state }) => [serial, offer, state])).toEqual([
    ['FL-1', 'built', 'passed'],
    ['FL-2', 'built', 'passed'],
    ['FL-3', 'built', 'passed'],
  ])
  const unit = await Unit.findOne({ where: { serial: 'FL-1' }, rejectOnEmpty: true })
  expect(unit).toMatchObject({ revisionId: world.run.revisionId, passedAt: NOW })
  expect(await AuditEntry.count({ where: { subjectId: unit.id, event: 'pass' } })).toBe(1)
})

test('a table with headings: the form stands behind the number', async () => {
  expect(await record('serial;form\nK-1;kit\nB-1;BUILT\nB-2;')).toEqual(ok({ entered: 3 }))
  const kinds = await Unit.findAll({ where: { serial: ['K-1', 'B-1', 'B-2'] }, order: [['serial', 'ASC']] })
  expect(kinds.map(({ serial, offerKind }) => [serial, offerKind])).toEqual([
    ['B-1', 'built'],
    ['B-2', 'built'],
    ['K-1', 'kit'],
  ])
})

describe('one line that cannot be taken stops all of them, and is named', () => {
  test.each([
    ['T-1\nT-2\nt-1', 'Line 3: t-1 stands in the list already.'],
    ['T-1\nfl-1', 'Line 2: there is a unit fl-1 in this workshop already.'],
    ['T-1\nT 2', 'Line 2: put one serial number on it, or the number and its form with ; between.'],
    ['T-1;kit;4', 'Line 1: put one serial number on it, or the number and its form with ; between.'],
    ['T-1;finished', 'Line 1: “finished” is no form. Write boards, kit or built.'],
    [`T-1\n${'9'.repeat(41)}`, 'Line 2: a serial number has at most 40 characters.'],
    [Array.from({ length: 501 }, (_, i) => `T-${i}`).join('\n'), 'Enter at most 500 units at once.'],
  ])('%#', async (serials, sentence) => {
    expect(await record(serials)).toMatchObject({ reason: 'invalid', errors: { serials: sentence } })
    expect(await Unit.count({ where: { serial: 'T-1' } })).toBe(0)
  })
})

test('a packer enters none, and another workshop has no such run', async () => {
  expect(await record('T-9', 'built', world.packer)).toEqual(refuse('forbidden'))
  const stranger = await elsewhere()
  const there = { actor: stranger.actor, workshopId: stranger.workshopId, runId: world.run.id, now: NOW }
  expect(await recordUnits({ ...there, input: { offer: 'built', serials: 'T-9' } })).toEqual(
    refuse('not_found'),
  )
})
