import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { CURRENCIES } from '@/lib/core/data/currencies'
import { exponentOf } from '@/lib/core/money/currency'
import { formatMoney } from '@/lib/core/money/format'

const spaces = (text: string) => text.replace(/\s/g, ' ')

describe('formatMoney', () => {
  // Customary forms of the locales (Unicode CLDR), written by hand.
  test.each([
    [1890050, 'USD', 'en', '$18,900.50'],
    [-250, 'GBP', 'en-GB', '-£2.50'],
    [1890050, 'EUR', 'de', '18.900,50 €'],
    [189, 'JPY', 'ja', '￥189'],
    [12345, 'KWD', 'en', 'KWD 12.345'],
    [250000, 'HUF', 'hu', '2500,00 Ft'],
    [1500000, 'IDR', 'en', 'IDR 15,000.00'],
    [5, 'UYW', 'en', 'UYW 0.0005'],
  ])('%i %s in %s', (amount, code, locale, text) => {
    expect(spaces(formatMoney(amount, code, locale))).toBe(text)
  })

  test('keeps every digit of a large amount, where a float would not', () => {
    expect(formatMoney(Number.MAX_SAFE_INTEGER, 'USD', 'en')).toBe('$90,071,992,547,409.91')
  })

  test('shows exactly the digits of the amount, in every currency', () => {
    fc.assert(
      fc.property(fc.maxSafeNat(), fc.constantFrom(...Object.keys(CURRENCIES)), (amount, code) => {
        const digits = formatMoney(amount, code, 'en').replace(/\D/g, '')
        expect(digits).toBe(String(amount).padStart(exponentOf(code) + 1, '0'))
      }),
    )
  })

  test.each([
    ['an unknown currency', () => formatMoney(1, 'XYZ', 'en')],
    ['half a cent', () => formatMoney(0.5, 'EUR', 'en')],
    ['not a number', () => formatMoney(NaN, 'EUR', 'en')],
    ['a malformed locale', () => formatMoney(1, 'EUR', 'not a locale')],
  ])('throws for %s', (_, call) => {
    expect(call).toThrow(RangeError)
  })
})
