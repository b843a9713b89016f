import fc from 'fast-check'
import { expect, test } from 'vitest'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { unitBreakdown } from '@/lib/core/costs/unit-breakdown'
import { samplePlan } from './sample-plan'

const PLAN: CostPlan = {
  ...emptyPlan('EUR'),
  offers: [
    {
      ...{ offer: 'kit', price: 11_900, deposit: 2500, isAssembled: false },
      ...{ minutesPerUnit: 0, minutesPerStart: 0, packaging: '100' },
    },
  ],
  oneOff: [
    { name: 'fixture', amount: 1000, currency: 'EUR' },
    { name: 'pictures', amount: 1000, currency: 'EUR' },
  ],
  tax: { mode: 'home_rate', pricesIncludeTax: true, rates: [{ basisPoints: 1900, weight: 1 }] },
}

test('three kits, by hand: 19.00 of tax in 119.00; 20.00 once over three is 6.67, packaging 1.00', () => {
  const one = unitBreakdown(costRun(PLAN, { kit: 3 }), 3)
  expect(one).toMatchObject({ paid: 11_900, tax: 1900, revenue: 10_000, cost: 767, profit: 9233 })
  expect(one.costs).toEqual([
    { kind: 'one_off', amount: 667 },
    { kind: 'packaging', amount: 100 },
  ])
})

test('whatever the run, the kinds add up to the cost and the rest to the profit', () => {
  const plan = samplePlan(12)
  fc.assert(
    fc.property(fc.nat(40), fc.nat(40), fc.nat(40), (boards, kit, built) => {
      const units = boards + kit + built
      fc.pre(units > 0)
      const one = unitBreakdown(costRun(plan, { boards, kit, built }), units)
      expect(one.costs.reduce((sum, { amount }) => sum + amount, 0)).toBe(one.cost)
      expect(one.paid - one.tax - one.cost).toBe(one.profit)
    }),
    { numRuns: 60 },
  )
})

test('no units at all is a mistake of the caller', () => {
  expect(() => unitBreakdown(costRun(PLAN, { kit: 0 }), 0)).toThrow(RangeError)
})
