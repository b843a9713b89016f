import { describe, expect, test } from 'vitest'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { bestPrice, demandByPrice } from '@/lib/core/demand/price'
import { convolve, enumerateGroup } from './enumeration'

const groups = [
  {
    alpha: 6,
    beta: 4,
    members: [
      { quantity: 1, topPrice: 300 },
      { quantity: 2, topPrice: 200 },
      { quantity: 1, topPrice: null },
    ],
  },
  { alpha: 1, beta: 3, members: [{ quantity: 3, topPrice: 100 }] },
]
const ladder = [100, 200, 300, 400]
/** Each unit leaves price − 90, the run costs 150 beforehand. */
const curveAt = (price: number) =>
  Array.from({ length: 7 }, (_, i) => {
    const units = i + 1
    const cost = 150 + 90 * units
    return { revenue: price * units, cost, profit: price * units - cost, unitCost: Math.round(cost / units) }
  })

describe('demandByPrice', () => {
  test('who stated less is gone; who was not asked stays up to the highest price stated', () => {
    const demand = demandByPrice(ladder, groups)
    expect(demand.map(({ groups: at }) => at.map(({ quantities }) => quantities))).toEqual([
      [[1, 2, 1], [3]],
      [[1, 2, 1], []],
      [[1, 1], []],
      [[], []],
    ])
    expect(demand.map(({ members }) => members)).toEqual([4, 3, 2, 0])
    expect(demand[0]!.forecast.mean).toBeCloseTo(0.6 * 4 + 0.25 * 3, 12)
  })
  test('nobody was asked: they count at the lowest price only', () => {
    const silent = [{ alpha: 1, beta: 1, members: [{ quantity: 4, topPrice: null }] }]
    expect(demandByPrice([50, 80], silent).map(({ members }) => members)).toEqual([1, 0])
  })
  test('the chance of any number never rises with the price', () => {
    const demand = demandByPrice(ladder, groups)
    for (let i = 1; i < demand.length; i += 1) {
      for (let n = 1; n <= 7; n += 1) {
        expect(demand[i]!.forecast.atLeast(n)).toBeLessThanOrEqual(demand[i - 1]!.forecast.atLeast(n) + 1e-13)
      }
    }
  })
  test('RangeErrors', () => {
    expect(() => demandByPrice([], groups)).toThrow(/ladder must hold at least one price/)
    expect(() => demandByPrice([200, 100], groups)).toThrow(/ladder must rise, got 100 at 1/)
    expect(() => demandByPrice([0], groups)).toThrow(/ladder/)
    expect(() =>
      demandByPrice([1], [{ alpha: 1, beta: 1, members: [{ quantity: 1, topPrice: -1 }] }]),
    ).toThrow(/topPrice/)
  })
})

describe('bestPrice', () => {
  const ask = { ladder, groups, minimum: 2, maximum: 5, callOffCost: (units: number) => 20 + units, curveAt }
  test('each rung against enumeration by hand', () => {
    const { frontier, best } = bestPrice(ask)
    const byHand = demandByPrice(ladder, groups).map(({ price, groups: at }) => {
      const pmf = at.map(enumerateGroup).reduce(convolve)
      const profit = pmf.reduce((sum, chance, units) => {
        const result = units >= 2 ? curveAt(price)[Math.min(units, 5) - 1]!.profit : -(20 + units)
        return sum + chance * result
      }, 0)
      return { price, profit, go: pmf.slice(2).reduce((a, b) => a + b, 0) }
    })
    frontier.forEach((point, i) => {
      expect(point.price).toBe(byHand[i]!.price)
      expect(point.expectedProfit).toBeCloseTo(byHand[i]!.profit, 10)
      expect(point.chanceToGo).toBeCloseTo(byHand[i]!.go, 12)
    })
    expect(best).toBe(byHand.reduce((top, next) => (next.profit > top.profit ? next : top)).price)
  })
  test('is consistent with forecastUnits', () => {
    const { frontier } = bestPrice(ask)
    const forecast = forecastUnits(demandByPrice(ladder, groups)[1]!.groups)
    expect(frontier[1]).toMatchObject({ chanceToGo: forecast.atLeast(2), expectedUnits: forecast.mean })
  })
  test('ties go to the lower price; a price nobody was asked for is never best', () => {
    const flat = () => Array.from({ length: 7 }, () => ({ revenue: 0, cost: 0, profit: 0, unitCost: 0 }))
    expect(bestPrice({ ...ask, callOffCost: 0, curveAt: flat }).best).toBe(100)
    const losing = (price: number) => curveAt(price - 1000)
    const { best, frontier } = bestPrice({ ...ask, callOffCost: 0, curveAt: losing })
    expect(frontier[3]!.expectedProfit).toBeCloseTo(0, 12)
    expect(best).toBe(300)
  })
  test('RangeErrors', () => {
    expect(() => bestPrice({ ...ask, minimum: 0 })).toThrow(/minimum/)
    expect(() => bestPrice({ ...ask, maximum: 1 })).toThrow(/maximum must be a whole number from 2, got 1/)
    expect(() => bestPrice({ ...ask, curveAt: () => [] })).toThrow(/curveAt must reach 2 units, got 0/)
  })
})
