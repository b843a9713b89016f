import { beforeAll, expect, test } from 'vitest'
import { ChoiceInput } from '@/lib/contracts/choice-forms'
import { ImportStart } from '@/lib/contracts/part-import'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { ok, refuse } from '@/lib/core/result'
import { listChoices } from '@/lib/queries/modules-admin/list-choices'
import { getPartImport } from '@/lib/queries/part-imports/get-part-import'
import { addChoice } from '@/lib/services/modules/add-choice'
import { retireChoice } from '@/lib/services/modules/retire-choice'
import { confirmImport } from '@/lib/services/part-imports/confirm-import'
import { startImport } from '@/lib/services/part-imports/start-import'
import { OrderLine, Plan } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePlan } from '@/tests/support/worlds/decision'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let at: { actor: Awaited<ReturnType<typeof actorOf>>; workshopId: string; module: string; now: Date }
beforeAll(async () => {
  world = await pier()
  const { run: _, ...design } = world
  await makePlan(design)
  at = {
    ...{ actor: await actorOf(world.owner), workshopId: world.workshop.id, module: 'rowlock' },
    now: NOW,
  }
})

const FINISH = {
  ...{ offer: 'kit', currency: 'EUR', question: 'Front panel finish' },
  answers: [
    { label: 'Black', surcharge: '', isDefault: 'on' },
    { label: 'Silver', surcharge: '4.50' },
  ],
}
const read = (over: object = {}) => ChoiceInput.safeParse({ ...FINISH, ...over })
const plan = async () => {
  const row = await Plan.findOne({ where: { moduleId: world.module.id, runId: null }, rejectOnEmpty: true })
  return row.plan as unknown as CostPlan
}

test('a question is asked with an offer, and orders placed before owe what they owed', async () => {
  const before = await OrderLine.findAll({ raw: true })
  expect(await addChoice({ ...at, input: read().data! })).toMatchObject({ ok: true })
  expect(await listChoices(at)).toMatchObject([
    {
      offer: 'kit',
      question: 'Front panel finish',
      answers: [
        { label: 'Black', surchargeMinor: 0, isDefault: true },
        { label: 'Silver', surchargeMinor: 450, isDefault: false },
      ],
    },
  ])
  expect(await OrderLine.findAll({ raw: true })).toEqual(before)
})

test('a part may be for one answer: half the kits need it, and half pay the surcharge', async () => {
  const text = [
    'code,per_unit,kit,choice,supplier,currency,breaks,quoted_on',
    'FP-SILVER,1,buyer,silver,Plate & Print,EUR,1: 8.00,2027-02-20',
  ].join('\n')
  const input = ImportStart.parse({ revision: 'A', text })
  const started = await startImport({ ...at, input, file: null })
  const id = started.ok ? started.value.import : ''
  expect((await getPartImport({ ...at, id }))?.problems).toEqual([])
  await confirmImport({ ...at, importId: id })
  const [none, silver] = [await plan(), await plan()].map(({ choices, ...rest }, i) =>
    costRun({ ...rest, choices: i === 0 ? [] : choices }, { kit: 10 }),
  )
  // Five of ten kits: 5 × 8.00 of parts and 5 × 4.50 of surcharge; without the question nobody needs the part.
  expect(silver!.cost - none!.cost).toBe(5 * 800)
  expect(silver!.paid - none!.paid).toBe(5 * 450)
  const strange = ImportStart.parse({ revision: 'A', text: text.replace('silver,', 'gold,') })
  const wrong = await startImport({ ...at, input: strange, file: null })
  const problems = (await getPartImport({ ...at, id: wrong.ok ? wrong.value.import : '' }))?.problems
  expect(problems).toContainEqual({ line: 2, column: 'choice', words: expect.any(String) })
})

test('retired it is asked no longer, and the plan forgets it', async () => {
  const [choice] = await listChoices(at)
  expect(await retireChoice({ ...at, choice: choice!.id })).toEqual(ok({ choice: choice!.id, offer: 'kit' }))
  expect(await retireChoice({ ...at, choice: choice!.id })).toEqual(refuse('not_found'))
  expect(await listChoices(at)).toEqual([])
  expect((await plan()).choices).toEqual([])
})

test.each<[string, object, string]>([
  ['one answer only', { answers: [{ label: 'Black' }] }, 'answers'],
  ['five answers', { answers: ['a', 'b', 'c', 'd', 'e'].map((label) => ({ label })) }, 'answers'],
  ['an answer twice', { answers: [{ label: 'Black' }, { label: 'black' }] }, 'answers.1.label'],
  [
    'two that stand in',
    {
      answers: [
        { label: 'Black', isDefault: 'on' },
        { label: 'Silver', isDefault: 'on' },
      ],
    },
    'answers.1.isDefault',
  ],
  [
    'none that stands in after the lock',
    { askedAfterLock: 'on', answers: [{ label: 'Black' }, { label: 'Silver' }] },
    'answers',
  ],
  [
    'a surcharge that is no amount',
    { answers: [{ label: 'A', surcharge: 'dear' }, { label: 'B' }] },
    'answers',
  ],
])('%s is refused at its field', (_, over, field) => {
  expect(read(over).error?.issues.map(({ path }) => path.join('.'))).toContain(field)
})

test('strangers ask nothing', async () => {
  const actor = await actorOf(world.fenLamp.owner)
  expect(await addChoice({ ...at, actor, input: read().data! })).toEqual(refuse('forbidden'))
  expect(await listChoices({ ...at, actor })).toEqual([])
})
