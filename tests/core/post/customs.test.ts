import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { customsForm, customsLines, declarationProblems, type Declaration } from '@/lib/core/post/customs'
import { crossesCustoms } from '@/lib/core/post/customs-territory'

const item = {
  from: { country: 'DE' },
  to: { country: 'GB' },
  value: 20_000,
  currency: 'EUR',
  sdrRate: '1.2',
  grams: 400,
  service: 'letter' as const,
}
const place = (text: string) => ({ country: text.slice(0, 2), postcode: text.slice(3) || undefined })

describe('customsForm', () => {
  // UPU Convention Regulations: CN 22 up to 300 SDR in the letter post, CN 23 above and on parcels.
  test.each([
    [36_000, 'CN22'],
    [36_001, 'CN23'],
    [0, 'CN22'],
  ])('300 SDR at 1.2 EUR is 360.00 EUR, inclusive: %i', (value, form) =>
    expect(customsForm({ ...item, value })).toBe(form),
  )

  test('parcels, and letters over two kilograms, take CN 23', () => {
    expect(customsForm({ ...item, service: 'parcel' })).toBe('CN23')
    expect(customsForm({ ...item, grams: 2000 })).toBe('CN22')
    expect(customsForm({ ...item, grams: 2001 })).toBe('CN23')
  })

  test('the limit and the digits of the currency are minded', () => {
    expect(customsForm({ ...item, value: 36_000, limitSdr: 299.99 })).toBe('CN23')
    expect(customsForm({ ...item, value: 60_000, currency: 'JPY', sdrRate: '200' })).toBe('CN22')
    expect(customsForm({ ...item, value: 60_001, currency: 'JPY', sdrRate: '200' })).toBe('CN23')
    // Exactly: 300 × 1.4142135 = 424.26405, so 424.26 is within and 424.27 is not.
    expect(customsForm({ ...item, value: 42_426, sdrRate: '1.4142135' })).toBe('CN22')
    expect(customsForm({ ...item, value: 42_427, sdrRate: '1.4142135' })).toBe('CN23')
  })

  // Islands and special zones (from memory; see customs-territory.ts).
  test.each([
    ['DE', 'FR', false],
    ['US', 'US', false],
    ['DE', 'ES 38001', true],
    ['ES 28001', 'ES 35001', true],
    ['ES 35001', 'ES 38001', false],
    ['ES', 'ES 07001', false],
    ['FI', 'AX 22100', true],
    ['FI', 'FI 22100', true],
    ['FR', 'FR 97410', true],
    ['FR', 'FR 20000', false],
    ['FR', 'MC 98000', false],
    ['DE', 'DE 27498', true],
    ['CH', 'DE 78266', false],
    ['IT', 'IT 23041', true],
    ['DE', 'GB BT1 1AA', false],
    ['DE', 'GB B1 1AA', true],
    ['GB', 'GB BT1 1AA', false],
    ['US', 'GB BT1 1AA', true],
    ['GB', 'JE JE2 3AB', true],
    ['GB', 'GB JE2 3AB', true],
    ['GB', 'IM IM1 1AA', false],
    ['CH', 'LI 9490', false],
    ['DE', 'CH 8001', true],
    ['NO', 'SE', true],
    ['US', 'PR 00901', false],
    ['US', 'US 09012', true],
    ['DK', 'FO 100', true],
    ['DE', 'SE SE-221 00', false],
  ])('%s to %s crosses a customs border: %s', (from, to, crosses) => {
    expect(crossesCustoms(place(from), place(to))).toBe(crosses)
    expect(crossesCustoms(place(to), place(from))).toBe(crosses)
  })

  test.each([
    { value: -1 },
    { value: 1.5 },
    { currency: 'XXX' },
    { sdrRate: '0' },
    { sdrRate: '1,2' },
    { grams: -1 },
    { limitSdr: NaN },
    { limitSdr: -300 },
  ])('throws on %o', (over) => expect(() => customsForm({ ...item, ...over })).toThrow(RangeError))
})

