import fc from 'fast-check'
import { expect, test } from 'vitest'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { scaled } from '@/lib/core/costs/scaled'
import { applyWhatIf } from '@/lib/core/costs/what-if'
import { samplePlan } from './sample-plan'

const quote = (supplier: string, unitPrice: string) => ({
  ...{ supplier, currency: 'EUR', moq: 1, multiple: 1, setup: 0, breaks: [{ from: 1, unitPrice }] },
})
/** Ten kits at 100.00 with one part each: 2.00 at East, 3.00 at West. */
const PLAN: CostPlan = {
  ...emptyPlan('EUR'),
  offers: [
    {
      ...{ offer: 'kit', price: 10_000, deposit: 2500, isAssembled: false },
      ...{ minutesPerUnit: 0, minutesPerStart: 0, packaging: '0' },
    },
  ],
  parts: [
    {
      ...{ id: 'p', perUnit: 1, neededFor: ['kit'], placedBy: {}, onHand: 0, joints: 0, byHand: false },
      attrition: { basisPoints: 0, atLeast: 0 },
      quotes: [quote('East', '200'), quote('West', '300')],
    },
  ],
}
const profit = (plan: CostPlan) => costRun(plan, { kit: 10 }).profit

test('without the cheaper supplier the dearer one is taken; without both the part is unpriced', () => {
  expect(profit(PLAN)).toBe(100_000 - 2000)
  const west = applyWhatIf(PLAN, { supplier: { name: 'East', hundredths: null } })
  expect(profit(west)).toBe(100_000 - 3000)
  const none = applyWhatIf(west, { supplier: { name: 'West', hundredths: null } })
  expect(costRun(none, { kit: 10 }).unpriced).toMatchObject([{ reason: 'no_quote' }])
})

test('a supplier twice as dear loses to the other; a price above raises the profit, a deposit stays within it', () => {
  expect(profit(applyWhatIf(PLAN, { supplier: { name: 'East', hundredths: 200 } }))).toBe(100_000 - 3000)
  expect(profit(applyWhatIf(PLAN, { supplier: { name: 'East', hundredths: 120 } }))).toBe(100_000 - 2400)
  expect(profit(applyWhatIf(PLAN, { prices: { kit: 11_000 } }))).toBe(110_000 - 2000)
  expect(applyWhatIf(PLAN, { prices: { kit: 2000 } }).offers[0]).toMatchObject({ price: 2000, deposit: 2000 })
})

test('nothing different is the same plan to the cent', () => {
  const plan = samplePlan(8)
  fc.assert(
    fc.property(fc.nat(30), fc.nat(30), (kit, built) => {
      expect(costRun(applyWhatIf(plan, {}), { kit, built })).toEqual(costRun(plan, { kit, built }))
    }),
    { numRuns: 20 },
  )
})

test('a price is scaled exactly: 1.25 by a tenth more is 1.375; amounts are rounded half-up', () => {
  expect(Number(scaled(110).exact('1.25'))).toBe(1.375)
  expect(scaled(90).exact('0')).toMatch(/^0\.0+$/)
  expect(scaled(110).whole(5)).toBe(6)
  expect(() => scaled(-1)).toThrow(RangeError)
})
