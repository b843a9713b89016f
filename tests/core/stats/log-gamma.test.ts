import gammaln from '@stdlib/math-base-special-gammaln'
import { expect, test } from 'vitest'
import { devianceTerm, LN_SQRT_2_PI, logGamma, stirlingError } from '@/lib/core/stats/log-gamma'

test.each([
  [1e-6, 13.815509980749432],
  [0.3, 1.0957979948180755],
  [1.5, -0.12078223763524522],
  [7.7, 7.9265413562690044],
  [14.9, 24.924132002217277],
  [15.1, 25.458999750992664],
  [1e8, 1742068066.1038347],
])('ln Γ(%d) with 30 digits (mpmath 1.3)', (x, value) => {
  expect(Math.abs(logGamma(x) - value)).toBeLessThan(1e-14 * Math.max(1, Math.abs(value)))
})

test('agrees with @stdlib on a grid, absolutely near the zeros at 1 and 2', () => {
  for (let x = 0.01; x < 5000; x *= 1.13) {
    const value = gammaln(x)
    expect(Math.abs(logGamma(x) - value)).toBeLessThan(2e-14 * Math.max(1, Math.abs(value)))
  }
  expect(Math.abs(logGamma(1))).toBeLessThan(1e-14)
  expect(Math.abs(logGamma(2))).toBeLessThan(1e-14)
})

test('factorials: ln Γ(n + 1) is the sum of logarithms', () => {
  let sum = 0
  for (let n = 1; n <= 170; n += 1) {
    sum += Math.log(n)
    expect(Math.abs(logGamma(n + 1) - sum)).toBeLessThan(1e-12)
  }
})

test('stirlingError is what Stirling leaves: its definition, and 1/(12x) far out', () => {
  for (const x of [0.2, 1, 4.5, 14, 16, 80]) {
    const byDefinition = gammaln(x + 1) - (x + 0.5) * Math.log(x) + x - LN_SQRT_2_PI
    expect(Math.abs(stirlingError(x) - byDefinition)).toBeLessThan(1e-13)
  }
  expect(stirlingError(1e7) * 12e7).toBeCloseTo(1, 12)
})

test('devianceTerm is x ln(x/m) + m − x, and its quadratic limit near x = m', () => {
  for (const [x, m] of [
    [3, 5],
    [0.1, 40],
    [100, 109],
    [7, 7],
  ] as const) {
    expect(devianceTerm(x, m)).toBeCloseTo(x * Math.log(x / m) + m - x, 11)
  }
  expect(devianceTerm(1e6 + 1, 1e6) / (1 / (2 * (1e6 + 1 / 3)))).toBeCloseTo(1, 9)
})

test('RangeErrors', () => {
  for (const x of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) {
    expect(() => logGamma(x)).toThrow(RangeError)
    expect(() => stirlingError(x)).toThrow(/x must be a finite number above 0/)
  }
})
