import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { breakEven } from '@/lib/core/costs/break-even'
import { costCurve, type Curve } from '@/lib/core/costs/curve'
import { emptyPlan, type CostPlan } from '@/lib/core/costs/plan'

const curveOf = (profits: readonly number[]): Curve =>
  profits.map((profit) => ({ revenue: profit, cost: 0, profit, unitCost: 0 }))
const curveTo = (units: number, profitOf: (n: number) => number) =>
  curveOf(Array.from({ length: units }, (_, i) => profitOf(i + 1)))

/** Price, variable cost and fixed cost as a plan: one offer, one sum per unit, one sum once. */
function simplePlan(price: number, variable: string, fixed: number): CostPlan {
  return {
    ...emptyPlan('EUR'),
    offers: [
      {
        offer: 'kit',
        price,
        deposit: 0,
        isAssembled: false,
        minutesPerUnit: 0,
        minutesPerStart: 0,
        packaging: '0',
      },
    ],
    perUnit: [{ name: 'variable', offer: 'kit', amount: variable }],
    oneOff: [{ name: 'fixed', amount: fixed, currency: 'EUR' }],
  }
}

describe('breakEven', () => {
  test('price 250, variable 150, fixed 35,000: 350 units; profit 40,000 at 750 (Garrison/Noreen, Managerial Accounting)', () => {
    const curve = costCurve(simplePlan(25_000, '15000', 3_500_000), { kit: 1 }, 800)
    expect(breakEven(curve)).toEqual({ firstProfit: 350, safeFrom: 350, lossGaps: [] })
    expect(curve[349]!.profit).toBe(0)
    expect(curve[749]!.profit).toBe(4_000_000)
    expect((400 - 350) / 400).toBe(0.125)
  })

  test('fixed 10,000, variable 2.25, price 4: 5,714.29 units (Heizer & Render, from memory), so 5,715', () =>
    expect(breakEven(costCurve(simplePlan(400, '225', 1_000_000), { kit: 1 }, 6000)).firstProfit).toBe(5715))

  test('step costs 9,600, 15,000, 20,000 with a margin of 30: 500, a gap from 601, safe at 667 (Stevenson, from memory)', () => {
    const step = (n: number) => (n <= 300 ? 9600 : n <= 600 ? 15_000 : 20_000)
    const curve = curveTo(900, (n) => 30 * n - step(n))
    expect(breakEven(curve)).toEqual({ firstProfit: 500, safeFrom: 667, lossGaps: [[601, 666]] })
    expect(curve[319]!.profit).toBeLessThan(0)
  })

  test.each<[number[], unknown]>([
    [[], { firstProfit: null, safeFrom: null, lossGaps: [] }],
    [[-1, -1], { firstProfit: null, safeFrom: null, lossGaps: [] }],
    [[0], { firstProfit: 1, safeFrom: 1, lossGaps: [] }],
    [[-1, 2, -3], { firstProfit: 2, safeFrom: null, lossGaps: [[3, 3]] }],
    [
      [1, -1, -1, 1, -1, 1],
      {
        firstProfit: 1,
        safeFrom: 6,
        lossGaps: [
          [2, 3],
          [5, 5],
        ],
      },
    ],
  ])('%j', (profits, expected) => expect(breakEven(curveOf(profits))).toEqual(expected))

  test('says of every quantity whether it loses, and nothing else', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -2, max: 2 }), { maxLength: 30 }), (profits) => {
        const { firstProfit, safeFrom, lossGaps } = breakEven(curveOf(profits))
        const inGap = (n: number) => lossGaps.some(([from, to]) => from <= n && n <= to)
        return profits.every((profit, i) => {
          const n = i + 1
          const loses = firstProfit === null || n < firstProfit || inGap(n)
          const safe = safeFrom !== null && n >= safeFrom
          return profit < 0 === loses && safe === profits.slice(i).every((p) => p >= 0)
        })
      }),
    )
  })

  test('throws on a profit that is no number', () =>
    expect(() => breakEven(curveOf([NaN]))).toThrow(RangeError))
})
