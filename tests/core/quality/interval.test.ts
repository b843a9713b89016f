import binomial from '@stdlib/stats-base-dists-binomial'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { clopperPearson, wilson } from '@/lib/core/quality/interval'

describe('values from outside', () => {
  test('81 of 263 (Newcombe, Stat. Med. 17 (1998) 857, Table I; from memory)', () => {
    expect(wilson(81, 263, 0.95)).toEqual({ low: expect.closeTo(0.2553, 4), high: expect.closeTo(0.3662, 4) })
    expect(clopperPearson(81, 263, 0.95)).toEqual({
      low: expect.closeTo(0.2527, 4),
      high: expect.closeTo(0.3676, 4),
    })
  })
  test('4 of 20 (R `binom`, as kept in the statsmodels test suite)', () => {
    expect(clopperPearson(4, 20, 0.95)).toEqual({
      low: expect.closeTo(0.0573339971, 10),
      high: expect.closeTo(0.436614003, 10),
    })
    expect(wilson(4, 20, 0.95)).toEqual({
      low: expect.closeTo(0.0806576626, 10),
      high: expect.closeTo(0.4160174323, 10),
    })
  })
  test('0 of 30 (same)', () => {
    expect(clopperPearson(0, 30, 0.95)).toEqual({ low: 0, high: expect.closeTo(0.1157033082, 10) })
    expect(wilson(0, 30, 0.95)).toEqual({ low: 0, high: expect.closeTo(0.1135133932, 10) })
  })
})

const counts = fc
  .integer({ min: 1, max: 400 })
  .chain((n) =>
    fc.tuple(
      fc.integer({ min: 0, max: n }),
      fc.constant(n),
      fc.double({ min: 0.5, max: 0.999, noNaN: true }),
    ),
  )

test('Clopper–Pearson: at its ends the tails are (1 − confidence)/2 (binomial of @stdlib)', () => {
  fc.assert(
    fc.property(counts, ([passed, n, confidence]) => {
      const { low, high } = clopperPearson(passed, n, confidence)
      const tail = (1 - confidence) / 2
      if (passed > 0) expect(1 - binomial.cdf(passed - 1, n, low)).toBeCloseTo(tail, 9)
      if (passed < n) expect(binomial.cdf(passed, n, high)).toBeCloseTo(tail, 9)
    }),
  )
})

test('Wilson: its ends solve |p̂ − p| = z √(p(1 − p)/n); both hold the share and mirror', () => {
  fc.assert(
    fc.property(counts, ([passed, n, confidence]) => {
      const score = wilson(passed, n, confidence)
      const z = (p: number) => Math.abs(passed / n - p) / Math.sqrt((p * (1 - p)) / n)
      if (passed > 0 && passed < n) expect(z(score.low) / z(score.high)).toBeCloseTo(1, 6)
      for (const make of [wilson, clopperPearson]) {
        const { low, high } = make(passed, n, confidence)
        const mirror = make(n - passed, n, confidence)
        expect(low).toBeLessThanOrEqual(passed / n)
        expect(high).toBeGreaterThanOrEqual(passed / n)
        expect(mirror).toEqual({ low: expect.closeTo(1 - high, 10), high: expect.closeTo(1 - low, 10) })
      }
    }),
  )
})

test.each([wilson, clopperPearson])('RangeErrors: %o', (make) => {
  expect(() => make(0, 0, 0.95)).toThrow(/n must be a whole number from 1, got 0/)
  expect(() => make(-1, 5, 0.95)).toThrow(/passed/)
  expect(() => make(6, 5, 0.95)).toThrow(/passed must be at most n = 5, got 6/)
  expect(() => make(2, 5, 1)).toThrow(/confidence/)
})
