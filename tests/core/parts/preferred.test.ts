import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { isPreferred, nearestPreferred, preferredValues, type Series } from '@/lib/core/parts/preferred'

const ALL: Series[] = ['E3', 'E6', 'E12', 'E24', 'E48', 'E96', 'E192']

describe('preferredValues', () => {
  // IEC 60063, printed tables.
  test('E24, E12, E6 and E3 as printed', () => {
    const e24 =
      '1.0 1.1 1.2 1.3 1.5 1.6 1.8 2.0 2.2 2.4 2.7 3.0 3.3 3.6 3.9 4.3 4.7 5.1 5.6 6.2 6.8 7.5 8.2 9.1'
    expect(preferredValues('E24')).toEqual(e24.split(' ').map(Number))
    expect(preferredValues('E12')).toEqual([1, 1.2, 1.5, 1.8, 2.2, 2.7, 3.3, 3.9, 4.7, 5.6, 6.8, 8.2])
    expect(preferredValues('E6')).toEqual([1, 1.5, 2.2, 3.3, 4.7, 6.8])
    expect(preferredValues('E3')).toEqual([1, 2.2, 4.7])
  })
  test('the first and last of E48 and E96, and the one exception of E192 (from memory)', () => {
    expect(preferredValues('E48').slice(0, 5)).toEqual([1, 1.05, 1.1, 1.15, 1.21])
    expect(preferredValues('E96').slice(-4)).toEqual([9.09, 9.31, 9.53, 9.76])
    expect(preferredValues('E192')).toContain(9.2)
    expect(preferredValues('E192')).not.toContain(9.19)
  })
  test.each(ALL)('%s has as many values as its name says, rising, below 10', (series) => {
    const values = preferredValues(series)
    expect(values).toHaveLength(Number(series.slice(1)))
    expect([...values].sort((a, b) => a - b)).toEqual(values)
    expect(new Set(values).size).toBe(values.length)
    expect(values.at(-1)).toBeLessThan(10)
  })
  test('throws on no series', () => expect(() => preferredValues('E7' as Series)).toThrow(RangeError))
})

describe('isPreferred and nearestPreferred', () => {
  test('decades and computed values', () => {
    expect(isPreferred(47 * 0.1, 'E12')).toBe(true)
    expect(isPreferred(4.7e-9, 'E12')).toBe(true)
    expect(isPreferred(5e3, 'E24')).toBe(false)
    expect(isPreferred(4.99e3, 'E96')).toBe(true)
  })
  test('the nearest by ratio, across the decade', () => {
    expect(nearestPreferred(9.6, 'E6')).toBe(10)
    expect(nearestPreferred(0.083, 'E6')).toBe(0.1)
    expect(nearestPreferred(8.2, 'E6')).toBe(6.8)
    expect(nearestPreferred(33_000, 'E96')).toBe(33_200)
  })
  test('is always of the series, itself when preferred, and no other value of it is nearer', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...ALL),
        fc.double({ min: 1e-12, max: 1e9, noNaN: true }),
        (series, value) => {
          const nearest = nearestPreferred(value, series)
          const distance = (each: number) => Math.abs(Math.log(each / value))
          const power = Math.floor(Math.log10(value))
          const others = [power - 1, power, power + 1].flatMap((p) =>
            preferredValues(series).map((v) => Number(`${v}e${p}`)),
          )
          return (
            isPreferred(nearest, series) &&
            nearestPreferred(nearest, series) === nearest &&
            others.every((each) => distance(nearest) <= distance(each) + 1e-9)
          )
        },
      ),
    )
  })
  test.each([0, -1, NaN, Infinity])('throws on %d', (value) => {
    expect(() => isPreferred(value, 'E24')).toThrow(RangeError)
    expect(() => nearestPreferred(value, 'E24')).toThrow(RangeError)
  })
})
