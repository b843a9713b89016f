import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { stockQuantity, stockQuantityNormal } from '@/lib/core/size/newsvendor'

const cost = (pmf: readonly number[], q: number, underage: number, overage: number) =>
  pmf.reduce((sum, chance, k) => sum + chance * (k > q ? (k - q) * underage : (q - k) * overage), 0)

/** Poisson chances by their recurrence. */
function poisson(mean: number, upTo: number): number[] {
  const out = [Math.exp(-mean)]
  for (let k = 1; k <= upTo; k += 1) out.push((out[k - 1]! * mean) / k)
  return out
}

test('normal demand 50 ± 8, h = .18, p = .70 (Snyder & Shen 2e, Examples 4.1 and 4.3)', () => {
  const { quantity, criticalRatio, expectedCost } = stockQuantityNormal({
    mean: 50,
    sd: 8,
    underage: 0.7,
    overage: 0.18,
  })
  expect(criticalRatio).toBeCloseTo(0.795455, 6)
  expect(quantity).toBeCloseTo(56.60395593, 8)
  expect(expectedCost).toBeCloseTo(1.9976051932, 9)
})

test('Poisson demand of 6, h = 1, p = 4 (Snyder & Shen 2e, Example 4.7 data)', () => {
  const { quantity, expectedCost } = stockQuantity(poisson(6, 80), { underage: 4, overage: 1 })
  expect(quantity).toBe(8)
  expect(expectedCost).toBeCloseTo(3.570106945770941, 12)
})

test('no other quantity costs less (every one tried)', () => {
  fc.assert(
    fc.property(
      fc
        .array(fc.integer({ min: 0, max: 50 }), { minLength: 1, maxLength: 30 })
        .filter((w) => w.some((x) => x > 0)),
      fc.integer({ min: 1, max: 90 }),
      fc.integer({ min: 1, max: 90 }),
      (weights, underage, overage) => {
        const total = weights.reduce((a, b) => a + b, 0)
        const pmf = weights.map((w) => w / total)
        const found = stockQuantity(pmf, { underage, overage })
        expect(found.expectedCost).toBeCloseTo(cost(pmf, found.quantity, underage, overage), 9)
        for (let q = 0; q < pmf.length; q += 1) {
          expect(cost(pmf, q, underage, overage)).toBeGreaterThanOrEqual(found.expectedCost - 1e-9)
        }
      },
    ),
    { numRuns: 200 },
  )
})

describe('RangeErrors', () => {
  test.each([
    [[1], { underage: 0, overage: 1 }, /underage must be a finite number above 0, got 0/],
    [[1], { underage: 1, overage: -1 }, /overage .* got -1/],
    [[0.5, 0.4], { underage: 1, overage: 1 }, /pmf must add up to 1/],
    [[1.5, -0.5], { underage: 1, overage: 1 }, /pmf must hold chances of 0 or more, got -0.5 at 1/],
    [[], { underage: 1, overage: 1 }, /pmf must add up to 1, got 0/],
  ])('%o %o', (pmf, mismatch, message) => {
    expect(() => stockQuantity(pmf, mismatch)).toThrow(RangeError)
    expect(() => stockQuantity(pmf, mismatch)).toThrow(message)
  })
  test('normal', () => {
    expect(() => stockQuantityNormal({ mean: Number.NaN, sd: 1, underage: 1, overage: 1 })).toThrow(/mean/)
    expect(() => stockQuantityNormal({ mean: 1, sd: 0, underage: 1, overage: 1 })).toThrow(/sd/)
  })
})
