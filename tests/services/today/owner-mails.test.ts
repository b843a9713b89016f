import { beforeEach, describe, expect, test } from 'vitest'
import { noteForecast } from '@/lib/services/runs/note-forecast'
import { remindOwner } from '@/lib/services/runs/remind-owner'
import { sendOwnerDigest } from '@/lib/services/today/send-owner-digest'
import { DueItem, Forecast, MailOutbox } from '@/models'
import { at, NOW } from '@/tests/support/worlds/base'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeModule } from '@/tests/support/worlds/module'
import { makeRun } from '@/tests/support/worlds/run'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

async function makeWorld() {
  const house = await makeWorkshop()
  const design = await makeModule(house.workshop)
  return { ...house, ...(await makeRun({ ...house, ...design }, { minimum: 2, maximum: 20 })) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
beforeEach(async () => {
  world = await makeWorld()
})

const mailsOf = (kind: string) =>
  MailOutbox.findAll({ where: { kind, workshopId: world.workshop.id }, order: [['queuedAt', 'ASC']] })
const dueOf = (kind: string, subjectId = world.run.id) => DueItem.findOne({ where: { kind, subjectId } })
const order = (over: Parameters<typeof makeOrder>[1] = {}) =>
  makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] }, over)

describe('the evening’s mail', () => {
  const send = (now: Date) => sendOwnerDigest({ workshopId: world.workshop.id, now })

  test('says what the desk says, once an evening, and comes again while a run is going', async () => {
    await order()
    await order()
    const evening = at('2027-03-20T17:00:00Z')
    await send(evening)
    await send(evening)
    const [mail, ...others] = await mailsOf('owner_digest')
    expect(others).toEqual([])
    expect(mail?.personId).toBe(world.owner.id)
    const items = mail?.props['items'] as { what: string; count: number }[]
    expect(items.map(({ what, count }) => [what, count])).toEqual([
      ['decide_soon', 1],
      ['ready_to_lock', 1],
    ])
    // 18:00 in Hamburg, an hour before that in Greenwich in winter; the clocks go forward only on the 28th.
    expect((await dueOf('owner_digest', world.workshop.id))?.dueAt).toEqual(at('2027-03-21T17:00:00Z'))
  })

  test('stays away on an evening on which nothing needs anybody', async () => {
    await send(NOW)
    expect(await mailsOf('owner_digest')).toEqual([])
    await world.run.update({ state: 'closed', lockedAt: NOW, closedAt: NOW })
    await DueItem.destroy({ where: { subjectId: world.workshop.id } })
    await send(NOW)
    expect(await dueOf('owner_digest', world.workshop.id)).toBeNull()
  })
})

describe('reminders', () => {
  const remind = (now: Date) => remindOwner({ runId: world.run.id, now })

  test('of the decision: 14 and 3 days before, on its day, and before the clock calls off; once each', async () => {
    for (const day of ['2027-03-01', '2027-03-18', '2027-03-19', '2027-03-29', '2027-04-01', '2027-04-05'])
      await remind(at(`${day}T09:00:00Z`))
    const mails = await mailsOf('owner_reminder')
    expect(mails.map(({ props }) => [props['about'], props['daysLeft']])).toEqual([
      ['decide_by', 14],
      ['decide_by', 3],
      ['decide_by', 0],
      ['decide_by', -4],
    ])
    expect(mails[0]?.props).toMatchObject({ on: '2027-04-01', callsOffOn: '2027-04-08', minimum: 2 })
  })

  test('of a promise, until all of the offer is posted; only the latest after a long jump of the clock', async () => {
    await world.run.update({ state: 'locked', lockedAt: NOW })
    const { order: placed } = await order()
    await remind(at('2027-08-20T09:00:00Z'))
    const [mail, ...others] = await mailsOf('owner_reminder')
    // Kits alone are waiting: 14 days before 31 August is the 17th.
    expect(others).toEqual([])
    expect(mail?.props).toMatchObject({ about: 'posted_by', offer: 'kit', on: '2027-08-31', daysLeft: 11 })
    expect((await dueOf('run_reminder'))?.dueAt).toEqual(at('2027-08-28T07:00:00Z'))
    await placed.update({ state: 'posted', paidAt: NOW, postedAt: NOW })
    await remind(at('2027-08-28T09:00:00Z'))
    expect(await mailsOf('owner_reminder')).toHaveLength(1)
  })
})

describe('forecasts kept on the way', () => {
  test('one as each quarter of the window ends, never changed; a jump leaves earlier ones out', async () => {
    const note = (now: Date) => noteForecast({ runId: world.run.id, now })
    const { openedAt, decideByAt } = world.run
    const part = (share: number) =>
      new Date(openedAt!.getTime() + (decideByAt.getTime() - openedAt!.getTime()) * share)
    await note(part(0.1))
    expect(await Forecast.count({ where: { runId: world.run.id } })).toBe(0)
    expect((await dueOf('run_forecast'))?.dueAt).toEqual(part(0.25))
    await order()
    await note(part(0.6))
    await order()
    await note(part(0.7))
    await note(part(0.75))
    const kept = await Forecast.findAll({ where: { runId: world.run.id }, order: [['at', 'ASC']] })
    expect(kept.map(({ quarter, deposited }) => [quarter, deposited])).toEqual([
      [2, 1],
      [3, 2],
    ])
    expect(kept[1]?.figures.chance).toBe(1)
    await expect(kept[0]!.update({ deposited: 9 })).rejects.toThrow()
  })

  test('none of a run that is decided', async () => {
    await world.run.update({ state: 'locked', lockedAt: NOW })
    expect(await noteForecast({ runId: world.run.id, now: at('2027-03-20T09:00:00Z') })).toEqual({
      ok: true,
      value: { quarter: null },
    })
  })
})
