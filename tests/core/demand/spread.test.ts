import fc from 'fast-check'
import { expect, test } from 'vitest'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { convolve, farthest } from './enumeration'

/** Σ over a fine even grid of shocks, the normal weights normalised. */
function shocks(): { z: number; weight: number }[] {
  const raw = Array.from({ length: 801 }, (_, i) => -8 + i / 50)
  const total = raw.reduce((sum, z) => sum + Math.exp((-z * z) / 2), 0)
  return raw.map((z) => ({ z, weight: Math.exp((-z * z) / 2) / total }))
}
const expit = (x: number) => 1 / (1 + Math.exp(-x))

/** The centre whose mean conversion is p, by halving. */
function centre(p: number, spread: number): number {
  let low = -60
  let high = 60
  for (let turn = 0; turn < 80; turn += 1) {
    const middle = (low + high) / 2
    const mean = shocks().reduce((sum, { z, weight }) => sum + weight * expit(middle + spread * z), 0)
    if (mean < p) low = middle
    else high = middle
  }
  return (low + high) / 2
}

test('a spread is the mean over a shock that moves the log-odds of all classes (known conversions, by summation)', () => {
  const spread = 0.7
  const people = [
    { p: 0.6, quantities: [1, 2, 2, 3] },
    { p: 0.1, quantities: [1, 1, 5] },
  ]
  const centres = people.map(({ p }) => centre(p, spread))
  const expected = new Array<number>(16).fill(0)
  for (const { z, weight } of shocks()) {
    const given = people
      .flatMap(({ quantities }, c) =>
        quantities.map((quantity) => {
          const q = expit(centres[c]! + spread * z)
          const one = new Array<number>(quantity + 1).fill(0)
          one[0] = 1 - q
          one[quantity] = q
          return one
        }),
      )
      .reduce(convolve)
    given.forEach((chance, k) => (expected[k]! += weight * chance))
  }
  // A conversion known almost exactly stands for a known one.
  const groups = people.map(({ p, quantities }) => ({ alpha: p * 1e12, beta: (1 - p) * 1e12, quantities }))
  expect(farthest(forecastUnits(groups, { spread }).pmf, expected)).toBeLessThan(1e-9)
})

test('keeps the expected units, never narrows, and grows with the spread', () => {
  fc.assert(
    fc.property(
      fc.array(
        fc.record({
          alpha: fc.double({ min: 0.5, max: 300, noNaN: true }),
          beta: fc.double({ min: 0.5, max: 300, noNaN: true }),
          quantities: fc.array(fc.integer({ min: 1, max: 4 }), { minLength: 2, maxLength: 12 }),
        }),
        { minLength: 1, maxLength: 2 },
      ),
      (groups) => {
        const [none, some, much] = [0, 0.3, 0.9].map((spread) => forecastUnits(groups, { spread }))
        for (const each of [some!, much!]) {
          expect(each.pmf.reduce((sum, chance, k) => sum + k * chance, 0)).toBeCloseTo(none!.mean, 8)
        }
        expect(some!.sd).toBeGreaterThan(none!.sd)
        expect(much!.sd).toBeGreaterThan(some!.sd)
      },
    ),
    { numRuns: 12 },
  )
})
