import normal from '@stdlib/stats-base-dists-normal'
import { expect, test } from 'vitest'
import { normalCdf, normalDensity, normalQuantile } from '@/lib/core/stats/normal'

test.each([
  [-37, 5.7255712225245768e-300],
  [-20, 2.7536241186062337e-89],
  [-8, 6.2209605742717841e-16],
  [-4, 3.1671241833119921e-5],
  [-2.6, 0.004661188023718749],
  [-2.4, 0.0081975359245961314],
  [-0.3, 0.38208857781104737],
])('Φ(%d) with 30 digits (mpmath 1.3)', (z, value) => {
  expect(Math.abs(normalCdf(z) / value - 1)).toBeLessThan(2e-13)
})

test('agrees with @stdlib on a grid', () => {
  for (let z = -9; z <= 9; z += 0.037) {
    expect(Math.abs(normalCdf(z) - normal.cdf(z, 0, 1))).toBeLessThan(1e-14)
    expect(normalDensity(z)).toBeCloseTo(normal.pdf(z, 0, 1), 14)
  }
  for (let p = 0.0005; p < 1; p += 0.0071) {
    expect(Math.abs(normalQuantile(p) - normal.quantile(p, 0, 1))).toBeLessThan(1e-12)
  }
})

test('quantiles: .975 is 1.959964 (any table); far tails invert', () => {
  expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 12)
  for (const p of [1e-300, 1e-40, 1e-9, 0.3]) expect(normalCdf(normalQuantile(p)) / p).toBeCloseTo(1, 10)
  expect(normalQuantile(0.5)).toBe(0)
})

test('RangeErrors', () => {
  for (const p of [0, 1, Number.NaN])
    expect(() => normalQuantile(p)).toThrow(/chance must be above 0 and below 1/)
  expect(() => normalCdf(Number.NaN)).toThrow(/z must be a finite number/)
  expect(() => normalDensity(Number.POSITIVE_INFINITY)).toThrow(RangeError)
})
