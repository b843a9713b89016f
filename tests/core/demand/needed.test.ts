import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { signupsNeeded } from '@/lib/core/demand/needed'

test('uniform conversion: P(at least 1 of n) = n / (n + 1)', () => {
  const groups = [{ alpha: 1, beta: 1, quantities: [1] }]
  expect(signupsNeeded({ groups, at: 0, minimum: 1, chance: 0.75 })).toEqual({ ok: true, value: 2 })
  expect(signupsNeeded({ groups, at: 0, minimum: 1, chance: 0.95 })).toEqual({ ok: true, value: 18 })
})

test('is the smallest number, by trying all: new members take the quantities in turn', () => {
  fc.assert(
    fc.property(
      fc.array(fc.integer({ min: 1, max: 5 }), { minLength: 1, maxLength: 6 }),
      fc.double({ min: 1, max: 20, noNaN: true }),
      fc.integer({ min: 1, max: 40 }),
      fc.double({ min: 0.05, max: 0.9, noNaN: true }),
      (quantities, alpha, minimum, chance) => {
        const other = { alpha: 2, beta: 5, quantities: [2, 3] }
        const groups = [other, { alpha, beta: 4, quantities }]
        const reached = (more: number) => {
          const grown = [
            ...quantities,
            ...Array.from({ length: more }, (_, i) => quantities[i % quantities.length]!),
          ]
          return forecastUnits([other, { alpha, beta: 4, quantities: grown }], { committed: 3 }).atLeast(
            minimum,
          )
        }
        let expected = 0
        while (expected <= 60 && reached(expected) < chance) expected += 1
        const found = signupsNeeded({ groups, at: 1, minimum, chance, limit: 60, committed: 3 })
        if (expected === 0) expect(found).toEqual({ ok: false, reason: 'already_there' })
        else if (expected > 60) expect(found).toEqual({ ok: false, reason: 'out_of_reach' })
        else expect(found).toEqual({ ok: true, value: expected })
      },
    ),
    { numRuns: 25 },
  )
})

test('never falls when the minimum or the chance rises', () => {
  const groups = [{ alpha: 6, beta: 4, quantities: [1, 2, 1] }]
  const needed = (minimum: number, chance: number) => {
    const found = signupsNeeded({ groups, at: 0, minimum, chance })
    return found.ok ? found.value : found.reason === 'already_there' ? 0 : Number.POSITIVE_INFINITY
  }
  for (const minimum of [1, 4, 9, 30]) {
    expect(needed(minimum + 1, 0.8)).toBeGreaterThanOrEqual(needed(minimum, 0.8))
    expect(needed(minimum, 0.9)).toBeGreaterThanOrEqual(needed(minimum, 0.8))
  }
})

describe('refusals and edges', () => {
  const groups = [{ alpha: 1, beta: 1, quantities: [] }]
  test('an empty class grows by ones; a minimum of 0 is there already', () => {
    expect(signupsNeeded({ groups, at: 0, minimum: 1, chance: 0.5 })).toEqual({ ok: true, value: 1 })
    expect(signupsNeeded({ groups, at: 0, minimum: 0, chance: 0.99 })).toEqual({
      ok: false,
      reason: 'already_there',
    })
  })
  test('out of reach beyond the limit, not at it', () => {
    expect(signupsNeeded({ groups, at: 0, minimum: 1, chance: 0.75, limit: 3 })).toEqual({
      ok: true,
      value: 3,
    })
    expect(signupsNeeded({ groups, at: 0, minimum: 1, chance: 0.75, limit: 2 })).toEqual({
      ok: false,
      reason: 'out_of_reach',
    })
  })
  test('RangeErrors', () => {
    const good = { groups, at: 0, minimum: 1, chance: 0.5 }
    expect(() => signupsNeeded({ ...good, at: 1 })).toThrow(/at must name one of 1 groups, got 1/)
    expect(() => signupsNeeded({ ...good, at: -1 })).toThrow(/at must be a whole number/)
    expect(() => signupsNeeded({ ...good, minimum: -1 })).toThrow(/minimum/)
    expect(() => signupsNeeded({ ...good, chance: 1 })).toThrow(/chance/)
    expect(() => signupsNeeded({ ...good, limit: 0 })).toThrow(/limit/)
  })
})
