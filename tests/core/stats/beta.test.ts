import betainc from '@stdlib/math-base-special-betainc'
import beta from '@stdlib/stats-base-dists-beta'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { betaQuantile, regularizedBeta } from '@/lib/core/stats/beta'

describe('regularizedBeta', () => {
  test.each([
    [0.44, 438, 544, 0.35271871933406923],
    [0.333, 1e5, 2e5, 0.34940317176600384],
    [0.5003, 1e6, 1e6, 0.80192803715791104],
    [0.004, 3, 1000, 0.76365362156105139],
    [0.9995, 5000, 2, 0.28711793051157787],
    [0.3, 0.01, 0.02, 0.66117842725110733],
  ])('I_%d(%d, %d) by quadrature with 30 digits (mpmath 1.3)', (x, a, b, value) => {
    expect(Math.abs(regularizedBeta(x, a, b) - value)).toBeLessThan(1e-12)
    expect(Math.abs(regularizedBeta(1 - x, b, a) - (1 - value))).toBeLessThan(1e-12)
  })
  test('agrees with @stdlib on a grid', () => {
    for (const a of [0.05, 0.5, 1, 2.5, 30, 400]) {
      for (const b of [0.05, 0.7, 1, 3, 25, 900]) {
        for (const x of [1e-9, 0.01, 0.2, 0.5, 0.77, 0.999]) {
          expect(Math.abs(regularizedBeta(x, a, b) - betainc(x, a, b))).toBeLessThan(1e-11)
        }
      }
    }
  })
  test('ends and refusals', () => {
    expect([regularizedBeta(0, 2, 3), regularizedBeta(1, 2, 3)]).toEqual([0, 1])
    expect(() => regularizedBeta(1.1, 2, 3)).toThrow(/x must be from 0 to 1, got 1.1/)
    expect(() => regularizedBeta(0.5, 0, 3)).toThrow(/a must/)
    expect(() => regularizedBeta(0.5, 2, -3)).toThrow(/b must/)
  })
})

describe('betaQuantile', () => {
  test('437 of 980 with a uniform prior: 95 % interval .415 to .477 (Gelman et al., BDA, ch. 2; from memory)', () => {
    expect(betaQuantile(0.025, 438, 544)).toBeCloseTo(0.415, 3)
    expect(betaQuantile(0.975, 438, 544)).toBeCloseTo(0.477, 3)
  })
  test('agrees with @stdlib on a grid', () => {
    for (const a of [0.5, 1, 2.5, 30, 400]) {
      for (const b of [0.7, 1, 3, 25, 900]) {
        for (const p of [1e-6, 0.025, 0.5, 0.9, 0.99999]) {
          expect(Math.abs(betaQuantile(p, a, b) - beta.quantile(p, a, b))).toBeLessThan(1e-9)
        }
      }
    }
  })
  test('undoes regularizedBeta, tiny shapes included', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-9, max: 1 - 1e-9, noNaN: true }),
        fc.double({ min: 0.1, max: 2000, noNaN: true }),
        // Below 1 the density is endless at 1, and no double near 1 has the asked chance.
        fc.double({ min: 1, max: 2000, noNaN: true }),
        (p, a, b) => {
          const x = betaQuantile(p, a, b)
          expect(Math.abs(regularizedBeta(x, a, b) - p)).toBeLessThan(1e-11)
        },
      ),
      { numRuns: 200 },
    )
    expect(betaQuantile(0.25, 0.001, 1)).toBeLessThan(1e-300)
    expect(betaQuantile(0.25, 0.01, 1) / 0.25 ** 100).toBeCloseTo(1, 9)
  })
  test('RangeErrors', () => {
    for (const p of [0, 1, Number.NaN]) expect(() => betaQuantile(p, 1, 1)).toThrow(/chance must be above 0/)
    expect(() => betaQuantile(0.5, Number.POSITIVE_INFINITY, 1)).toThrow(/a must/)
    expect(() => betaQuantile(0.5, 1, 0)).toThrow(/b must/)
  })
})
