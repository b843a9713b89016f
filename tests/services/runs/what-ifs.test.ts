import { beforeAll, expect, test } from 'vitest'
import { WhatIfInput } from '@/lib/contracts/what-ifs'
import { refuse } from '@/lib/core/result'
import { getCostDesk } from '@/lib/queries/runs/get-cost-desk'
import { getWhatIfs } from '@/lib/queries/runs/get-what-ifs'
import { addWhatIf } from '@/lib/services/runs/add-what-if'
import { removeWhatIf } from '@/lib/services/runs/remove-what-if'
import { Plan } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePlan } from '@/tests/support/worlds/decision'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { makeModule } from '@/tests/support/worlds/module'

async function makeWorld() {
  const house = await makeWorkshop()
  const design = await makeModule(house.workshop)
  const run = await makeRun({ ...house, ...design }, { minimum: 4, maximum: 10 })
  return { ...house, ...design, ...run, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
let at: Parameters<typeof getWhatIfs>[0]
const input = (over: object) => WhatIfInput.parse({ currency: 'EUR', name: 'What if', ...over })
const add = (over: object) => addWhatIf({ ...at, input: input(over) })
const desk = async () => (await getWhatIfs(at))!

beforeAll(async () => {
  world = await makeWorld()
  at = { actor: world.actor, workshopId: world.workshop.id, runId: world.run.id, now: NOW }
  await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 2 }] })
})

test('without a plan of its own there is nothing to vary', async () => {
  expect(await desk()).toMatchObject({ plans: [], canAdd: false })
  expect(await add({})).toEqual(refuse('no_plan'))
})

test('price, quantity and yield differ beside the plan, which stays as it is', async () => {
  await makePlan(world)
  const before = (await getCostDesk(at))!.figures!
  expect(
    await add({ name: 'Dearer', prices: [{ offer: 'kit', priceMinor: 10_500 }], units: '8' }),
  ).toMatchObject({ ok: true })
  expect(await add({ name: 'Poor yield', yieldPercent: '80' })).toMatchObject({ ok: true })
  const { plans } = await desk()
  const [own, dearer, poor] = plans
  expect(plans.map(({ name }) => name)).toEqual(['', 'Dearer', 'Poor yield'])
  expect(own).toMatchObject({ id: null, units: before.units, profit: before.totals.profit })
  // All are kits: 300.00 once, 5.00 of packaging each. Four at 95.00 leave 60.00, eight at 105.00 leave 500.00.
  expect(own!.profit).toBe(4 * (9500 - 500) - 30_000)
  expect(dearer!.profit).toBe(8 * (10_500 - 500) - 30_000)
  expect(dearer).toMatchObject({ units: 8 })
  expect(dearer!.prices.find(({ offer }) => offer === 'kit')?.priceMinor).toBe(10_500)
  // What is not said stays at the run's own prices.
  expect(dearer!.prices.find(({ offer }) => offer === 'built')?.priceMinor).toBe(16_500)
  expect(poor!.yieldBasisPoints).toBe(8000)
  expect((await getCostDesk(at))!.figures).toEqual(before)
})

test('at most four stand side by side; a name is given once; one can be thrown away', async () => {
  expect(await add({ name: 'Dearer' })).toMatchObject({ errors: { name: expect.any(String) } })
  expect(await add({ name: 'Base' })).toMatchObject({ errors: { name: expect.any(String) } })
  expect(await add({ name: 'Third', units: '5' })).toMatchObject({ ok: true })
  expect(await add({ name: 'Fourth' })).toEqual(refuse('too_many_what_ifs'))
  expect((await desk()).canAdd).toBe(false)
  const third = await Plan.findOne({ where: { name: 'Third' }, rejectOnEmpty: true })
  const gone = { actor: at.actor, workshopId: at.workshopId, runId: at.runId, planId: third.id }
  expect(await removeWhatIf(gone)).toMatchObject({ ok: true })
  expect(await removeWhatIf(gone)).toEqual(refuse('not_found'))
})

test('the plan the run is decided on cannot be thrown away, and strangers touch nothing', async () => {
  const base = await Plan.findOne({ where: { runId: at.runId, isBase: true }, rejectOnEmpty: true })
  const asked = { actor: at.actor, workshopId: at.workshopId, runId: at.runId, planId: base.id }
  expect(await removeWhatIf(asked)).toEqual(refuse('not_found'))
  const actor = await actorOf((await makeWorkshop()).owner)
  expect(await getWhatIfs({ ...at, actor })).toBeNull()
  expect(await addWhatIf({ ...at, actor, input: input({}) })).toEqual(refuse('forbidden'))
})

test.each<[string, object, string]>([
  ['a yield above everything', { yieldPercent: '101' }, 'yieldPercent'],
  ['a yield of nothing', { yieldPercent: '0' }, 'yieldPercent'],
  ['a price of nothing', { prices: [{ offer: 'kit', priceMinor: 0 }] }, 'prices.0.priceMinor'],
  ['half a unit', { units: '1.5' }, 'units'],
  ['no name', { name: '' }, 'name'],
  ['a supplier without a change', { supplier: 'East' }, 'supplierDoes'],
  ['prices without a number', { supplier: 'East', supplierDoes: 'prices' }, 'supplierPercent'],
  [
    'a change beyond sense',
    { supplier: 'East', supplierDoes: 'prices', supplierPercent: '900' },
    'supplierPercent',
  ],
])('%s is refused at its field', (_, over, field) => {
  const read = WhatIfInput.safeParse({ currency: 'EUR', name: 'What if', ...over })
  expect(read.error?.issues.map(({ path }) => path.join('.'))).toContain(field)
})
