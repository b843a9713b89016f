import fc from 'fast-check'
import { expect, test } from 'vitest'
import { freeUnits } from '@/lib/core/orders/free'

const kit = { id: 'kit', maximum: 4, committedUnits: 2 }
const built = { id: 'built', maximum: null, committedUnits: 9 }

test('an offer’s own maximum counts for its line only', () => {
  const run = { maximum: 20, committedUnits: 11 }
  expect(freeUnits(run, [kit, built], [{ runOfferId: 'kit', quantity: 2 }])).toBe(9)
  expect(freeUnits(run, [kit, built], [{ runOfferId: 'kit', quantity: 3 }])).toBe(0)
  expect(freeUnits(run, [kit, built], [{ runOfferId: 'built', quantity: 9 }])).toBe(9)
})

test('never more than the run has left', () => {
  fc.assert(
    fc.property(fc.nat(50), fc.nat(50), fc.nat(9), (maximum, taken, quantity) => {
      const run = { maximum, committedUnits: Math.min(taken, maximum) }
      const free = freeUnits(run, [kit], [{ runOfferId: 'kit', quantity }])
      expect(free).toBeGreaterThanOrEqual(0)
      expect(free).toBeLessThanOrEqual(maximum - run.committedUnits)
    }),
  )
})
