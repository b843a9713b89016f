import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { startsForUncertainYield, startsForYield } from '@/lib/core/size/starts'

/** P(Binomial(s, p) ≥ need) by adding its terms, each from the one before. */
function tailBySum(s: number, p: number, need: number): number {
  let chance = (1 - p) ** s
  let below = 0
  for (let k = 0; k < need; k += 1) {
    below += chance
    chance *= ((s - k) / (k + 1)) * (p / (1 - p))
  }
  return 1 - below
}

describe('startsForYield', () => {
  test.each([
    [20, 0.9, 0.95, 25],
    [50, 0.95, 0.95, 56],
    [100, 0.95, 0.95, 109],
    [300, 0.97, 0.95, 315],
  ])('%i good at yield %d, confidence %d: %i (R: need + qnbinom)', (need, good, confidence, starts) => {
    expect(startsForYield({ need, yield: good, confidence })).toBe(starts)
  })
  test('the rule of thumb 50 / .95 → 53 holds with a chance of .727 only, 52 with .515 (R)', () => {
    expect(tailBySum(53, 0.95, 50)).toBeCloseTo(0.727, 3)
    expect(tailBySum(52, 0.95, 50)).toBeCloseTo(0.515, 3)
    expect(startsForYield({ need: 50, yield: 0.95, confidence: 0.72 })).toBe(53)
    expect(startsForYield({ need: 50, yield: 0.95, confidence: 0.73 })).toBe(54)
  })
  test('is the smallest that reaches the confidence, and grows with it', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 120 }),
        fc.double({ min: 0.3, max: 0.99, noNaN: true }),
        fc.double({ min: 0.01, max: 0.999, noNaN: true }),
        (need, good, confidence) => {
          const starts = startsForYield({ need, yield: good, confidence })
          expect(tailBySum(starts, good, need)).toBeGreaterThanOrEqual(confidence - 1e-9)
          if (starts > need) expect(tailBySum(starts - 1, good, need)).toBeLessThan(confidence + 1e-9)
          expect(startsForYield({ need: need + 1, yield: good, confidence })).toBeGreaterThan(starts - 1)
        },
      ),
      { numRuns: 100 },
    )
  })
  test('edges: nothing needed, everything good, an exact tie', () => {
    expect(startsForYield({ need: 0, yield: 0.5, confidence: 0.9 })).toBe(0)
    expect(startsForYield({ need: 7, yield: 1, confidence: 0.999 })).toBe(7)
    expect(startsForYield({ need: 1, yield: 0.5, confidence: 0.75 })).toBe(2)
  })
  test.each([
    [{ need: -1, yield: 0.9, confidence: 0.9 }, /need/],
    [{ need: 1.5, yield: 0.9, confidence: 0.9 }, /need/],
    [{ need: 1, yield: 0, confidence: 0.9 }, /yield must be above 0 and at most 1, got 0/],
    [{ need: 1, yield: 1.01, confidence: 0.9 }, /yield/],
    [{ need: 1, yield: 0.9, confidence: 1 }, /confidence must be above 0 and below 1, got 1/],
    [{ need: 1000, yield: 1e-9, confidence: 0.9 }, /reachable with 1000000 starts/],
  ])('RangeError: %o', (ask, message) => {
    expect(() => startsForYield(ask)).toThrow(RangeError)
    expect(() => startsForYield(ask)).toThrow(message)
  })
})

describe('startsForUncertainYield', () => {
  const prior = { alpha: 1, beta: 1 }
  test('no board tested, uniform prior: P(at least 1 of s) = s / (s + 1)', () => {
    expect(startsForUncertainYield({ need: 1, passed: 0, failed: 0, prior, confidence: 0.75 })).toBe(3)
    expect(startsForUncertainYield({ need: 1, passed: 0, failed: 0, prior, confidence: 0.9 })).toBe(9)
  })
  test('19 of 20 passed: more starts than the same yield known exactly; a million tests come to the known yield', () => {
    const known = startsForYield({ need: 100, yield: 0.95, confidence: 0.95 })
    expect(
      startsForUncertainYield({ need: 100, passed: 19, failed: 1, prior, confidence: 0.95 }),
    ).toBeGreaterThan(known)
    expect(
      startsForUncertainYield({ need: 100, passed: 950_000, failed: 50_000, prior, confidence: 0.95 }),
    ).toBe(known)
  })
  test('agrees with the mean over p of the binomial tail (summation over a fine grid of p)', () => {
    const tail = (starts: number, need: number, passed: number, failed: number) => {
      let weights = 0
      let sum = 0
      for (let i = 0; i < 20_000; i += 1) {
        const p = (i + 0.5) / 20_000
        const weight = p ** passed * (1 - p) ** failed
        weights += weight
        sum += weight * tailBySum(starts, p, need)
      }
      return sum / weights
    }
    const starts = startsForUncertainYield({ need: 12, passed: 9, failed: 2, prior, confidence: 0.9 })
    expect(tail(starts, 12, 9, 2)).toBeGreaterThanOrEqual(0.9)
    expect(tail(starts - 1, 12, 9, 2)).toBeLessThan(0.9)
  })
  test('RangeErrors', () => {
    const good = { need: 1, passed: 0, failed: 0, prior, confidence: 0.9 }
    expect(startsForUncertainYield({ ...good, need: 0 })).toBe(0)
    expect(() => startsForUncertainYield({ ...good, passed: -1 })).toThrow(/passed/)
    expect(() => startsForUncertainYield({ ...good, failed: 0.5 })).toThrow(/failed/)
    expect(() => startsForUncertainYield({ ...good, prior: { alpha: 0, beta: 1 } })).toThrow(/prior.alpha/)
    expect(() => startsForUncertainYield({ ...good, prior: { alpha: 1, beta: -1 } })).toThrow(/prior.beta/)
    expect(() => startsForUncertainYield({ ...good, confidence: 0 })).toThrow(/confidence/)
    expect(() => startsForUncertainYield({ ...good, need: -3 })).toThrow(/need/)
  })
})
