import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { orderTotals } from '@/lib/core/orders/totals'
import { taxRateFor } from '@/lib/core/orders/tax-rate'

const line = { quantity: 1, priceMinor: 10000, surchargeMinor: 0, depositMinor: 2500, basisPoints: 1900 }

describe('orderTotals', () => {
  test('100.00 including 19 % holds 15.97 (check-values.md, arithmetic, half up)', () => {
    const totals = orderTotals({
      lines: [line],
      postageMinor: 0,
      postageBasisPoints: 0,
      pricesIncludeTax: true,
    })
    expect(totals.taxMinor).toBe(1597)
    expect(totals.totalMinor).toBe(10000)
  })

  test('three lines of 1.03 including 20 % hold .51, by lines (check-values.md, arithmetic)', () => {
    const small = { ...line, priceMinor: 103, depositMinor: 50, basisPoints: 2000 }
    const totals = orderTotals({
      lines: [small, small, small],
      postageMinor: 0,
      postageBasisPoints: 0,
      pricesIncludeTax: true,
    })
    expect(totals.taxMinor).toBe(51)
  })

  test('without tax in the prices it is added: 100.00 and 8.00 postage at 20 % are 129.60 (by hand)', () => {
    const totals = orderTotals({
      lines: [{ ...line, basisPoints: 2000 }],
      postageMinor: 800,
      postageBasisPoints: 2000,
      pricesIncludeTax: false,
    })
    expect(totals.totalMinor).toBe(12960)
    expect(totals.balanceMinor).toBe(12960 - 2500)
  })

  const amounts = fc.integer({ min: 0, max: 1_000_000 })
  const lines = fc.array(
    fc
      .record({
        quantity: fc.integer({ min: 1, max: 10 }),
        priceMinor: amounts,
        surchargeMinor: amounts,
        share: fc.integer({ min: 0, max: 100 }),
        basisPoints: fc.integer({ min: 0, max: 3000 }),
      })
      .map(({ share, ...rest }) => ({ ...rest, depositMinor: Math.floor((rest.priceMinor * share) / 100) })),
    { minLength: 1, maxLength: 5 },
  )
  test('parts add up, and tax never exceeds what is paid, for any order', () => {
    fc.assert(
      fc.property(lines, amounts, fc.boolean(), (each, postageMinor, pricesIncludeTax) => {
        const totals = orderTotals({ lines: each, postageMinor, postageBasisPoints: 1900, pricesIncludeTax })
        const sum = totals.lines.reduce((all, one) => all + one.totalMinor, 0) + totals.postageMinor
        expect(totals.totalMinor).toBe(sum)
        expect(totals.depositMinor + totals.balanceMinor).toBe(totals.totalMinor)
        expect(totals.balanceMinor).toBeGreaterThanOrEqual(0)
        expect(totals.taxMinor).toBeLessThanOrEqual(totals.totalMinor)
      }),
    )
  })

  test.each([
    [{ quantity: 0 }, /quantity/],
    [{ quantity: 1.5 }, /quantity/],
    [{ priceMinor: -1 }, /priceMinor/],
    [{ depositMinor: 10001 }, /depositMinor/],
  ])('a caller’s mistake %j throws', (wrong, words) => {
    const call = () =>
      orderTotals({
        lines: [{ ...line, ...wrong }],
        postageMinor: 0,
        postageBasisPoints: 0,
        pricesIncludeTax: true,
      })
    expect(call).toThrow(RangeError)
    expect(call).toThrow(words)
  })
})

describe('taxRateFor', () => {
  const rates = [
    { country: 'DE', taxClass: 'standard', basisPoints: 1900, validFrom: '2021-01-01' },
    { country: 'EE', taxClass: 'standard', basisPoints: 2200, validFrom: '2024-01-01' },
    { country: 'EE', taxClass: 'standard', basisPoints: 2400, validFrom: '2025-07-01' },
  ]
  test.each([
    ['not_registered', 'DE', 0],
    ['home_rate', 'DE', 1900],
    ['home_rate', 'EE', 1900],
    ['home_rate', 'CH', 0],
    ['destination_rate', 'EE', 2400],
    ['destination_rate', 'FR', 0],
    ['export_without_tax', 'DE', 0],
  ] as const)(
    '%s to %s is %i basis points (own rule; rates of check-values.md)',
    (mode, destination, expected) => {
      const sale = { mode, home: 'DE', destination, taxClass: 'standard', on: '2026-01-01', rates }
      expect(taxRateFor(sale)).toBe(expected)
    },
  )

  test('the rate of the day is used, not the newest there is', () => {
    const sale = {
      mode: 'destination_rate',
      home: 'DE',
      destination: 'EE',
      taxClass: 'standard',
      rates,
    } as const
    expect(taxRateFor({ ...sale, on: '2025-06-30' })).toBe(2200)
    expect(taxRateFor({ ...sale, on: '2025-07-01' })).toBe(2400)
  })
})
