import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { CURRENCIES } from '@/lib/core/data/currencies'
import { exponentOf } from '@/lib/core/money/currency'
import { parseMoney } from '@/lib/core/money/parse'
import { plainMoney } from '@/lib/core/money/plain'
import { ok, refuse } from '@/lib/core/result'

const codes = fc.constantFrom(...Object.keys(CURRENCIES))
const amounts = fc.oneof(fc.maxSafeInteger(), fc.integer({ min: -2000, max: 2000 }))

/** Plain digits by another way than the core's: whole-number division of big integers. */
function asDigits(amount: number, code: string, separator: string): string {
  const digits = exponentOf(code)
  const unit = 10n ** BigInt(digits)
  const size = amount < 0 ? -BigInt(amount) : BigInt(amount)
  const rest = digits === 0 ? '' : separator + (size % unit).toString().padStart(digits, '0')
  return `${amount < 0 ? '-' : ''}${size / unit}${rest}`
}

describe('parseMoney', () => {
  test('returns every amount written as plain digits, in every currency, with point or comma', () => {
    fc.assert(
      fc.property(amounts, codes, fc.constantFrom('.', ','), (amount, code, separator) => {
        expect(parseMoney(asDigits(amount, code, separator), code)).toEqual(ok(amount))
      }),
      { numRuns: 2000 },
    )
  })

  test('every currency once, at one minor unit and at the largest amount', () => {
    for (const code of Object.keys(CURRENCIES)) {
      for (const amount of [0, 1, -1, 99, Number.MAX_SAFE_INTEGER, Number.MIN_SAFE_INTEGER]) {
        expect(parseMoney(asDigits(amount, code, '.'), code), code).toEqual(ok(amount))
        expect(plainMoney(amount, code)).toBe(asDigits(amount, code, '.'))
      }
    }
  })

  // The grammar of the contract: [-]digits[(.|,)digits].
  test.each([
    ['0.29', 'EUR', 29],
    ['1.1', 'EUR', 110],
    ['4,35', 'EUR', 435],
    ['8.2', 'USD', 820],
    ['007', 'EUR', 700],
    ['-12.50', 'EUR', -1250],
    ['1250', 'JPY', 1250],
    ['1.005', 'KWD', 1005],
    ['0000000000000000000000001', 'EUR', 100],
  ])('%s %s', (text, code, amount) => {
    expect(parseMoney(text, code)).toEqual(ok(amount))
  })

  test('minus nothing is nothing, not minus zero', () => {
    const zero = parseMoney('-0.00', 'EUR')
    expect(zero.ok && Object.is(zero.value, 0)).toBe(true)
  })

  test.each([
    ...[
      '',
      ' ',
      '-',
      '.',
      ',',
      '1.',
      '.5',
      '1,000.00',
      '1.000,00',
      "1'000",
      '1 000',
      ' 1',
      '1 ',
      '1\n',
      '+1',
    ],
    ...['--1', '1-', '1e3', '0x10', '€1', '1€', 'NaN', 'Infinity', '١٢', '１２', '1..2', '1.,2', '−1'],
  ])('%j is not a number', (text) => {
    expect(parseMoney(text, 'EUR')).toEqual(refuse('not_a_number'))
  })

  test.each([
    ['1.001', 'EUR'],
    ['1.000', 'EUR'],
    ['1.0', 'JPY'],
    ['1.0001', 'KWD'],
    ['1.00001', 'CLF'],
  ])('%s %s is too precise', (text, code) => {
    expect(parseMoney(text, code)).toEqual(refuse('too_precise'))
  })

  test.each([
    ['90071992547409.92', 'EUR'],
    ['9007199254740992', 'JPY'],
    ['-9007199254740993', 'JPY'],
    ['9'.repeat(400), 'EUR'],
  ])('%s %s is too large', (text, code) => {
    expect(parseMoney(text, code)).toEqual(refuse('too_large'))
  })

  test('an unknown currency is a bug of the caller', () => {
    expect(() => parseMoney('1', 'XYZ')).toThrow(RangeError)
  })

  test('any text gives an answer and never throws', () => {
    fc.assert(
      fc.property(fc.string(), codes, (text, code) => {
        const parsed = parseMoney(text, code)
        expect(parsed.ok ? Number.isSafeInteger(parsed.value) : parsed.reason).toBeTruthy()
      }),
    )
  })
})

describe('plainMoney', () => {
  test.each([0.5, NaN, Infinity, 2 ** 53])('throws for %d', (amount) => {
    expect(() => plainMoney(amount, 'EUR')).toThrow(RangeError)
  })
  test('throws for an unknown currency', () => {
    expect(() => plainMoney(1, 'XYZ')).toThrow(RangeError)
  })
})
