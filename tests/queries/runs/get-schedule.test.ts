import { beforeAll, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { getSchedule } from '@/lib/queries/runs/get-schedule'
import { saveClosedDays } from '@/lib/services/settings/save-closed-days'
import { Plan, Workshop } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePlan } from '@/tests/support/worlds/decision'
import { actorOf } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { makeModule } from '@/tests/support/worlds/module'

async function makeWorld() {
  const house = await makeWorkshop()
  const design = await makeModule(house.workshop)
  const run = await makeRun({ ...house, ...design })
  const plan = await makePlan({ ...house, ...design, ...run })
  return { ...house, ...run, plan, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
let at: Omit<Parameters<typeof getSchedule>[0], 'slip'>
const step = (id: string, days: number, after: string[], over: object = {}) => ({
  ...{ id, name: `step ${id}`, optimistic: days, likely: days, pessimistic: days, after },
  ...over,
})
const steps = (list: object[]) => Plan.update({ steps: list as never }, { where: { id: world.plan.id } })
const desk = async (slip: Parameters<typeof getSchedule>[0]['slip'] = null) => {
  const found = await getSchedule({ ...at, slip })
  if (!found) throw new Error('no schedule')
  return found
}

beforeAll(async () => {
  world = await makeWorld()
  at = { actor: world.actor, workshopId: world.workshop.id, runId: world.run.id, now: NOW }
})

// NOW is Monday 1 March 2027; ten working days on is Monday 15, fifteen Monday 22, counted on the calendar.
test('each offer waits for its own steps only', async () => {
  await steps([step('1', 10, []), step('2', 5, ['1'], { offers: ['built'] })])
  const { offers, isExact } = await desk()
  expect(isExact).toBe(true)
  expect(Object.fromEntries(offers.map(({ offer, suggested }) => [offer, suggested]))).toEqual({
    boards: '2027-03-15',
    kit: '2027-03-15',
    built: '2027-03-22',
  })
  expect(offers.every(({ chance }) => chance === 1)).toBe(true)
})

test('a slip moves the offers that wait for the step, and no others', async () => {
  const { slipped, offers } = await desk({ step: '2', days: 3 })
  expect(slipped).toMatchObject({ name: 'step 2', days: 3 })
  const moved = slipped!.offers.filter(({ suggested }, i) => suggested !== offers[i]!.suggested)
  // Three working days after Monday 22 is Thursday 25.
  expect(moved.map(({ offer, suggested }) => [offer, suggested])).toEqual([['built', '2027-03-25']])
  expect((await desk({ step: 'none', days: 3 })).slipped).toBeNull()
})

test('a supplier’s closed days make its step longer, the workshop’s own push everything', async () => {
  await steps([step('1', 10, [], { closedFrom: '2027-03-04', closedTo: '2027-03-05' })])
  const closed = await desk()
  expect(closed.steps[0]).toMatchObject({ longer: 2, likely: 10, to: '2027-03-17' })
  expect(closed.offers.find(({ offer }) => offer === 'kit')?.suggested).toBe('2027-03-17')
  const scope = { actor: at.actor, workshopId: at.workshopId }
  expect(await saveClosedDays({ ...scope, days: '2027-03-08 to 2027-03-09\n' })).toEqual(ok({ days: 2 }))
  expect((await desk()).offers.find(({ offer }) => offer === 'kit')?.suggested).toBe('2027-03-19')
})

test.each(['soon', '2027-02-30', '2027-03-09 to 2027-03-08', '2027-01-01 to 2028-01-01'])(
  'closed days such as %j are refused with a sentence, the old ones stay',
  async (days) => {
    const scope = { actor: at.actor, workshopId: at.workshopId }
    expect(await saveClosedDays({ ...scope, days })).toMatchObject({ errors: { days: expect.any(String) } })
    const workshop = await Workshop.findByPk(at.workshopId, { rejectOnEmpty: true })
    expect(workshop.closedDays).toEqual(['2027-03-08', '2027-03-09'])
  },
)

test('strangers see nothing and close nothing', async () => {
  const actor = await actorOf((await makeWorkshop()).owner)
  expect(await getSchedule({ ...at, actor, slip: null })).toBeNull()
  expect(await saveClosedDays({ actor, workshopId: at.workshopId, days: '' })).toEqual(refuse('forbidden'))
})
