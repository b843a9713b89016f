import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { betaBinomialPmf, betaBinomialTail } from '@/lib/core/demand/beta-binomial'

describe('values from outside', () => {
  test('n = 10, Beta(2, 3): exact fractions', () => {
    expect(betaBinomialPmf(10, 2, 3)[3]).toBeCloseTo(144 / 1001, 14)
    expect(betaBinomialTail(10, 2, 3, 5)).toBeCloseTo(0.4055944056, 10)
  })
  test('a uniform conversion makes every count equally likely', () => {
    for (const n of [0, 1, 7, 40])
      for (const chance of betaBinomialPmf(n, 1, 1)) expect(chance).toBeCloseTo(1 / (n + 1), 14)
  })
  test('12 of 40 seen, 150 to come: R 4.2.2 and exact fractions', () => {
    expect(betaBinomialTail(150, 13, 29, 40)).toBeCloseTo(0.7059133414, 10)
  })
  test('sex ratio in 6,115 families of 12 (Geissler, Saxony; moments as published)', () => {
    const published = [2.3, 22.6, 104.8, 310.9, 655.7, 1036.2, 1257.9, 1182.1, 853.6, 461.9, 177.9, 43.8, 5.2]
    const expected = Array.from(betaBinomialPmf(12, 34.135, 31.6085), (chance) => 6115 * chance)
    expected.forEach((count, k) => expect(count).toBeCloseTo(published[k]!, 0))
  })
})

/** Exact: B(α+k, β+n−k)/B(α, β) · C(n, k) in whole numbers, for whole α, β. */
function exactFraction(n: number, alpha: number, beta: number, k: number): number {
  let top = 1n
  let bottom = 1n
  for (let i = 0; i < k; i += 1) {
    top *= BigInt(n - i) * BigInt(alpha + i)
    bottom *= BigInt(i + 1) * BigInt(alpha + beta + i)
  }
  for (let i = 0; i < n - k; i += 1) {
    top *= BigInt(beta + i)
    bottom *= BigInt(alpha + beta + k + i)
  }
  return Number((top * 10n ** 40n) / bottom) / 1e40
}

test('agrees with exact fractions on a grid', () => {
  for (const n of [1, 5, 23, 60]) {
    for (const [alpha, beta] of [
      [1, 1],
      [2, 3],
      [1, 40],
      [60, 7],
    ] as const) {
      const pmf = betaBinomialPmf(n, alpha, beta)
      for (let k = 0; k <= n; k += 1) {
        const exact = exactFraction(n, alpha, beta, k)
        expect(Math.abs(pmf[k]! - exact)).toBeLessThanOrEqual(1e-13 * exact + 1e-39)
      }
    }
  }
})

test('adds up to 1 and has the known mean, also for conversions piled up at the ends', () => {
  const shape = fc.double({ min: 0.01, max: 500, noNaN: true })
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 2000 }), shape, shape, (n, alpha, beta) => {
      const pmf = betaBinomialPmf(n, alpha, beta)
      const total = pmf.reduce((a, b) => a + b, 0)
      const mean = pmf.reduce((sum, chance, k) => sum + k * chance, 0)
      expect(total).toBeCloseTo(1, 12)
      expect(Math.abs(mean - (n * alpha) / (alpha + beta))).toBeLessThan(1e-11 * (n + 1))
    }),
    { numRuns: 60 },
  )
})

test('refuses what is no count and no shape', () => {
  expect(() => betaBinomialPmf(-1, 1, 1)).toThrow(/n must be a whole number from 0, got -1/)
  expect(() => betaBinomialPmf(2.5, 1, 1)).toThrow(RangeError)
  expect(() => betaBinomialPmf(2, 0, 1)).toThrow(/alpha must be a finite number above 0, got 0/)
  expect(() => betaBinomialPmf(2, 1, Number.NaN)).toThrow(/beta/)
  expect(() => betaBinomialTail(2, 1, 1, -1)).toThrow(/atLeast/)
  expect(betaBinomialTail(2, 1, 1, 3)).toBe(0)
})
