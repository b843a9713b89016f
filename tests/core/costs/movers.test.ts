import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { movers } from '@/lib/core/costs/movers'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'
import { costRun } from '@/lib/core/costs/run-cost'
import { samplePlan } from './sample-plan'

/** Ten kits at 100.00, a part at 0.125 USD bought in the hundred, rate 0.80, 40.00 once, no tax, no fees. */
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
      id: 'r',
      perUnit: 10,
      neededFor: ['kit'],
      placedBy: { kit: 'buyer' },
      onHand: 0,
      attrition: { basisPoints: 0, atLeast: 0 },
      joints: 0,
      byHand: false,
      quotes: [
        {
          supplier: 'East',
          currency: 'USD',
          breaks: [{ from: 1, unitPrice: '12.5' }],
          moq: 1,
          multiple: 1,
          setup: 0,
        },
      ],
    },
  ],
  rates: [{ currency: 'USD', rate: '0.8', on: '2027-03-01', marginBasisPoints: 0 }],
  oneOff: [{ name: 'tools', amount: 4000, currency: 'EUR' }],
}

describe('movers', () => {
  test('by hand, widest first', () => {
    // Profit as planned: 1,000.00 − 100 × 0.125 × 0.80 − 40.00 = 950.00. Nine kits: 900 − 9 − 40; eleven: 1,100 − 11 − 40.
    expect(movers(PLAN, { kit: 10 })).toEqual([
      { key: 'price', name: '', less: 85_000, more: 105_000, swing: 20_000 },
      { key: 'quantity', name: '', less: 85_100, more: 104_900, swing: 19_800 },
      { key: 'one_off', name: '', less: 95_400, more: 94_600, swing: 800 },
      { key: 'parts', name: '', less: 95_100, more: 94_900, swing: 200 },
      { key: 'rate', name: 'USD', less: 95_100, more: 94_900, swing: 200 },
    ])
  })

  test('a yield near 100 % can only be won up to it', () => {
    const built: CostPlan = {
      ...PLAN,
      offers: [{ ...PLAN.offers[0]!, isAssembled: true, minutesPerStart: 60 }],
      labour: { perHour: 1000, onceMinutes: 0 },
      yield: { basisPoints: 10_000, confidenceBasisPoints: 9500 },
    }
    const found = movers(built, { kit: 10 }).find(({ key }) => key === 'yield')
    expect(found?.more).toBe(costRun(built, { kit: 10 }).profit)
    expect(found!.less).toBeLessThan(found!.more)
  })

  test('dearer inputs never bring more, higher prices never less; swings fall', () => {
    const plan = samplePlan(9)
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 30 }), fc.nat(30), (kit, built) => {
        const found = movers(plan, { kit, built })
        for (const { key, less, more } of found) {
          if (key === 'price') expect(more).toBeGreaterThan(less)
          else if (key !== 'quantity' && key !== 'yield') expect(more).toBeLessThanOrEqual(less)
        }
        const swings = found.map(({ swing }) => swing)
        expect(swings).toEqual([...swings].sort((a, b) => b - a))
      }),
      { numRuns: 25 },
    )
  })
})
