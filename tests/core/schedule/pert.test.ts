import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { crawfordTotal, crawfordUnitTime, wrightTotal } from '@/lib/core/schedule/learning'
import { pertMean, pertShape, pertVariance } from '@/lib/core/schedule/pert'
import { normalCdf } from '@/lib/core/stats/normal'

test('path 1-3-5-7: 24 days, variance 5, .9633 by 28 days as a normal (Taylor, solved problem)', () => {
  const path: [number, number, number][] = [
    [5, 8, 17],
    [3, 5, 7],
    [4, 6, 8],
    [3, 4, 5],
  ]
  const mean = path.reduce((sum, step) => sum + pertMean(...step), 0)
  const variance = path.reduce((sum, step) => sum + pertVariance(...step), 0)
  expect(mean).toBeCloseTo(24, 12)
  expect(variance).toBeCloseTo(5, 12)
  // The book rounds z to 1.79 before it looks it up.
  expect(normalCdf(Math.round(((28 - mean) / Math.sqrt(variance)) * 100) / 100)).toBeCloseTo(0.9633, 4)
})

test('the Beta of a step has its mean and variance', () => {
  const days = fc.double({ min: 0, max: 40, noNaN: true })
  fc.assert(
    fc.property(days, days, fc.double({ min: 0.01, max: 40, noNaN: true }), (o, a, b) => {
      const [m, p] = [o + a, o + a + b]
      const { alpha, beta } = pertShape(o, m, p)
      const s = alpha + beta
      expect(o + ((p - o) * alpha) / s).toBeCloseTo(pertMean(o, m, p), 8)
      expect(((p - o) ** 2 * alpha * beta) / (s * s * (s + 1))).toBeCloseTo(pertVariance(o, m, p), 8)
    }),
  )
})

test('estimates out of order are RangeErrors', () => {
  expect(() => pertMean(-1, 2, 3)).toThrow(/optimistic must be 0 or more, got -1/)
  expect(() => pertMean(3, 2, 4)).toThrow(/likely must be at least optimistic, got 2/)
  expect(() => pertVariance(1, 5, 4)).toThrow(/pessimistic must be at least likely, got 4/)
  expect(() => pertVariance(1, Number.NaN, 4)).toThrow(/likely must be a finite number/)
  expect(() => pertShape(2, 2, 2)).toThrow(/pessimistic must be above optimistic, got 2/)
})

describe('learning', () => {
  test('first 100, 85 %, unit 125 (`learningCurve` vignette)', () => {
    expect(crawfordUnitTime(100, 0.85, 125)).toBeCloseTo(32.23647, 5)
    expect(crawfordTotal(100, 0.85, 125)).toBeCloseTo(5201.085, 3)
    expect(wrightTotal(100, 0.85, 125)).toBeCloseTo(4029.559, 3)
  })
  test('each doubling: Crawford’s unit time and Wright’s average fall to the rate', () => {
    for (const n of [1, 3, 40]) {
      expect(crawfordUnitTime(60, 0.9, 2 * n) / crawfordUnitTime(60, 0.9, n)).toBeCloseTo(0.9, 12)
      expect(wrightTotal(60, 0.9, 2 * n) / (2 * n) / (wrightTotal(60, 0.9, n) / n)).toBeCloseTo(0.9, 12)
    }
    expect(crawfordTotal(60, 1, 10)).toBe(600)
  })
  test('RangeErrors', () => {
    expect(() => crawfordUnitTime(0, 0.9, 1)).toThrow(/first/)
    expect(() => crawfordTotal(1, 1.1, 1)).toThrow(/rate must be above 0 and at most 1, got 1.1/)
    expect(() => wrightTotal(1, 0.9, 0)).toThrow(/n must be a whole number from 1, got 0/)
  })
})
