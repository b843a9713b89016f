import { beforeAll, expect, test } from 'vitest'
import { PartsInput, SampleInput } from '@/lib/contracts/module-forms'
import { PlanInput } from '@/lib/contracts/plan-forms'
import type { CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import type { Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { copyBasePlan } from '@/lib/services/_steps/copy-base-plan'
import { recordSampleCheck } from '@/lib/services/modules/record-sample-check'
import { saveParts } from '@/lib/services/modules/save-parts'
import { savePlan } from '@/lib/services/modules/save-plan'
import { Part, Plan, Quote, QuoteBreak, RevisionLine, RunOffer, StockMove } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let given: { actor: Actor; workshopId: string; module: string; now: Date }
beforeAll(async () => {
  world = await pier()
  given = { actor: await actorOf(world.owner), workshopId: world.workshop.id, module: 'rowlock', now: NOW }
})

const HEAD =
  'Code,Value,Designators,Per unit,Kit,Built,Attrition percent,Needs sample,Supplier,Currency,Moq,Breaks,Quoted on,Stock seen,Stock seen on'
const RESISTOR =
  'R-10K,10k,R1-R4,4,buyer,assembler,2,,Counter West,EUR,1,"1: 0.0125; 100: 0.004",2027-02-20,5000,2027-02-28'
const JACK = 'JACK,,J1 J2,2,buyer,maker,,yes,Counter West,EUR,10,1: 0.65,2027-02-20,,'
const parts = (...lines: string[]) => PartsInput.parse({ revision: 'A', csv: [HEAD, ...lines].join('\r\n') })

const PLAN = PlanInput.parse({
  currency: 'EUR',
  offers: [
    { offer: 'kit', minutesPerUnit: '30', minutesPerStart: '0', packaging: '0.80' },
    { offer: 'built', isAssembled: 'on', minutesPerUnit: '10', minutesPerStart: '40', packaging: '0.95' },
  ],
  labourPerHourMinor: 2400,
  onceMinutes: '60',
  yieldPercent: '100',
  unitsPerOrder: '1',
  postageChargedMinor: 0,
  postagePaidMinor: 0,
  feeFixedMinor: 0,
  disputeFixedMinor: 0,
  steps: [{ name: 'boards', optimistic: '8', likely: '10', pessimistic: '20', after: '' }],
})

test('a pasted list becomes lines, parts and quotes; pasted again it replaces the lines', async () => {
  const saved = await saveParts({ ...given, input: parts(RESISTOR, JACK) })
  expect(saved).toEqual(ok({ module: 'rowlock', revision: 'A', lines: 2 }))
  expect(await saveParts({ ...given, input: parts(RESISTOR, JACK) })).toEqual(saved)
  const lines = await RevisionLine.findAll({
    where: { revisionId: world.revision.id },
    order: [['position', 'ASC']],
  })
  expect(
    lines.map(({ perUnit, placedBy, attritionBasisPoints }) => [perUnit, placedBy, attritionBasisPoints]),
  ).toEqual([
    [4, { kit: 'buyer', built: 'assembler' }, 200],
    [2, { kit: 'buyer', built: 'maker' }, 0],
  ])
  const [resistor] = await Part.findAll({ where: { code: 'R-10K' } })
  const quotes = await Quote.findAll({ where: { partId: resistor!.id } })
  expect(quotes).toHaveLength(1)
  expect(quotes[0]).toMatchObject({ stockSeen: 5000, stockSeenOn: '2027-02-28', quotedOn: '2027-02-20' })
  const breaks = await QuoteBreak.findAll({
    where: { quoteId: quotes[0]!.id },
    order: [['fromQuantity', 'ASC']],
  })
  // 0.0125 euro are 1.25 cents.
  expect(breaks.map(({ fromQuantity, unitPrice }) => [fromQuantity, Number(unitPrice)])).toEqual([
    [1, 1.25],
    [100, 0.4],
  ])
})

test.each<[string, string[], string]>([
  ['a quantity that is none', [RESISTOR.replace(',4,buyer', ',1e3,buyer')], 'Line 2, per_unit'],
  ['a part twice', [RESISTOR, JACK, RESISTOR], 'Line 4, code'],
  ['a line nobody places', [JACK.replace('buyer,maker', ',')], 'Line 2, built'],
  ['a quote without a day', [JACK.replace('2027-02-20', '')], 'Line 2, supplier'],
  ['prices that cannot be read', [JACK.replace('1: 0.65', 'dear')], 'Line 2, breaks'],
  ['stock without a day', [RESISTOR.replace('2027-02-28', '')], 'Line 2, stock_seen_on'],
  ['a quotation mark left open', ['"JACK,,J1,1'], 'quotation marks'],
  ['no lines', [], 'no lines'],
])('%s is refused with its line, and the old list stays', async (_, lines, words) => {
  const answer = await saveParts({ ...given, input: parts(...lines) })
  expect(answer).toMatchObject({ reason: 'invalid', errors: { csv: expect.stringContaining(words) } })
  expect(await RevisionLine.count({ where: { revisionId: world.revision.id } })).toBe(2)
})

test('headings that are missing are named; other separators are read', async () => {
  const bare = PartsInput.parse({ revision: 'A', csv: 'part,qty\nX,1' })
  expect(await saveParts({ ...given, input: bare })).toMatchObject({
    errors: { csv: expect.stringContaining('code, per_unit') },
  })
  const tabs = PartsInput.parse({ revision: 'A', csv: 'code\tper_unit\tbuilt\nX-1\t3\tmaker\n' })
  expect(await saveParts({ ...given, input: tabs })).toMatchObject({ value: { lines: 1 } })
  await saveParts({ ...given, input: parts(RESISTOR, JACK) })
})

test('a sample is looked at: the last word counts', async () => {
  const jack = await Part.findOne({ where: { code: 'JACK' }, rejectOnEmpty: true })
  const check = (over: object) => SampleInput.parse({ part: jack.id, fits: 'yes', on: '2027-02-27', ...over })
  const bench = await actorOf(world.bench)
  expect(
    await recordSampleCheck({ ...given, actor: bench, input: check({ fits: 'no', note: 'Nut too high.' }) }),
  ).toEqual(ok({ part: 'JACK' }))
  await recordSampleCheck({ ...given, actor: bench, input: check({}) })
  expect(await jack.reload()).toMatchObject({
    sampleFits: true,
    sampleCheckedOn: '2027-02-27',
    sampleByPersonId: world.bench.id,
  })
  const late = await recordSampleCheck({ ...given, input: check({ on: '2027-03-02' }) })
  expect(late).toMatchObject({ errors: { on: expect.any(String) } })
  const actor = await actorOf(world.fenLamp.owner)
  const theirs = { actor, workshopId: world.fenLamp.workshop.id, now: NOW }
  expect(await recordSampleCheck({ ...theirs, input: check({}) })).toEqual(refuse('not_found'))
})

test('the plan holds the offers’ prices and the parts list, and follows when the list changes', async () => {
  expect(await savePlan({ ...given, input: PLAN })).toEqual(ok({ module: 'rowlock' }))
  const row = await Plan.findOne({ where: { moduleId: world.module.id, runId: null }, rejectOnEmpty: true })
  const plan = row.plan as unknown as CostPlan
  expect(plan.offers.map(({ offer, price, deposit }) => [offer, price, deposit])).toEqual([
    ['boards', 4500, 1000],
    ['kit', 9500, 2500],
    ['built', 16500, 4000],
  ])
  // One kit by hand: 4 resistors and the 1 that 2 % of 4 rounds up to at 1.25 c = 6 c; 10 jacks at 65 c (sold by ten at
  // least); 30 + 60 minutes at 24.00; 0.80 packaging.
  expect(costRun(plan, { kit: 1 }).cost).toBe(6 + 650 + 3600 + 80)
  await saveParts({ ...given, input: parts(JACK) })
  await row.reload()
  expect((row.plan as unknown as CostPlan).parts.map(({ name }) => name)).toEqual(['JACK'])
  await saveParts({ ...given, input: parts(RESISTOR, JACK) })
})

test('a run copies the plan once, at its own prices, with what lies in stock', async () => {
  const jack = await Part.findOne({ where: { code: 'JACK' }, rejectOnEmpty: true })
  const { workshopId } = given
  await StockMove.create({
    workshopId,
    partId: jack.id,
    change: 40,
    cause: 'counted',
    byPersonId: world.owner.id,
    at: NOW,
  })
  await RunOffer.update({ priceMinor: 9900 as never }, { where: { id: world.runOffers.kit.id } })
  const copy = () =>
    inTransaction(async (tx) =>
      ok(await copyBasePlan(tx, { run: world.run, byPersonId: world.owner.id, now: NOW })),
    )
  expect(await copy()).toEqual(ok(true))
  expect(await copy()).toEqual(ok(false))
  const row = await Plan.findOne({ where: { runId: world.run.id }, rejectOnEmpty: true })
  const plan = row.plan as unknown as CostPlan
  expect(plan.offers.find(({ offer }) => offer === 'kit')?.price).toBe(9900)
  expect(plan.parts.map(({ name, onHand }) => [name, onHand])).toEqual([
    ['R-10K', 0],
    ['JACK', 40],
  ])
  expect(row.steps).toHaveLength(1)
})

test('a plan in another currency, of a stranger or without offers is refused', async () => {
  const dollars = PlanInput.parse({
    ...PLAN,
    currency: 'USD',
    yieldPercent: '100',
    confidencePercent: '95',
    fee: '0',
    foreignFee: '0',
    foreignShare: '0',
    refundShare: '0',
    disputeShare: '0',
    failurePercent: '0',
    steps: [],
    offers: [],
  })
  expect(await savePlan({ ...given, input: dollars })).toMatchObject({
    errors: { currency: expect.any(String) },
  })
  const actor = await actorOf(world.packer)
  expect(await savePlan({ ...given, actor, input: PLAN })).toEqual(refuse('forbidden'))
  expect(await saveParts({ ...given, actor, input: parts(JACK) })).toEqual(refuse('forbidden'))
})
