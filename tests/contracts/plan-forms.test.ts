import { expect, test } from 'vitest'
import { fieldsToBody } from '@/lib/contracts/form-fields'
import { formOfPlan } from '@/lib/contracts/form-of-plan'
import { formValues } from '@/lib/contracts/form-values'
import { PlanInput } from '@/lib/contracts/plan-forms'
import { planOfForm } from '@/lib/contracts/plan-of-form'
import { costRun } from '@/lib/core/costs/run-cost'

/** A plan as typed: one offer, a front panel in dollars, one prototype, two steps. Numbers invented. */
const TYPED: Record<string, string> = {
  currency: 'EUR',
  'offers.0.offer': 'kit',
  'offers.0.minutesPerUnit': '30',
  'offers.0.minutesPerStart': '0',
  'offers.0.packaging': '0,85',
  labourPerHourMinor: '24.00',
  onceMinutes: '120',
  yieldPercent: '95',
  confidencePercent: '',
  unitsPerOrder: '1',
  postageChargedMinor: '9.50',
  postagePaidMinor: '10.00',
  fee: '1.5',
  feeFixedMinor: '0.25',
  foreignFee: '',
  foreignShare: '',
  refundShare: '',
  disputeShare: '',
  disputeFixedMinor: '',
  'taxes.0.rate': '19',
  'taxes.0.weight': '1',
  'oneOff.0.name': 'first units',
  'oneOff.0.amount': '240',
  'oneOff.0.currency': 'EUR',
  'oneOff.1.name': '',
  'oneOff.1.amount': '',
  'oneOff.1.currency': 'EUR',
  'boards.0.name': 'front panel',
  'boards.0.kind': 'front_panel',
  'boards.0.perUnit': '1',
  'boards.0.perArray': '1',
  'boards.0.spare': '0',
  'boards.0.kit': 'on',
  'boards.0.supplier': 'Fab South',
  'boards.0.currency': 'usd',
  'boards.0.moq': '1',
  'boards.0.multiple': '1',
  'boards.0.setup': '40',
  'boards.0.stencil': '',
  'boards.0.breaks': '1: 9.80; 50: 6.40',
  'rates.0.currency': 'USD',
  'rates.0.rate': '0.5',
  'rates.0.on': '2027-03-01',
  'rates.0.margin': '',
  'steps.0.name': 'boards arrive',
  'steps.0.optimistic': '8',
  'steps.0.likely': '10',
  'steps.0.pessimistic': '20',
  'steps.0.after': '',
  'steps.1.name': 'bagging',
  'steps.1.optimistic': '2',
  'steps.1.likely': '3',
  'steps.1.pessimistic': '5',
  'steps.1.after': '1',
}
const setting = {
  currency: 'EUR',
  offers: [{ kind: 'kit', priceMinor: 11900, depositMinor: 2500 }],
  taxMode: 'home_rate' as const,
  pricesIncludeTax: true,
  payoutDelayDays: 7,
  parts: [],
}
const read = (fields: Record<string, string>) =>
  PlanInput.safeParse(fieldsToBody(Object.entries(fields)).body)
const sentencesOf = (fields: Record<string, string>) => {
  const { error } = read(fields)
  return Object.fromEntries((error?.issues ?? []).map(({ path, message }) => [path.join('.'), message]))
}

test('the short form makes a plan whose costs can be added up by hand', () => {
  const form = read(TYPED)
  expect(form.error?.issues).toBeUndefined()
  const cost = costRun(planOfForm(form.data!, setting), { kit: 10 })
  // By hand: 240.00 once; front panels (10 × 9.80 + 40) USD at 0.5 = 69.00; work 10 × 30 min + 120 min = 7 h = 168.00;
  // packaging 10 × 0.85; post 10 × 10.00; fees 1.5 % of 10 deposits of 25.00 and of the rest of 1,285.00, 0.25 twenty times.
  const deposits = 250
  const paid = 1190 + 95
  const fees = Math.round(deposits * 1.5 + 250) + Math.round((paid - deposits) * 1.5 + 250)
  expect(cost.cost).toBe(24000 + 6900 + 16800 + 850 + 10000 + fees)
  // 119.00 and 9.50 hold 19.00 and 1.52 (1.5168…) of tax at 19 %, on the sums of the run: 190.00 and 15.17.
  expect(cost.revenue).toBe(paid * 100 - 19000 - 1517)
  expect(cost.unpriced).toEqual([])
})

test('what is stored is shown as it was typed, and reads back as the same plan', () => {
  const form = read(TYPED).data!
  const plan = planOfForm(form, setting)
  const shown = formValues(formOfPlan(plan, form.steps), 'EUR')
  expect(shown).toMatchObject({
    'boards.0.breaks': '1: 9.80; 50: 6.40',
    'offers.0.packaging': '0.85',
    'steps.1.after': '1',
  })
  const again = read(shown)
  expect(again.error?.issues).toBeUndefined()
  expect(planOfForm(again.data!, setting)).toEqual(plan)
  expect(again.data!.steps).toEqual(form.steps)
})

test.each<[string, Record<string, string>, string]>([
  ['a yield of nothing', { yieldPercent: '0' }, 'yieldPercent'],
  ['certainty itself', { confidencePercent: '100' }, 'confidencePercent'],
  ['less than one unit an order', { unitsPerOrder: '0.9' }, 'unitsPerOrder'],
  ['prices that are none', { 'boards.0.breaks': 'ask' }, 'boards.0.breaks'],
  ['the same quantity twice', { 'boards.0.breaks': '1: 2; 1: 3' }, 'boards.0.breaks'],
  ['a front panel nothing needs', { 'boards.0.kit': 'no' }, 'boards.0.boards'],
  ['a currency that is none', { 'oneOff.0.currency': 'QQQ' }, 'oneOff.0.currency'],
  ['half a cent', { 'oneOff.0.amount': '1.005' }, 'oneOff.0.amount'],
  ['a step before itself', { 'steps.0.after': '2' }, 'steps.0.after'],
  ['a step after one that is not there', { 'steps.1.after': '7' }, 'steps.1.after'],
  ['likely before soonest', { 'steps.0.likely': '3' }, 'steps.0.likely'],
  ['a name left out in the second row', { 'oneOff.1.amount': '5' }, 'oneOff.1.name'],
  ['a currency without a rate', { 'oneOff.0.currency': 'GBP' }, 'oneOff.0.currency'],
  ['a yield above everything', { yieldPercent: '101' }, 'yieldPercent'],
  ['a yield below nothing', { yieldPercent: '-1' }, 'yieldPercent'],
  ['sold in multiples of nothing', { 'boards.0.multiple': '0' }, 'boards.0.multiple'],
  ['a rate of nothing', { 'rates.0.rate': '0' }, 'rates.0.rate'],
  ['minutes in scientific form', { onceMinutes: '1e3' }, 'onceMinutes'],
])('%s is refused at its field', (_, change, field) => {
  expect(Object.keys(sentencesOf({ ...TYPED, ...change }))).toContain(field)
})
