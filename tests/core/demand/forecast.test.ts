import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { betaBinomialPmf } from '@/lib/core/demand/beta-binomial'
import { forecastUnits } from '@/lib/core/demand/forecast'
import type { Group } from '@/lib/core/demand/group'
import { convolve, enumerateGroup, farthest } from './enumeration'

const same = (people: number, quantity: number) => new Array<number>(people).fill(quantity)
const cycle = (people: number, upTo: number) => Array.from({ length: people }, (_, i) => 1 + (i % upTo))

/** The beta-binomial in steps of `quantity`. */
function stretched(people: number, alpha: number, beta: number, quantity: number): number[] {
  const out = new Array<number>(people * quantity + 1).fill(0)
  betaBinomialPmf(people, alpha, beta).forEach((chance, k) => (out[k * quantity] = chance))
  return out
}

describe('values from outside', () => {
  test('12 of 40 converted, 150 people of one unit (R 4.2.2 and exact fractions)', () => {
    const forecast = forecastUnits([{ alpha: 13, beta: 29, quantities: same(150, 1) }])
    expect(forecast.atLeast(40)).toBeCloseTo(0.7059133414, 10)
    expect([0.05, 0.5, 0.95].map(forecast.quantile)).toEqual([28, 46, 67])
    expect(forecast.mean).toBeCloseTo(46.428571, 6)
    expect(forecast.sd).toBeCloseTo(11.964193, 6)
  })
  test('n = 10, Beta(2, 3): exact fractions', () => {
    const forecast = forecastUnits([{ alpha: 2, beta: 3, quantities: same(10, 1) }])
    expect(forecast.pmf[3]).toBeCloseTo(144 / 1001, 13)
    expect([forecast.mean, forecast.sd ** 2]).toEqual([4, expect.closeTo(6, 12)])
  })
})

describe('a second way', () => {
  test.each([
    [1, 2, 3, 1],
    [37, 0.4, 0.7, 3],
    [400, 1, 1, 1],
    [500, 2, 3, 10],
    [3000, 438, 544, 1],
    [5000, 6, 4, 2],
    [1000, 0.01, 0.02, 1],
    [2000, 5e6, 9e6, 4],
  ])('%i people, Beta(%d, %d), %i each: the closed form within 1e-12', (people, alpha, beta, quantity) => {
    const { pmf } = forecastUnits([{ alpha, beta, quantities: same(people, quantity) }])
    expect(farthest(pmf, stretched(people, alpha, beta, quantity))).toBeLessThan(1e-12)
  })

  test.each([
    [{ alpha: 2, beta: 3, quantities: [1, 1, 2, 3, 5, 8] }],
    [{ alpha: 0.5, beta: 0.5, quantities: [4, 6, 10, 10, 2] }],
    [{ alpha: 60, beta: 40, quantities: cycle(40, 10) }],
    [{ alpha: 1, beta: 9, quantities: cycle(120, 10) }],
    [{ alpha: 1, beta: 1, quantities: [1000, 1] }],
  ])('mixed quantities agree with counting subsets: %o', (group: Group) => {
    expect(farthest(forecastUnits([group]).pmf, enumerateGroup(group))).toBeLessThan(1e-13)
  })

  test('classes are independent of one another: their distributions convolve', () => {
    const groups = [
      { alpha: 6, beta: 4, quantities: cycle(25, 4) },
      { alpha: 1, beta: 9, quantities: cycle(30, 7) },
      { alpha: 3, beta: 0.8, quantities: [2, 2, 9] },
    ]
    const whole = groups.map(enumerateGroup).reduce(convolve)
    expect(farthest(forecastUnits(groups).pmf, whole)).toBeLessThan(1e-13)
    expect(farthest(forecastUnits([...groups].reverse()).pmf, whole)).toBeLessThan(1e-13)
  })
})

describe('total chance', () => {
  test.each([
    [5000, 10, 6, 4],
    [9000, 10, 1, 1],
    [50000, 1, 2, 3],
  ])('is 1 within 1e-12 for %i people of up to %i units', (people, upTo, alpha, beta) => {
    const { pmf, mean } = forecastUnits([{ alpha, beta, quantities: cycle(people, upTo) }])
    expect(Math.abs(pmf.reduce((a, b) => a + b, 0) - 1)).toBeLessThan(1e-12)
    expect(Math.abs(pmf.reduce((sum, chance, k) => sum + k * chance, 0) / mean - 1)).toBeLessThan(1e-11)
  })
})

const classes = fc.array(
  fc.record({
    alpha: fc.double({ min: 0.05, max: 80, noNaN: true }),
    beta: fc.double({ min: 0.05, max: 80, noNaN: true }),
    quantities: fc.array(fc.integer({ min: 1, max: 10 }), { maxLength: 40 }),
  }),
  { maxLength: 4 },
)

