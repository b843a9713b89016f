import fc from 'fast-check'
import { expect, test } from 'vitest'
import { netted } from '@/lib/core/ledger/netted'
import type { Movement } from '@/lib/core/ledger/reconcile'

const move = (kind: Movement['kind'], id: string, amount: number, currency = 'EUR'): Movement => ({
  kind,
  id,
  amount,
  currency,
})

test('a refund booked there and back is nothing; a dispute and its fee are one sum of their payment', () => {
  expect(netted([move('refund', 'r', -500), move('refund', 'r', 500)])).toEqual([])
  // A payment's fee of 0.63, a dispute of 25.00 and its fee of 20.00: 45.63 by hand.
  expect(netted([move('fee', 'p', -63), move('dispute', 'p', -2500), move('fee', 'p', -2000)])).toEqual([
    move('fee', 'p', -4563),
  ])
  expect(netted([move('charge', 'p', 5), move('charge', 'p', 5, 'JPY')])).toHaveLength(2)
})

test('law: the sum in each currency stays, and netting twice is netting once', () => {
  const movements = fc.array(
    fc.record({
      kind: fc.constantFrom('charge', 'refund', 'dispute', 'fee', 'payout'),
      id: fc.constantFrom('a', 'b', 'c'),
      amount: fc.integer({ min: -10_000, max: 10_000 }),
      currency: fc.constantFrom('EUR', 'JPY'),
    }) as fc.Arbitrary<Movement>,
  )
  const sum = (list: readonly Movement[], currency: string) =>
    list.filter((each) => each.currency === currency).reduce((total, { amount }) => total + amount, 0)
  fc.assert(
    fc.property(movements, (list) => {
      const once = netted(list)
      for (const currency of ['EUR', 'JPY']) expect(sum(once, currency)).toBe(sum(list, currency))
      expect(netted(once)).toEqual(once)
    }),
  )
})
