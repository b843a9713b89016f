import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { reconcile, type Difference, type Movement } from '@/lib/core/ledger/reconcile'

const charge: Movement = { id: 'c1', kind: 'charge', amount: 2500, currency: 'EUR' }
const fee: Movement = { id: 'f1', kind: 'fee', amount: 63, currency: 'EUR' }

describe('reconcile', () => {
  test.each<[string, Movement[], Movement[], Difference[]]>([
    ['nothing on either side', [], [], []],
    ['the same in another order', [charge, fee], [fee, charge], []],
    ['missing here', [], [charge], [{ kind: 'missing_here', id: 'c1', ours: null, theirs: 2500 }]],
    ['missing there', [charge], [], [{ kind: 'missing_there', id: 'c1', ours: 2500, theirs: null }]],
    [
      'another amount',
      [charge],
      [{ ...charge, amount: 2400 }],
      [{ kind: 'amount', id: 'c1', ours: 2500, theirs: 2400 }],
    ],
    [
      'another currency',
      [charge],
      [{ ...charge, currency: 'USD' }],
      [{ kind: 'currency', id: 'c1', ours: 'EUR', theirs: 'USD' }],
    ],
    [
      'another currency and amount is one difference: the amounts cannot be compared',
      [charge],
      [{ ...charge, currency: 'JPY', amount: 25 }],
      [{ kind: 'currency', id: 'c1', ours: 'EUR', theirs: 'JPY' }],
    ],
    [
      'booked twice here',
      [charge, charge],
      [charge],
      [{ kind: 'missing_there', id: 'c1', ours: 2500, theirs: null }],
    ],
    [
      'listed twice there',
      [charge],
      [charge, charge],
      [{ kind: 'missing_here', id: 'c1', ours: null, theirs: 2500 }],
    ],
    ['the same id in two kinds', [charge, { ...fee, id: 'c1' }], [{ ...fee, id: 'c1' }, charge], []],
    [
      'an equal partner is found before an unlike one',
      [{ ...charge, amount: 1 }, charge],
      [charge],
      [{ kind: 'missing_there', id: 'c1', ours: 1, theirs: null }],
    ],
  ])('%s', (_, ledger, list, differences) => {
    expect(reconcile(ledger, list)).toEqual(differences)
  })

  const kinds = fc.constantFrom('charge', 'refund', 'dispute', 'fee', 'payout')
  const book = fc.uniqueArray(
    fc.record({
      id: fc.string({ minLength: 1, maxLength: 6 }),
      kind: kinds as fc.Arbitrary<Movement['kind']>,
      amount: fc.integer({ min: -1e6, max: 1e6 }),
      currency: fc.constantFrom('EUR', 'JPY'),
    }),
    { selector: (each) => each.id, maxLength: 40 },
  )
  const plant = fc.array(fc.constantFrom('leave', 'drop', 'add', 'amount', 'currency'), {
    minLength: 40,
    maxLength: 40,
  })

  test('every planted difference is found and none is invented', () => {
    fc.assert(
      fc.property(book, plant, (ledger, plan) => {
        const expected: string[] = []
        const list = ledger.flatMap((ours, i): Movement[] => {
          const change = plan[i]
          if (change === 'drop') expected.push(`missing_there ${ours.id}`)
          if (change === 'add') expected.push(`missing_here new ${ours.id}`)
          if (change === 'amount' || change === 'currency') expected.push(`${change} ${ours.id}`)
          if (change === 'drop') return []
          if (change === 'add') return [ours, { ...ours, id: `new ${ours.id}` }]
          if (change === 'amount') return [{ ...ours, amount: ours.amount + 1 }]
          return change === 'currency' ? [{ ...ours, currency: 'GBP' }] : [ours]
        })
        const found = reconcile(ledger, list.toReversed()).map(({ kind, id }) => `${kind} ${id}`)
        expect(found.toSorted()).toEqual(expected.toSorted())
      }),
    )
  })

  test('turned round it says the same from the other side', () => {
    const mirrored = {
      missing_here: 'missing_there',
      missing_there: 'missing_here',
      amount: 'amount',
      currency: 'currency',
    }
    const text = ({ kind, id, ours, theirs }: Difference) => JSON.stringify([kind, id, ours, theirs])
    fc.assert(
      fc.property(book, book, (a, b) => {
        const back = reconcile(b, a).map(({ kind, id, ours, theirs }) =>
          text({ kind: mirrored[kind] as Difference['kind'], id, ours: theirs, theirs: ours }),
        )
        expect(reconcile(a, b).map(text).toSorted()).toEqual(back.toSorted())
      }),
    )
  })

  test.each([0.5, NaN, 2 ** 53])('throws for an amount of %d', (amount) => {
    expect(() => reconcile([{ ...charge, amount }], [])).toThrow(RangeError)
    expect(() => reconcile([], [{ ...charge, amount }])).toThrow(/c1/)
  })
})
