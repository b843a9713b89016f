import binomial from '@stdlib/stats-base-dists-binomial'
import negativeBinomial from '@stdlib/stats-base-dists-negative-binomial'
import poisson from '@stdlib/stats-base-dists-poisson'
import { describe, expect, test } from 'vitest'
import { binomialAtLeast, binomialAtMost } from '@/lib/core/stats/binomial'
import { gammaPoissonPmf, poissonCdf, poissonPmf, poissonQuantile } from '@/lib/core/stats/poisson'

const total = (pmf: Float64Array) => pmf.reduce((a, b) => a + b, 0)

describe('binomial', () => {
  test('n = 20: p = .10 B(2) = .6769; p = .25 B(5) = .6172 (Devore, Table A.1; from memory)', () => {
    expect(binomialAtMost(2, 20, 0.1)).toBeCloseTo(0.6769, 4)
    expect(binomialAtMost(5, 20, 0.25)).toBeCloseTo(0.6172, 4)
  })
  test('agrees with @stdlib on a grid, and both tails add up to 1', () => {
    for (const n of [1, 7, 60, 1000]) {
      for (const p of [0.003, 0.2, 0.5, 0.97]) {
        for (const k of [0, 1, Math.floor(n * p), n - 1, n]) {
          expect(Math.abs(binomialAtMost(k, n, p) - binomial.cdf(k, n, p))).toBeLessThan(1e-11)
          expect(binomialAtMost(k, n, p) + binomialAtLeast(k + 1, n, p)).toBeCloseTo(1, 12)
        }
      }
    }
  })
  test('certain ends and RangeErrors', () => {
    expect([binomialAtLeast(0, 5, 0.3), binomialAtLeast(6, 5, 0.3), binomialAtMost(5, 5, 0.3)]).toEqual([
      1, 0, 1,
    ])
    expect([binomialAtLeast(5, 5, 1), binomialAtMost(0, 5, 0)]).toEqual([1, 1])
    expect(() => binomialAtLeast(-1, 5, 0.3)).toThrow(/count/)
    expect(() => binomialAtLeast(1, 5.5, 0.3)).toThrow(/n must/)
    expect(() => binomialAtMost(1, 5, 1.3)).toThrow(/p must be from 0 to 1/)
  })
})

describe('Poisson', () => {
  test('mean 10: P(≥ 16) = .048740, 99 % quantile 18 (Devore, Table A.2; from memory)', () => {
    expect(1 - poissonCdf(15, 10)).toBeCloseTo(0.04874, 6)
    expect(poissonQuantile(10, 0.99)).toBe(18)
  })
  test('agrees with @stdlib on a grid', () => {
    for (const mean of [0.01, 0.9, 6, 80.5, 3000]) {
      const pmf = poissonPmf(mean)
      expect(total(pmf)).toBeCloseTo(1, 13)
      for (const k of [0, 1, Math.floor(mean), Math.floor(mean + 3 * Math.sqrt(mean))]) {
        expect(Math.abs(pmf[k]! - poisson.pmf(k, mean))).toBeLessThan(1e-12)
        expect(Math.abs(poissonCdf(k, mean) - poisson.cdf(k, mean))).toBeLessThan(1e-11)
      }
    }
  })
  test('RangeErrors', () => {
    expect(() => poissonPmf(-1)).toThrow(/mean/)
    expect(() => poissonPmf(1e8)).toThrow(/mean must be at most 1e7/)
    expect(() => poissonQuantile(3, 1)).toThrow(/chance/)
    expect(() => poissonCdf(-1, 3)).toThrow(/count/)
  })
})

describe('Poisson with a Gamma rate', () => {
  test('is the negative binomial with p = rate / (rate + exposure): @stdlib', () => {
    for (const shape of [0.4, 1, 12.5]) {
      for (const [rate, exposure] of [
        [1, 1],
        [30, 7],
        [2, 60],
      ] as const) {
        const pmf = gammaPoissonPmf(shape, rate, exposure)
        expect(total(pmf)).toBeCloseTo(1, 13)
        for (const k of [0, 1, 5, 40]) {
          const expected = negativeBinomial.pmf(k, shape, rate / (rate + exposure))
          expect(Math.abs((pmf[k] ?? 0) - expected)).toBeLessThan(1e-12)
        }
      }
    }
  })
  test('no exposure, no events; RangeErrors', () => {
    expect(Array.from(gammaPoissonPmf(2, 3, 0))).toEqual([1])
    expect(() => gammaPoissonPmf(0, 1, 1)).toThrow(/shape/)
    expect(() => gammaPoissonPmf(1, 0, 1)).toThrow(/rate/)
    expect(() => gammaPoissonPmf(1, 1, -1)).toThrow(/exposure/)
    expect(() => gammaPoissonPmf(1, 1, 1e6)).toThrow(/exposure must expect at most 1e6 events/)
  })
})
