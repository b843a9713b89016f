import { beforeAll, expect, test } from 'vitest'
import { FirstUnitInput, LessonInput, RevisionInput } from '@/lib/contracts/module-forms'
import type { Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { createRevision } from '@/lib/services/modules/create-revision'
import { mendLesson } from '@/lib/services/modules/mend-lesson'
import { recordFirstUnit } from '@/lib/services/modules/record-first-unit'
import { waiveLesson } from '@/lib/services/modules/waive-lesson'
import { writeLesson } from '@/lib/services/modules/write-lesson'
import { AuditEntry, Lesson, Revision } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let given: { actor: Actor; workshopId: string; module: string; now: Date }
beforeAll(async () => {
  world = await pier()
  given = { actor: await actorOf(world.owner), workshopId: world.workshop.id, module: 'rowlock', now: NOW }
})

const revision = (over: object = {}) => RevisionInput.parse({ note: 'Header turned round.', ...over })
const lesson = (over: object = {}) =>
  LessonInput.parse({
    revision: 'A',
    symptom: 'Smoke at the power header.',
    howFound: '',
    cause: '',
    remedy: '',
    ...over,
  })
const firstUnit = (over: object = {}) =>
  FirstUnitInput.parse({
    revision: 'B',
    on: '2027-02-26',
    how: 'Every step of the test plan passed.',
    ...over,
  })

test('revisions take the next letter, and a letter once', async () => {
  expect(await createRevision({ ...given, input: revision() })).toEqual(
    ok({ module: 'rowlock', revision: 'B' }),
  )
  const taken = await createRevision({ ...given, input: revision({ letter: 'b' }) })
  expect(taken).toMatchObject({ errors: { letter: expect.any(String) } })
  expect(await createRevision({ ...given, input: revision({ letter: 'Z' }) })).toMatchObject({
    value: { revision: 'Z' },
  })
  expect(await createRevision({ ...given, input: revision() })).toMatchObject({ value: { revision: 'AA' } })
  expect(await createRevision({ ...given, actor: await actorOf(world.bench), input: revision() })).toEqual(
    refuse('forbidden'),
  )
})

test('a lesson is mended in a later revision, or lived with for a reason', async () => {
  const bench = { ...given, actor: await actorOf(world.bench) }
  const written = await writeLesson({ ...bench, input: lesson() })
  if (!written.ok) throw new Error('not written')
  const id = written.value.lesson
  expect(await writeLesson({ ...given, input: lesson({ revision: 'Q' }) })).toMatchObject({
    errors: { revision: expect.any(String) },
  })
  expect(await mendLesson({ ...given, input: { lesson: id, revision: 'A' } })).toMatchObject({
    errors: { revision: expect.any(String) },
  })
  expect(await waiveLesson({ ...bench, input: { lesson: id, reason: 'Rare.' } })).toEqual(refuse('forbidden'))
  expect((await waiveLesson({ ...given, input: { lesson: id, reason: 'Rare.' } })).ok).toBe(true)
  expect(await waiveLesson({ ...given, input: { lesson: id, reason: 'Rare.' } })).toEqual(
    refuse('already_mended'),
  )
  expect((await mendLesson({ ...bench, input: { lesson: id, revision: 'AA' } })).ok).toBe(true)
  expect((await mendLesson({ ...bench, input: { lesson: id, revision: 'AA' } })).ok).toBe(true)
  expect(await mendLesson({ ...bench, input: { lesson: id, revision: 'B' } })).toEqual(
    refuse('already_mended'),
  )
  const row = await Lesson.findByPk(id, { rejectOnEmpty: true })
  expect(row).toMatchObject({ waivedReason: 'Rare.', createdByPersonId: world.bench.id })
})

test('a first good unit proves a revision: when, who, how, once', async () => {
  const tomorrow = await recordFirstUnit({ ...given, input: firstUnit({ on: '2027-03-02' }) })
  expect(tomorrow).toMatchObject({ errors: { on: expect.any(String) } })
  const nobody = await recordFirstUnit({ ...given, input: firstUnit({ by: world.ines.id }) })
  expect(nobody).toMatchObject({ errors: { by: expect.any(String) } })
  expect(await recordFirstUnit({ ...given, input: firstUnit({ revision: 'Q' }) })).toMatchObject({
    errors: { revision: expect.any(String) },
  })

  expect(await recordFirstUnit({ ...given, input: firstUnit({ by: world.bench.id }) })).toEqual(
    ok({ revision: 'B' }),
  )
  expect(await recordFirstUnit({ ...given, input: firstUnit() })).toEqual(refuse('already_recorded'))
  const row = await Revision.findOne({
    where: { moduleId: world.module.id, letter: 'B' },
    rejectOnEmpty: true,
  })
  // The day begins in Hamburg an hour before it does in Greenwich.
  expect(row).toMatchObject({
    state: 'proven',
    firstGoodByPersonId: world.bench.id,
    firstGoodAt: new Date('2027-02-25T23:00:00Z'),
  })
  const moves = await AuditEntry.findAll({ where: { subjectId: row.id } })
  expect(moves.map(({ event }) => event).sort()).toEqual(['create', 'prove', 'test'])
})

test('a foreign owner finds none of it', async () => {
  const actor = await actorOf(world.fenLamp.owner)
  const theirs = { ...given, actor, workshopId: world.fenLamp.workshop.id }
  expect(await createRevision({ ...theirs, input: revision() })).toEqual(refuse('not_found'))
  const { id } = await Lesson.findOne({ rejectOnEmpty: true })
  expect(await mendLesson({ ...theirs, input: { lesson: id, revision: 'B' } })).toEqual(refuse('not_found'))
  expect(await mendLesson({ ...given, actor, input: { lesson: id, revision: 'B' } })).toEqual(
    refuse('forbidden'),
  )
})
