import { beforeAll, expect, test } from 'vitest'
import { CostTrial } from '@/lib/contracts/cost-desk'
import { fieldsToBody } from '@/lib/contracts/form-fields'
import { PlanInput } from '@/lib/contracts/plan-forms'
import type { CostPlan } from '@/lib/core/costs/plan'
import { ok, refuse } from '@/lib/core/result'
import { getCostDesk } from '@/lib/queries/runs/get-cost-desk'
import { tryCosts } from '@/lib/queries/runs/try-costs'
import { saveRunPlan } from '@/lib/services/runs/save-run-plan'
import { Plan, Run, StockMove } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePartsList } from '@/tests/support/worlds/decision'
import { makeOrder } from '@/tests/support/worlds/order'
import { actorOf } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { makeModule } from '@/tests/support/worlds/module'

async function makeWorld() {
  const house = await makeWorkshop()
  const design = await makeModule(house.workshop)
  const list = await makePartsList({ ...house, ...design })
  const run = await makeRun({ ...house, ...design }, { minimum: 4, maximum: 10 })
  return { ...house, ...run, list, actor: await actorOf(house.owner) }
}
let world: Awaited<ReturnType<typeof makeWorld>>
let at: { actor: Awaited<ReturnType<typeof actorOf>>; workshopId: string; runId: string; now: Date }
beforeAll(async () => {
  world = await makeWorld()
  at = { actor: world.actor, workshopId: world.workshop.id, runId: world.run.id, now: NOW }
  await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 2 }] })
})

/** What somebody types: packaging 5.00 a unit, 30.00 once, 2.00 postage a unit, nothing else. */
const TYPED = {
  currency: 'EUR',
  'offers.0.offer': 'kit',
  'offers.0.minutesPerUnit': '0',
  'offers.0.minutesPerStart': '0',
  'offers.0.packaging': '5',
  labourPerHourMinor: '',
  onceMinutes: '0',
  yieldPercent: '100',
  confidencePercent: '95',
  unitsPerOrder: '1',
  postageChargedMinor: '',
  postagePaidMinor: '2.00',
  feeFixedMinor: '',
  disputeFixedMinor: '',
  'oneOff.0.name': 'Tools',
  'oneOff.0.amount': '30',
  'oneOff.0.currency': 'EUR',
  canLayOutMinor: '100.00',
  failurePercent: '0',
}
const body = (over: Record<string, string> = {}) => fieldsToBody(Object.entries({ ...TYPED, ...over })).body

test('without a plan there are no figures, and the form shows a beginning', async () => {
  const desk = await getCostDesk(at)
  expect(desk).toMatchObject({ planOf: 'none', figures: null, changedParts: 0 })
  expect(desk?.values['yieldPercent']).toBe('95')
})

test('a plan is tried without being saved, and its figures can be added up by hand', async () => {
  const input = CostTrial.parse(body({ units: '3' }))
  const figures = await tryCosts({ ...at, input })
  // Three kits at the run's price; the module has no saved plan, so no parts are in it. Tax as the workshop has it.
  expect(figures?.units).toBe(3)
  expect(figures?.totals.cost).toBe(3000 + 3 * 500 + 3 * 200)
  expect(figures?.lines.map(({ kind, amount }) => [kind, amount])).toEqual([
    ['one_off', 3000],
    ['packaging', 1500],
    ['postage', 600],
  ])
  expect(await Plan.count({ where: { runId: world.run.id } })).toBe(0)
})

test('saved, it is the run’s own, with the parts list as it stands', async () => {
  expect(await saveRunPlan({ ...at, input: PlanInput.parse(body()) })).toEqual(ok({ run: world.run.id }))
  const row = await Plan.findOne({ where: { runId: world.run.id }, rejectOnEmpty: true })
  expect((row.plan as unknown as CostPlan).parts).toHaveLength(1)
  const desk = await getCostDesk({ ...at, units: 2 })
  expect(desk).toMatchObject({ planOf: 'run', changedParts: 0 })
  // Two kits: 4 resistors at a cent each come on top.
  expect(desk?.figures?.totals.cost).toBe(3000 + 1000 + 400 + 4)
  expect(desk?.figures?.cash).toMatchObject({ canLayOut: 10_000 })
  expect(desk?.figures?.cash.low).toBeLessThanOrEqual(-3000)
  expect(desk?.figures?.build).toMatchObject({ need: 0, starts: 0, spares: 0, extra: null })
  const { perUnit } = desk!.figures!
  expect(perUnit.costs.reduce((sum, { amount }) => sum + amount, 0)).toBe(perUnit.cost)
})

test('a parts list that changed since is said', async () => {
  await StockMove.create({
    workshopId: at.workshopId,
    partId: world.list.part.id,
    change: 500,
    cause: 'counted',
    byPersonId: world.owner.id,
    at: NOW,
  })
  expect((await getCostDesk(at))?.changedParts).toBe(1)
  await saveRunPlan({ ...at, input: PlanInput.parse(body()) })
  expect((await getCostDesk(at))?.changedParts).toBe(0)
})

test('later buyers ask for stock: one left over against one missing', async () => {
  const input = CostTrial.parse(body({ units: '20', laterUnits: '6' }))
  const { extra } = (await tryCosts({ ...at, input }))!.build
  // One more kit costs packaging and postage, and 0.0 for parts that lie in stock.
  expect(extra?.leftOver).toBe(700)
  expect(extra!.quantity).toBeGreaterThan(6)
})

test('strangers see nothing, and a run that has ended keeps its plan', async () => {
  const stranger = await actorOf((await makeWorkshop()).owner)
  expect(await getCostDesk({ ...at, actor: stranger })).toBeNull()
  const input = PlanInput.parse(body())
  expect(await saveRunPlan({ ...at, actor: stranger, input })).toEqual(refuse('forbidden'))
  const gone = { calledOffAt: NOW, callOffReason: 'Too few.', callOffCause: 'owner' as const }
  await Run.update({ state: 'called_off', ...gone }, { where: { id: world.run.id } })
  expect(await saveRunPlan({ ...at, input })).toEqual(refuse('run_ended'))
})
