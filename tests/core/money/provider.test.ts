import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { CURRENCIES } from '@/lib/core/data/currencies'
import { exponentOf } from '@/lib/core/money/currency'
import { fromProvider, processingFee, refundToProvider, toProvider } from '@/lib/core/money/provider'
import { PROVIDER_ZERO_DECIMAL } from '@/lib/core/money/provider-rules'
import { ok, refuse } from '@/lib/core/result'

describe('toProvider', () => {
  // The provider's public API documentation; ISK and UGX from memory.
  test.each([
    [2500, 'EUR', 2500],
    [500, 'JPY', 500],
    [500, 'MGA', 5],
    [2500, 'ISK', 250000],
    [5000, 'UGX', 500000],
    [5120, 'KWD', 5120],
    [250000, 'HUF', 250000],
  ])('%i %s → %i', (amount, code, sent) => {
    expect(toProvider(amount, code)).toEqual(ok(sent))
    expect(fromProvider(sent, code)).toBe(amount)
  })

  test('the zero-decimal list is the published one', () => {
    const published = 'BIF CLP DJF GNF JPY KMF KRW MGA PYG RWF VND VUV XAF XOF XPF'.split(' ')
    expect(PROVIDER_ZERO_DECIMAL).toEqual(published)
  })

  test.each([
    [5124, 'KWD'],
    [550, 'MGA'],
    [10000, 'CLF'],
    [10000, 'UYW'],
  ])('%i %s cannot be written there', (amount, code) => {
    expect(toProvider(amount, code)).toEqual(refuse('not_representable'))
  })

  // Smallest charges: the provider's public API documentation (from memory).
  test.each([
    ['USD', 50],
    ['EUR', 50],
    ['GBP', 30],
    ['JPY', 50],
  ])('the smallest charge in %s is %i', (code, least) => {
    expect(toProvider(least, code)).toEqual(ok(least))
    expect(toProvider(least - 1, code)).toEqual(refuse('below_minimum'))
  })

  test('nothing and less than nothing is below every minimum', () => {
    for (const code of ['EUR', 'KRW', 'TND', 'XPF']) {
      expect(toProvider(0, code)).toEqual(refuse('below_minimum'))
      expect(toProvider(-100, code)).toEqual(refuse('below_minimum'))
    }
    expect(toProvider(1, 'KRW')).toEqual(ok(1))
  })

  test('eight digits are the most (from memory)', () => {
    expect(toProvider(99_999_999, 'EUR')).toEqual(ok(99_999_999))
    expect(toProvider(100_000_000, 'EUR')).toEqual(refuse('above_maximum'))
    expect(toProvider(1_000_000, 'ISK')).toEqual(refuse('above_maximum'))
    expect(toProvider(100_000_000, 'IDR')).toEqual(ok(100_000_000))
  })

  test('what it sends comes back the same, in every currency', () => {
    fc.assert(
      fc.property(
        fc.nat({ max: 99_999_999 }),
        fc.constantFrom(...Object.keys(CURRENCIES)),
        (amount, code) => {
          const sent = toProvider(amount, code)
          if (sent.ok) expect(fromProvider(sent.value, code)).toBe(amount)
          else expect(['below_minimum', 'above_maximum', 'not_representable']).toContain(sent.reason)
        },
      ),
      { numRuns: 500 },
    )
  })

  test('three-decimal amounts end in 0', () => {
    for (const code of Object.keys(CURRENCIES).filter((each) => exponentOf(each) === 3)) {
      expect(toProvider(1010, code)).toEqual(ok(1010))
      expect(toProvider(1011, code)).toEqual(refuse('not_representable'))
    }
  })

  test.each([
    ['an unknown currency', () => toProvider(100, 'XYZ')],
    ['half a cent', () => toProvider(0.5, 'EUR')],
    ['not a number', () => toProvider(NaN, 'EUR')],
    ['an odd króna amount from the provider', () => fromProvider(250050, 'ISK')],
    ['half a cent from the provider', () => fromProvider(0.5, 'EUR')],
    ['an unknown currency from the provider', () => fromProvider(1, 'XYZ')],
  ])('throws for %s', (_, call) => {
    expect(call).toThrow(RangeError)
  })
})

describe('refundToProvider', () => {
  test('gives back parts smaller than any charge', () => {
    expect(refundToProvider(1, 'EUR')).toEqual(ok(1))
    expect(refundToProvider(7, 'KWD')).toEqual(refuse('not_representable'))
  })
  test.each([0, -1, NaN])('throws for %d', (amount) => {
    expect(() => refundToProvider(amount, 'EUR')).toThrow(RangeError)
  })
})

describe('processingFee', () => {
  // Arithmetic: 1.5 % of 25.00 is .375, up to .38, and .25; 2.9 % of 189.00 is 5.481, and .30.
  test.each([
    [2500, 150, 25, 63],
    [18900, 290, 30, 578],
    [50, 290, 30, 31],
    [100, 0, 0, 0],
  ])('%i at %i basis points and %i', (amount, basisPoints, fixed, fee) => {
    expect(processingFee(amount, { basisPoints, fixed })).toBe(fee)
  })

  test('never falls as the amount grows', () => {
    fc.assert(
      fc.property(fc.nat(), fc.nat({ max: 1000 }), fc.nat({ max: 100 }), (amount, basisPoints, fixed) => {
        const fee = (of: number) => processingFee(of, { basisPoints, fixed })
        expect(fee(amount + 1)).toBeGreaterThanOrEqual(fee(amount))
      }),
    )
  })

  test.each([
    ['amount', -1, 150, 25],
    ['basisPoints', 100, 1.5, 25],
    ['fixed', 100, 150, -25],
  ])('throws for %s', (argument, amount, basisPoints, fixed) => {
    expect(() => processingFee(amount, { basisPoints, fixed })).toThrow(argument)
    expect(() => processingFee(amount, { basisPoints, fixed })).toThrow(RangeError)
  })
})
