import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { describe, expect, test } from 'vitest'
import { CURRENCIES } from '@/lib/core/data/currencies'
import { exponentOf, isCurrency } from '@/lib/core/money/currency'

describe('exponentOf', () => {
  // ISO 4217, as listed in the reference values.
  test.each([
    [
      0,
      [
        'JPY',
        'KRW',
        'CLP',
        'VND',
        'ISK',
        'UGX',
        'XOF',
        'XAF',
        'XPF',
        'PYG',
        'RWF',
        'VUV',
        'BIF',
        'DJF',
        'GNF',
        'KMF',
      ],
    ],
    [3, ['BHD', 'IQD', 'JOD', 'KWD', 'LYD', 'OMR', 'TND']],
    [4, ['CLF', 'UYW']],
    [2, ['EUR', 'USD', 'GBP', 'CHF', 'HUF', 'IDR', 'COP', 'PKR', 'MGA', 'MRU', 'TWD', 'CNY', 'XCG']],
  ])('%i digits', (digits, codes) => {
    expect(codes.map(exponentOf)).toEqual(codes.map(() => digits))
  })

  test('every other currency has 2: there are 17 without, 7 with three, 2 with four', () => {
    const count = (digits: number) =>
      Object.keys(CURRENCIES).filter((code) => exponentOf(code) === digits).length
    // Counted by hand in ISO 4217 list one: the sixteen above and UYI have none.
    expect([count(0), count(3), count(4)]).toEqual([17, 7, 2])
  })

  test('agrees with the standard as printed in XML, entry by entry', () => {
    const require = createRequire(import.meta.url)
    const xml = readFileSync(require.resolve('currency-codes/iso-4217-list-one.xml'), 'utf8')
    const entries = [...xml.matchAll(/<Ccy>(\w+)<\/Ccy>\s*<CcyNbr>\d+<\/CcyNbr>\s*<CcyMnrUnts>([^<]+)</g)]
    expect(entries.length).toBeGreaterThan(200)
    for (const [, code = '', units] of entries) {
      if (units === 'N.A.') expect(isCurrency(code), code).toBe(false)
      else expect(exponentOf(code), code).toBe(Number(units))
    }
  })

  test.each(['XYZ', 'eur', '', 'XAU', 'XXX', 'toString', '__proto__'])('throws for %j', (code) => {
    expect(isCurrency(code)).toBe(false)
    expect(() => exponentOf(code)).toThrow(RangeError)
  })

  test('names argument and value', () => {
    expect(() => exponentOf('XYZ')).toThrow(/code.*XYZ/)
  })
})
