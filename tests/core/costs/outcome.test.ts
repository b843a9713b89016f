import gammaln from '@stdlib/math-base-special-gammaln'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { runOutcome } from '@/lib/core/costs/outcome'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { bestPrice } from '@/lib/core/demand/price'
import type { Curve } from '@/lib/core/costs/curve'

const curveOf = (profits: readonly number[]): Curve =>
  profits.map((profit) => ({ revenue: 0, cost: -profit, profit, unitCost: 0 }))
const forecastOf = (chances: readonly number[]) => ({
  pmf: Float64Array.from(chances),
  atLeast: (n: number) => chances.slice(n).reduce((sum, chance) => sum + chance, 0),
})

describe('runOutcome', () => {
  test('two equally likely counts, paid with equal chances: by hand', () => {
    // 0 units: call-off, −6. 2 units: 0, 1 or 2 paid with 1/3 each (Beta(1,1)): −6, −10, 30.
    const outcome = runOutcome({
      forecast: forecastOf([0.5, 0, 0.5]),
      curve: curveOf([-10, 30]),
      minimum: 2,
      maximum: 2,
      paying: { alpha: 1, beta: 1 },
      callOffCost: () => 6,
    })
    expect(outcome.expectedProfit).toBeCloseTo(0.5 * -6 + 0.5 * ((-6 - 10 + 30) / 3), 12)
    expect(outcome.chanceToGo).toBe(0.5)
    expect(outcome.chanceOfLoss).toBeCloseTo(5 / 6, 12)
    expect([0.1, 0.5, 0.83, 0.9].map(outcome.profitQuantile)).toEqual([-10, -6, -6, 30])
  })

  test('a call-off that costs nothing is no loss', () => {
    const outcome = runOutcome({
      forecast: forecastOf([1]),
      curve: [],
      minimum: 1,
      maximum: 5,
      paying: { alpha: 1, beta: 1 },
      callOffCost: () => 0,
    })
    expect(outcome).toMatchObject({ chanceToGo: 0, chanceOfLoss: 0 })
    expect(outcome.expectedProfit).toBe(0)
    expect(outcome.profitQuantile(0.5)).toBe(0)
  })

  test('units beyond the maximum have no place', () => {
    const base = {
      curve: curveOf([1, 2, 3]),
      minimum: 1,
      maximum: 3,
      paying: { alpha: 9, beta: 1 },
      callOffCost: () => 1,
    }
    const [more, full] = [forecastOf([0, 0, 0, 0.25, 0, 0.75]), forecastOf([0, 0, 0, 1])].map((forecast) =>
      runOutcome({ ...base, forecast }),
    )
    expect(more!.expectedProfit).toBeCloseTo(full!.expectedProfit, 12)
  })

  /** Second way: every pair of units under deposit and units paid, with beta functions of another package. */
  function enumerate(
    pmf: Float64Array,
    profits: readonly number[],
    minimum: number,
    maximum: number,
    a: number,
    b: number,
  ) {
    const lnBeta = (x: number, y: number) => gammaln(x) + gammaln(y) - gammaln(x + y)
    const lnChoose = (n: number, k: number) => gammaln(n + 1) - gammaln(k + 1) - gammaln(n - k + 1)
    let [expected, loss] = [0, 0]
    pmf.forEach((chance, d) => {
      const n = Math.min(d, maximum)
      for (let k = 0; k <= n; k++) {
        const paid = Math.exp(lnChoose(n, k) + lnBeta(k + a, n - k + b) - lnBeta(a, b))
        const profit = d < minimum || k === 0 ? -(100 + n) : profits[k - 1]!
        expected += chance * paid * profit
        if (profit < 0) loss += chance * paid
      }
    })
    return { expected, loss }
  }

  test('agrees with enumeration on forecasts of forecastUnits', () => {
    const profits = Array.from({ length: 40 }, (_, i) => 90 * (i + 1) - 1300 - (i > 24 ? 500 : 0))
    for (const [a, b, minimum, maximum] of [
      [18, 2, 15, 40],
      [3, 1.5, 10, 22],
      [0.7, 0.4, 1, 30],
    ] as const) {
      const forecast = forecastUnits(
        [
          { alpha: 4, beta: 3, quantities: [1, 2, 1, 1, 3, 1, 2, 1, 5, 1] },
          { alpha: 2, beta: 6, quantities: Array(12).fill(1) },
        ],
        { committed: 8 },
      )
      const outcome = runOutcome({
        forecast,
        curve: curveOf(profits),
        minimum,
        maximum,
        paying: { alpha: a, beta: b },
        callOffCost: (units) => 100 + Math.min(units, maximum),
      })
      const other = enumerate(forecast.pmf, profits, minimum, maximum, a, b)
      expect(outcome.expectedProfit).toBeCloseTo(other.expected, 7)
      expect(outcome.chanceOfLoss).toBeCloseTo(other.loss, 10)
      expect(outcome.chanceToGo).toBe(forecast.atLeast(minimum))
    }
  })

  test('is what bestPrice expects at that price once everyone pays', () => {
    const curve = curveOf(Array.from({ length: 30 }, (_, i) => 70 * (i + 1) - 900))
    const members = Array.from({ length: 20 }, (_, i) => ({ quantity: 1 + (i % 3), topPrice: 200 }))
    const rest = { minimum: 12, maximum: 26, callOffCost: (units: number) => 40 + units }
    const groups = [{ alpha: 5, beta: 4, members }]
    const { frontier } = bestPrice({ ladder: [200], groups, curveAt: () => curve, ...rest })
    const forecast = forecastUnits([
      { alpha: 5, beta: 4, quantities: members.map(({ quantity }) => quantity) },
    ])
    const outcome = runOutcome({ forecast, curve, paying: { alpha: 1e6, beta: 1e-6 }, ...rest })
    expect(outcome.expectedProfit).toBeCloseTo(frontier[0]!.expectedProfit, 4)
    expect(outcome.chanceToGo).toBeCloseTo(frontier[0]!.chanceToGo, 12)
  })

  test('quantiles rise with the chance and cross 0 at the chance of a loss', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -50, max: 50 }), { minLength: 5, maxLength: 5 }),
        fc.integer({ min: 1, max: 5 }),
        (profits, minimum) => {
          const outcome = runOutcome({
            forecast: forecastUnits([{ alpha: 2, beta: 2, quantities: [1, 1, 1, 1, 1] }]),
            curve: curveOf(profits),
            minimum,
            maximum: 5,
            paying: { alpha: 5, beta: 1 },
            callOffCost: () => 3,
          })
          const found = [0.05, 0.2, 0.5, 0.8, 0.95].map(outcome.profitQuantile)
          const loss = outcome.chanceOfLoss
          const crosses =
            loss < 1e-9 ||
            loss > 1 - 1e-9 ||
            (outcome.profitQuantile(loss * 0.999) < 0 && outcome.profitQuantile(1 - (1 - loss) * 0.999) >= 0)
          return found.every((value, i) => i === 0 || value >= found[i - 1]!) && crosses
        },
      ),
    )
  })

  const good = {
    forecast: forecastOf([0, 1]),
    curve: curveOf([1]),
    minimum: 1,
    maximum: 1,
    paying: { alpha: 1, beta: 1 },
    callOffCost: () => 0,
  }
  test.each([
    { ...good, minimum: 0 },
    { ...good, maximum: 0 },
    { ...good, curve: [] },
    { ...good, paying: { alpha: 0, beta: 1 } },
    { ...good, callOffCost: () => -1 },
  ])('throws on a caller’s mistake (%#)', (input) => expect(() => runOutcome(input)).toThrow(RangeError))
  test.each([0, 1, NaN])('throws on the quantile %d', (p) =>
    expect(() => runOutcome(good).profitQuantile(p)).toThrow(RangeError),
  )
})
