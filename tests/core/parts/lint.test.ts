import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { lintParts, type PartsLine } from '@/lib/core/parts/lint'

const line = (over: Partial<PartsLine>): PartsLine => ({
  id: 'a',
  designators: 'R1-R4',
  quantity: 4,
  value: '10k',
  neededFor: ['kit'],
  quotes: 1,
  alternates: 0,
  lifecycle: 'active',
  supplyPins: 0,
  polarityNote: '',
  ...over,
})
const chip = line({ id: 'u', designators: 'U1, U2', quantity: 2, value: 'quad op amp', supplyPins: 2 })
const bypass = (quantity: number) =>
  line({ id: 'c', designators: quantity === 0 ? '' : `C1-C${quantity}`, quantity, value: '100n X7R' })
const found = (...lines: PartsLine[]) =>
  lintParts(lines).map(({ line: at, problem, severity, detail }) => [at, problem, severity, detail].join(' '))

describe('lintParts', () => {
  test('a good list has no findings', () => expect(found(line({}), chip, bypass(4))).toEqual([]))

  test.each<[string, Partial<PartsLine>, string]>([
    ['count and designators differ', { quantity: 5 }, 'a count_differs error 4 / 5'],
    ['designators nobody can read', { designators: 'R4-R1' }, 'a unreadable_designators error R4-R1'],
    ['a value nobody can read', { value: 'lots' }, 'a unreadable_value error lots'],
    ['no value at all', { value: '' }, 'a unreadable_value error '],
    ['a value nobody makes', { value: '5k' }, 'a value_not_preferred advice 5k'],
    ['no quote', { quotes: 0 }, 'a no_quote error '],
    ['gone without an alternate', { lifecycle: 'gone' }, 'a end_of_life_without_alternate error gone'],
    [
      'last buy without an alternate',
      { lifecycle: 'last_buy' },
      'a end_of_life_without_alternate error last_buy',
    ],
    [
      'not for new designs',
      { lifecycle: 'not_for_new_designs' },
      'a end_of_life_without_alternate advice not_for_new_designs',
    ],
    ['needed for no offer', { neededFor: [] }, 'a needed_for_no_offer error '],
    [
      'a power header without a note',
      { designators: 'J1', quantity: 1, value: '2x5 header' },
      'a no_polarity_note error J1',
    ],
  ])('%s', (_, over, expected) => expect(found(line(over))).toEqual([expected]))

  test.each<[string, Partial<PartsLine>]>([
    ['an alternate', { lifecycle: 'gone', alternates: 1 }],
    ['a jack', { designators: 'J1', quantity: 1, value: '', description: '3.5 mm mono jack' }],
    ['a note', { designators: 'J1', quantity: 1, value: '2x5 header', polarityNote: 'stripe is −12 V' }],
    ['no designators', { designators: '', quantity: 2, value: 'screw M3' }],
    ['a potentiometer of 50k', { designators: 'RV1', quantity: 1, value: 'B50K' }],
    ['a link of 0 Ω', { value: '0R' }],
    ['a resistor of E96', { value: '4k99 1%' }],
    ['a diode', { designators: 'D1', quantity: 1, value: '1N4148' }],
  ])('%s is nothing to complain of', (_, over) => expect(found(line(over))).toEqual([]))

  test('a designator may be named once in the whole list', () =>
    expect(found(line({}), line({ id: 'b', designators: 'R4, R9, R9', quantity: 3 }))).toEqual([
      'b repeated_designator error R4',
      'b repeated_designator error R9',
    ]))

  // At least one bypass capacitor at each integrated circuit: common practice, no source.
  test.each([
    [0, [' too_few_bypass_capacitors error 0 / 2']],
    [1, [' too_few_bypass_capacitors error 1 / 2']],
    [2, [' fewer_bypass_capacitors_than_supply_pins advice 2 / 4']],
    [3, [' fewer_bypass_capacitors_than_supply_pins advice 3 / 4']],
    [4, []],
  ])('%i bypass capacitors for two circuits with two supply pins each', (count, expected) =>
    expect(found(chip, bypass(count)).filter((text) => text.includes('bypass'))).toEqual(expected),
  )
  test('a large electrolytic is no bypass capacitor', () =>
    expect(found(chip, line({ id: 'c', designators: 'C1-C9', quantity: 9, value: '10u/50V' }))).toEqual([
      ' too_few_bypass_capacitors error 0 / 2',
    ]))

  test('never throws, whatever is typed', () => {
    const text = fc.string({ maxLength: 12 })
    fc.assert(
      fc.property(fc.array(fc.record({ designators: text, value: text, quantity: fc.nat(5) })), (lines) => {
        const all = lines.map((over, i) => line({ ...over, id: String(i) }))
        return lintParts(all).every(({ line: at }) => at === null || all.some(({ id }) => id === at))
      }),
    )
  })
})
