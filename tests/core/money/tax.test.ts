import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { taxInGross, taxOnNet } from '@/lib/core/money/tax'

const rates = fc.integer({ min: 0, max: 5000 })

describe('tax', () => {
  // 100.00 gross at 19, 20 and 25.5 %: arithmetic, half up.
  test.each([
    [10000, 1900, 1597],
    [10000, 2000, 1667],
    [10000, 2550, 2032],
    [10000, 0, 0],
    [-10000, 2000, -1667],
  ])('in %i at %i basis points: %i', (gross, rate, tax) => {
    expect(taxInGross(gross, rate)).toBe(tax)
  })

  test('three lines of 1.03 at 20 % are .51 by lines, which is used, and .52 at once (arithmetic)', () => {
    expect([103, 103, 103].map((line) => taxInGross(line, 2000))).toEqual([17, 17, 17])
    expect(taxInGross(309, 2000)).toBe(52)
  })

  // Half a cent goes up: 2.50 · 1 % = .025, 10.10 · 5 % = .505 (arithmetic).
  test.each([
    [10000, 2550, 2550],
    [250, 100, 3],
    [1010, 500, 51],
    [-250, 100, -3],
  ])('on %i at %i basis points: %i', (net, rate, tax) => {
    expect(taxOnNet(net, rate)).toBe(tax)
  })

  test('tax in the gross of a net is the tax on that net, within one unit', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), rates, (net, rate) => {
        const tax = taxOnNet(net, rate)
        expect(Math.abs(taxInGross(net + tax, rate) - tax)).toBeLessThanOrEqual(1)
      }),
    )
  })

  test('is the nearest whole number to the exact tax', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), rates, (gross, rate) => {
        const [d, n] = [10_000n + BigInt(rate), BigInt(gross) * BigInt(rate)]
        const off = 2n * (BigInt(taxInGross(gross, rate)) * d - n)
        expect((off < 0n ? -off : off) <= d).toBe(true)
      }),
    )
  })

  test.each([
    ['basisPoints', 100, -1],
    ['basisPoints', 100, 19.5],
    ['basisPoints', 100, NaN],
    ['amount', 0.5, 1900],
  ])('throws for %s', (argument, amount, rate) => {
    expect(() => taxInGross(amount, rate)).toThrow(argument)
    expect(() => taxOnNet(amount, rate)).toThrow(RangeError)
  })
})