describe('customsLines', () => {
  const kit = {
    description: 'Audio mixer kit',
    quantity: 1,
    unitValue: 9500,
    unitGrams: 310,
    code: '9207.90',
    origin: 'DE',
  }
  test('counts pieces of one kind together and keeps the others apart', () =>
    expect(customsLines({ items: [kit, { ...kit, origin: 'CZ' }, { ...kit, quantity: 2 }] })).toEqual([
      {
        description: 'Audio mixer kit',
        quantity: 3,
        value: 28_500,
        grams: 930,
        code: '9207.90',
        origin: 'DE',
      },
      { description: 'Audio mixer kit', quantity: 1, value: 9500, grams: 310, code: '9207.90', origin: 'CZ' },
    ]))

  test('neither value nor weight is lost', () => {
    const items = fc.array(
      fc.record({
        ...Object.fromEntries(Object.entries(kit).map(([k, v]) => [k, fc.constant(v)])),
        quantity: fc.integer({ min: 1, max: 9 }),
        unitValue: fc.integer({ min: 0, max: 3 }),
        unitGrams: fc.integer({ min: 0, max: 9 }),
      }) as fc.Arbitrary<typeof kit>,
    )
    fc.assert(
      fc.property(items, (list) => {
        const lines = customsLines({ items: list })
        const sum = (of: (i: (typeof list)[number]) => number) =>
          list.reduce((total, each) => total + of(each), 0)
        return (
          lines.reduce((total, { value }) => total + value, 0) === sum((i) => i.quantity * i.unitValue) &&
          lines.reduce((total, { grams }) => total + grams, 0) === sum((i) => i.quantity * i.unitGrams)
        )
      }),
    )
  })
  test.each([{ quantity: 0 }, { unitValue: 0.5 }, { unitGrams: -1 }])('throws on %o', (over) =>
    expect(() => customsLines({ items: [{ ...kit, ...over }] })).toThrow(RangeError),
  )
})

describe('declarationProblems', () => {
  const line = {
    description: 'Audio mixer kit',
    quantity: 1,
    value: 9500,
    grams: 310,
    code: '9207.90',
    origin: 'DE',
  }
  const complete: Declaration = {
    from: { country: 'DE', name: 'Hollow Pier Modular', lines: ['Hafen 1'], phone: '+49 1', eori: 'DE1' },
    to: { country: 'GB', name: 'A. Lee', lines: ['1 Low Rd'], email: 'a@example.org' },
    contents: 'sale',
    currency: 'EUR',
    lines: [line],
    grossGrams: 420,
    signedBy: 'A. Berg',
    signedOn: '2026-05-04',
    invoice: 'HP-12',
  }

  test('a complete declaration has none', () => expect(declarationProblems(complete)).toEqual([]))
  test('within one area nothing is declared', () =>
    expect(declarationProblems({ ...complete, lines: [], to: { ...complete.to, country: 'FR' } })).toEqual(
      [],
    ))

  test('each missing datum is named by its field', () => {
    const empty: Declaration = {
      from: { country: 'DE', name: '', lines: [] },
      to: { country: 'GB', name: ' ', lines: [''] },
      lines: [{}],
    }
    const fields = (severity: string) =>
      declarationProblems(empty)
        .filter((found) => found.problem === 'missing' && found.severity === severity)
        .map(({ field }) => field)
    expect(fields('error').sort()).toEqual([
      'contents',
      'currency',
      'from.lines',
      'from.name',
      'grossGrams',
      'lines.0.code',
      'lines.0.description',
      'lines.0.grams',
      'lines.0.origin',
      'lines.0.quantity',
      'lines.0.value',
      'signedBy',
      'signedOn',
      'to.lines',
      'to.name',
    ])
    expect(fields('ask').sort()).toEqual(['from.eori', 'from.phone', 'invoice', 'to.phone'])
    expect(declarationProblems({ ...complete, lines: [] })).toEqual([
      { field: 'lines', problem: 'missing', severity: 'error' },
    ])
  })

  test.each([
    'electronics',
    'parts',
    'gift',
    'Electronic parts',
    'Kit',
    'PARTS.',
    'Spare parts & accessories',
  ])('customs refuse %j alone', (description) =>
    expect(declarationProblems({ ...complete, lines: [{ ...line, description }] })).toEqual([
      { field: 'lines.0.description', problem: 'too_vague', severity: 'error' },
    ]),
  )

  test.each<[string, Partial<Declaration>, string]>([
    ['a value of 0', { lines: [{ ...line, value: 0 }] }, 'lines.0.value zero'],
    ['a code of four digits', { lines: [{ ...line, code: '9207' }] }, 'lines.0.code code_digits'],
    ['two codes in one field', { lines: [{ ...line, code: '920790, 854370' }] }, 'lines.0.code code_digits'],
    ['six digits for the US', { to: { ...complete.to, country: 'US' } }, 'lines.0.code code_digits'],
    ['an origin that is no country', { lines: [{ ...line, origin: 'EU' }] }, 'lines.0.origin not_a_country'],
    [
      'a kit in two lines',
      {
        lines: [
          { ...line, grams: 10, kit: 'k1' },
          { ...line, grams: 10, kit: 'k1', code: '853400' },
        ],
      },
      'lines.1.code one_code_per_kit',
    ],
    ['contents heavier than the parcel', { grossGrams: 300 }, 'grossGrams heavier_than_gross'],
    ['a sale called a gift', { contents: 'gift' }, 'contents called_gift'],
    ['a name customs cannot read', { to: { ...complete.to, name: '森 花' } }, 'to.lines not_latin'],
  ])('%s', (_, over, expected) => {
    const found = declarationProblems({ ...complete, ...over })
    expect(found.map(({ field, problem }) => `${field} ${problem}`)).toEqual([expected])
  })
})
