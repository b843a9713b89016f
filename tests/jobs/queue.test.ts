import { randomUUID } from 'node:crypto'
import { QueryTypes } from 'sequelize'
import { describe, expect, test } from 'vitest'
import { sequelize } from '@/lib/db/sequelize'
import { clock } from '@/lib/gateways/clock'
import { enqueue } from '@/lib/jobs/enqueue'
import type { DueKind } from '@/lib/jobs/due-kinds'
import { listDue, markDone } from '@/lib/jobs/list-due'
import { dropDue, setDue } from '@/lib/jobs/set-due'

const kind = 'of_the_tests' as DueKind
const at = (iso: string) => new Date(iso)
const waiting = () =>
  sequelize.query<{ task_identifier: string; key: string | null }>(
    'select task_identifier, key from graphile_worker.jobs order by id',
    { type: QueryTypes.SELECT },
  )

describe('a job is promised with the change it belongs to', () => {
  test('kept when it commits, gone when it rolls back', async () => {
    await sequelize.transaction((tx) => enqueue(tx, 'evict_pages', { paths: ['/w/pier'] }, { key: 'kept' }))
    const rolledBack = sequelize.transaction(async (tx) => {
      await enqueue(tx, 'evict_pages', { paths: ['/w/pier'] }, { key: 'gone' })
      throw new Error('on second thoughts')
    })
    await expect(rolledBack).rejects.toThrow('on second thoughts')
    expect(await waiting()).toEqual([{ task_identifier: 'evict_pages', key: 'kept' }])
  })

  test('once for a key', async () => {
    for (const path of ['/a', '/b']) {
      await sequelize.transaction((tx) => enqueue(tx, 'evict_pages', { paths: [path] }, { key: 'same' }))
    }
    expect((await waiting()).filter(({ key }) => key === 'same')).toHaveLength(1)
  })

  test('not with a payload of another job', async () => {
    const wrong = { paths: 'everything' } as unknown as { paths: string[] }
    await expect(sequelize.transaction((tx) => enqueue(tx, 'evict_pages', wrong))).rejects.toThrow()
  })
})

describe('what falls due', () => {
  const set = (subjectId: string, when: string) =>
    sequelize.transaction((tx) => setDue(tx, { kind, subjectId, workshopId: null, at: at(when) }))
  const dueBy = async (when: string) => (await listDue(at(when))).map(({ subjectId }) => subjectId)

  test('comes oldest first, and not before its time', async () => {
    const [early, late, later] = [randomUUID(), randomUUID(), randomUUID()]
    await set(late, '2031-03-02T00:00:00Z')
    await set(early, '2031-03-01T00:00:00Z')
    await set(later, '2031-03-02T00:00:00.001Z')
    expect(await dueBy('2031-03-02T00:00:00Z')).toEqual([early, late])
  })

  test('once done comes no more, unless its handler has set it again for later', async () => {
    const subjectId = randomUUID()
    await set(subjectId, '2032-01-01T00:00:00Z')
    const [item] = (await listDue(at('2032-01-02T00:00:00Z'))).filter((row) => row.subjectId === subjectId)
    if (!item) throw new Error('it did not fall due')

    await set(subjectId, '2032-01-05T00:00:00Z')
    await markDone(item, at('2032-01-02T00:00:00Z'))
    expect(await dueBy('2032-01-04T00:00:00Z')).not.toContain(subjectId)
    expect(await dueBy('2032-01-06T00:00:00Z')).toContain(subjectId)

    await markDone({ ...item, dueAt: at('2032-01-05T00:00:00Z') }, at('2032-01-06T00:00:00Z'))
    expect(await dueBy('2032-01-07T00:00:00Z')).not.toContain(subjectId)
  })

  test('taken off, it never comes', async () => {
    const subjectId = randomUUID()
    await set(subjectId, '2033-01-01T00:00:00Z')
    await sequelize.transaction((tx) => dropDue(tx, kind, subjectId))
    expect(await dueBy('2034-01-01T00:00:00Z')).not.toContain(subjectId)
  })
})

describe('business time', () => {
  test('moves by the hours it is advanced, and never back', async () => {
    const before = await clock.now()
    const after = await clock.advance(36.5)
    const movedMs = after.getTime() - before.getTime()
    expect(movedMs).toBeGreaterThanOrEqual(36.5 * 3_600_000)
    expect(movedMs).toBeLessThan(36.5 * 3_600_000 + 5_000)
    await expect(clock.advance(-1)).rejects.toThrow(RangeError)
    await expect(sequelize.query('update clock_offset set offset_ms = offset_ms - 1')).rejects.toThrow()
  })
})