describe('laws', () => {
  test('one more sign-up never lowers the chance of reaching a number', () => {
    fc.assert(
      fc.property(classes, fc.nat(200), fc.integer({ min: 1, max: 10 }), (groups, n, quantity) => {
        const before = forecastUnits(groups).atLeast(n)
        const more = groups.map((g, i) => (i === 0 ? { ...g, quantities: [...g.quantities, quantity] } : g))
        expect(forecastUnits(more).atLeast(n)).toBeGreaterThanOrEqual(before - 1e-13)
      }),
      { numRuns: 60 },
    )
  })
  test('mean and sd are those of the chances; quantile and atLeast belong together', () => {
    fc.assert(
      fc.property(
        classes,
        fc.nat(30),
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        (groups, committed, p) => {
          const { pmf, mean, sd, quantile, atLeast } = forecastUnits(groups, { committed })
          const first = pmf.reduce((sum, chance, k) => sum + k * chance, 0)
          const second = pmf.reduce((sum, chance, k) => sum + (k - first) ** 2 * chance, 0)
          expect(first).toBeCloseTo(mean, 8)
          expect(Math.sqrt(second)).toBeCloseTo(sd, 6)
          const k = quantile(p)
          expect(1 - atLeast(k + 1)).toBeGreaterThanOrEqual(p - 1e-11)
          if (k > 0) expect(1 - atLeast(k)).toBeLessThan(p + 1e-11)
          expect(atLeast(committed)).toBe(1)
          expect(atLeast(pmf.length)).toBe(0)
        },
      ),
      { numRuns: 60 },
    )
  })
})

describe('committed units and empty classes', () => {
  test('committed units move everything up', () => {
    const group = { alpha: 2, beta: 3, quantities: [1, 2] }
    const plain = forecastUnits([group])
    const moved = forecastUnits([group], { committed: 7 })
    expect(Array.from(moved.pmf)).toEqual([...new Array<number>(7).fill(0), ...plain.pmf])
    expect([moved.mean, moved.sd]).toEqual([plain.mean + 7, plain.sd])
    expect(moved.quantile(0.5)).toBe(plain.quantile(0.5) + 7)
  })
  test('nobody asked: the committed units are certain', () => {
    const forecast = forecastUnits([{ alpha: 1, beta: 1, quantities: [] }], { committed: 3 })
    expect([Array.from(forecast.pmf), forecast.mean, forecast.sd]).toEqual([[0, 0, 0, 1], 3, 0])
    expect([forecast.quantile(0.01), forecast.atLeast(3), forecast.atLeast(4)]).toEqual([3, 1, 0])
    expect(Array.from(forecastUnits([]).pmf)).toEqual([1])
  })
  test('an exact tie counts as reached: 10 equally likely counts, half of them', () => {
    expect(forecastUnits([{ alpha: 1, beta: 1, quantities: same(9, 1) }]).quantile(0.5)).toBe(4)
  })
  test('inputs stay as they were', () => {
    const quantities = Object.freeze([3, 1, 2])
    const groups = Object.freeze([
      Object.freeze({ alpha: 1, beta: 2, quantities }),
      Object.freeze({ alpha: 5, beta: 2, quantities }),
    ])
    expect(() => forecastUnits(groups, Object.freeze({ spread: 0.2 }))).not.toThrow()
  })
})

describe('RangeErrors', () => {
  const good = { alpha: 1, beta: 1, quantities: [1] }
  test.each([
    [[{ ...good, alpha: 0 }], {}, /alpha must be a finite number above 0, got 0/],
    [[{ ...good, beta: -2 }], {}, /beta must .* got -2/],
    [[{ ...good, beta: Number.POSITIVE_INFINITY }], {}, /beta must .* got Infinity/],
    [[{ ...good, quantities: [0] }], {}, /quantity must be a whole number from 1, got 0/],
    [[{ ...good, quantities: [1.5] }], {}, /quantity .* got 1.5/],
    [[good], { committed: -1 }, /committed .* got -1/],
    [[good], { spread: -0.1 }, /spread must be from 0 to 2, got -0.1/],
    [[good], { spread: Number.NaN }, /spread/],
    [[{ ...good, quantities: [999_999] }], { committed: 2 }, /at most 1000000 units, got 1000001/],
  ])('%o %o', (groups, options, message) => {
    expect(() => forecastUnits(groups, options)).toThrow(RangeError)
    expect(() => forecastUnits(groups, options)).toThrow(message)
  })
  test('quantile needs a chance strictly between 0 and 1, atLeast a number', () => {
    const { quantile, atLeast } = forecastUnits([good])
    for (const p of [0, 1, -1, Number.NaN]) expect(() => quantile(p)).toThrow(/p must be above 0 and below 1/)
    expect(() => atLeast(Number.NaN)).toThrow(RangeError)
  })
})
