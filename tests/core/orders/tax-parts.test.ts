import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { taxInGross } from '@/lib/core/money/tax'
import {
  grossOf,
  lessParts,
  partsOfPayment,
  type TaxPart,
  taxOf,
  taxParts,
} from '@/lib/core/orders/tax-parts'

const part = (basisPoints: number, gross: number): TaxPart => ({
  basisPoints,
  grossMinor: minor(gross),
  taxMinor: taxInGross(gross, basisPoints),
})

describe('known values, by hand', () => {
  test('a deposit of 25.00 of an order of 119.00 at 19 % holds 3.99 of tax: 2500 · 1900 / 11900 = 399.2', () => {
    const whole = [part(1900, 11900)]
    expect(partsOfPayment({ whole, before: [], amount: 2500 })).toEqual([
      { basisPoints: 1900, grossMinor: 2500, taxMinor: 399 },
    ])
    // The rest: 94.00 with 19.00 − 3.99 = 15.01.
    const before = [{ basisPoints: 1900, grossMinor: minor(2500), taxMinor: minor(399) }]
    expect(partsOfPayment({ whole, before, amount: 9400 })).toEqual([
      { basisPoints: 1900, grossMinor: 9400, taxMinor: 1501 },
    ])
  })

  test('a payment of half divides over two rates as the order does', () => {
    const whole = [part(1900, 11900), part(700, 10700)]
    expect(partsOfPayment({ whole, before: [], amount: 11300 })).toEqual([
      { basisPoints: 1900, grossMinor: 5950, taxMinor: 950 },
      { basisPoints: 700, grossMinor: 5350, taxMinor: 350 },
    ])
  })

  test('what is paid beyond the whole is divided as the whole is; nothing of nothing has no parts', () => {
    expect(grossOf(partsOfPayment({ whole: [part(1900, 100)], before: [], amount: 150 }))).toBe(150)
    expect(partsOfPayment({ whole: [], before: [], amount: 5 })).toEqual([])
    expect(() => partsOfPayment({ whole: [], before: [], amount: -1 })).toThrow(RangeError)
  })
})

describe('laws', () => {
  const orders = fc.array(
    fc.tuple(fc.constantFrom(0, 700, 1900, 2550), fc.integer({ min: 1, max: 90_000 })),
    {
      minLength: 1,
      maxLength: 5,
    },
  )
  test('payments that make up the whole make up each rate and its tax, none of it negative', () => {
    fc.assert(
      fc.property(
        orders,
        fc.array(fc.integer({ min: 1, max: 100 }), { minLength: 1, maxLength: 5 }),
        (lines, cuts) => {
          const whole = taxParts(lines.map(([rate, gross]) => part(rate, gross)))
          const total = grossOf(whole)
          let before: TaxPart[] = []
          let left: number = total
          for (const [i, cut] of cuts.entries()) {
            const amount = i === cuts.length - 1 ? left : Math.floor((left * cut) / 101)
            left -= amount
            const parts = partsOfPayment({ whole, before, amount })
            expect(grossOf(parts)).toBe(amount)
            expect(parts.every(({ taxMinor, grossMinor }) => taxMinor >= 0 && taxMinor <= grossMinor)).toBe(
              true,
            )
            before = taxParts([...before, ...parts])
          }
          expect(
            lessParts(whole, before).every(({ grossMinor, taxMinor }) => grossMinor === 0 && taxMinor === 0),
          ).toBe(true)
          expect(taxOf(before)).toBe(taxOf(whole))
        },
      ),
    )
  })
})
