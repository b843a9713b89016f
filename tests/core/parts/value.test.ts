import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { preferredValues } from '@/lib/core/parts/preferred'
import { formatValue, parseValue, readPart, type PartKind } from '@/lib/core/parts/value'
import { ok, refuse } from '@/lib/core/result'

describe('parseValue', () => {
  // IEC 60062 (RKM code), as printed in the standard's tables; plain forms as makers write them.
  test.each<[string, PartKind, number]>([
    ['R47', 'resistance', 0.47],
    ['4R7', 'resistance', 4.7],
    ['470R', 'resistance', 470],
    ['4K7', 'resistance', 4700],
    ['4k7', 'resistance', 4700],
    ['47K3', 'resistance', 47_300],
    ['4M7', 'resistance', 4_700_000],
    ['1M5', 'resistance', 1_500_000],
    ['0R1', 'resistance', 0.1],
    ['0R', 'resistance', 0],
    ['0', 'resistance', 0],
    ['1G', 'resistance', 1e9],
    ['10m', 'resistance', 0.01],
    ['2R2', 'resistance', 2.2],
    ['470', 'resistance', 470],
    ['4.7k', 'resistance', 4700],
    ['4,7 kΩ', 'resistance', 4700],
    ['4.7 kOhm', 'resistance', 4700],
    ['100 Ω', 'resistance', 100],
    ['100ohms', 'resistance', 100],
    ['.5', 'resistance', 0.5],
    ['4k7Ω', 'resistance', 4700],
    ['p33', 'capacitance', 0.33e-12],
    ['3p3', 'capacitance', 3.3e-12],
    ['4n7', 'capacitance', 4.7e-9],
    ['2u2', 'capacitance', 2.2e-6],
    ['2µ2', 'capacitance', 2.2e-6],
    ['100n', 'capacitance', 1e-7],
    ['0.1uF', 'capacitance', 1e-7],
    ['10 µF', 'capacitance', 1e-5],
    ['10 μF', 'capacitance', 1e-5],
    ['0,1 uF', 'capacitance', 1e-7],
    ['1F0', 'capacitance', 1],
    ['0.47F', 'capacitance', 0.47],
    ['1mF', 'capacitance', 1e-3],
    ['104', 'capacitance', 1e-7],
    ['222', 'capacitance', 2.2e-9],
    ['470', 'capacitance', 47e-12],
    ['479', 'capacitance', 4.7e-12],
    ['100nF', 'capacitance', 1e-7],
    ['470pF', 'capacitance', 470e-12],
    ['4R7', 'inductance', 4.7e-6],
    ['R47', 'inductance', 0.47e-6],
    ['10uH', 'inductance', 10e-6],
    ['2m2', 'inductance', 2.2e-3],
    ['100 nH', 'inductance', 1e-7],
    ['101', 'inductance', 100e-6],
    ['1H', 'inductance', 1],
    ['  4K7  ', 'resistance', 4700],
    ['+10k', 'resistance', 10_000],
  ])('%s as %s is %d', (text, kind, value) => expect(parseValue(text, kind)).toEqual(ok(value)))

  test.each<[string, PartKind, 'unreadable' | 'negative']>([
    ['', 'resistance', 'unreadable'],
    ['R', 'resistance', 'unreadable'],
    ['k', 'resistance', 'unreadable'],
    ['4.7k7', 'resistance', 'unreadable'],
    ['4.7.1', 'resistance', 'unreadable'],
    ['1,000.5', 'resistance', 'unreadable'],
    ['4k7 5%', 'resistance', 'unreadable'],
    ['4K7x', 'resistance', 'unreadable'],
    ['4n7', 'resistance', 'unreadable'],
    ['10', 'capacitance', 'unreadable'],
    ['0.1', 'capacitance', 'unreadable'],
    ['1042', 'capacitance', 'unreadable'],
    ['1M', 'capacitance', 'unreadable'],
    ['DNP', 'capacitance', 'unreadable'],
    ['TL072', 'resistance', 'unreadable'],
    ['1e3', 'capacitance', 'unreadable'],
    ['-4k7', 'resistance', 'negative'],
    ['−10 µF', 'capacitance', 'negative'],
  ])('%j as %s is refused: %s', (text, kind, reason) =>
    expect(parseValue(text, kind)).toEqual(refuse(reason)),
  )
})

describe('formatValue', () => {
  test.each<[number, PartKind, string]>([
    [4700, 'resistance', '4K7'],
    [0.47, 'resistance', 'R47'],
    [0.1, 'resistance', 'R1'],
    [0.005, 'resistance', 'R005'],
    [0, 'resistance', '0R'],
    [47_300, 'resistance', '47K3'],
    [1e7, 'resistance', '10M'],
    [0.33e-12, 'capacitance', 'p33'],
    [2.2e-6, 'capacitance', '2u2'],
    [1e-7, 'capacitance', '100n'],
    [4.7e-6, 'inductance', '4u7'],
    [1, 'capacitance', '1F'],
  ])('%d as %s is %s', (value, kind, text) => expect(formatValue(value, kind)).toBe(text))

  test('parse after format is the identity on every value of every E series in every decade', () => {
    const decades: [PartKind, number, number][] = [
      ['resistance', -2, 7],
      ['capacitance', -13, -1],
      ['inductance', -10, 0],
    ]
    for (const [kind, low, high] of decades) {
      for (const mantissa of [...preferredValues('E24'), ...preferredValues('E192')]) {
        for (let power = low; power <= high; power++) {
          const value = Number(`${mantissa}e${power}`)
          expect(parseValue(formatValue(value, kind), kind)).toEqual(ok(value))
        }
      }
    }
  })

  test('and on any other value', () => {
    const value = fc.double({ min: 1e-3, max: 1e13, noNaN: true })
    fc.assert(
      fc.property(value, (si) => {
        expect(parseValue(formatValue(si, 'resistance'), 'resistance')).toEqual(ok(si))
      }),
    )
  })
  test.each([-1, NaN, Infinity])('throws on %d', (si) =>
    expect(() => formatValue(si, 'resistance')).toThrow(RangeError),
  )
})

describe('readPart', () => {
  test.each<[string, PartKind, object]>([
    ['B100K', 'resistance', { value: 100_000, taper: 'B', rest: '' }],
    ['A10k', 'resistance', { value: 10_000, taper: 'A', rest: '' }],
    ['100KB', 'resistance', { value: 100_000, taper: 'B', rest: '' }],
    ['10k log', 'resistance', { value: 10_000, taper: 'A', rest: '' }],
    ['10u/50V', 'capacitance', { value: 1e-5, volts: 50, rest: '' }],
    ['10µF 6V3', 'capacitance', { value: 1e-5, volts: 6.3, rest: '' }],
    ['100n X7R 5%', 'capacitance', { value: 1e-7, dielectric: 'X7R', tolerancePercent: 5, rest: '' }],
    ['22p NP0 50 V', 'capacitance', { value: 22e-12, dielectric: 'C0G', volts: 50, rest: '' }],
    ['104K 50V', 'capacitance', { value: 1e-7, tolerancePercent: 10, volts: 50, rest: '' }],
    ['4k7 1% 1/4W', 'resistance', { value: 4700, tolerancePercent: 1, watts: 0.25, rest: '' }],
    ['4,7 kΩ ±0,1 %', 'resistance', { value: 4700, tolerancePercent: 0.1, rest: '' }],
    ['10R 250mW', 'resistance', { value: 10, watts: 0.25, rest: '' }],
    ['100n, film, 5 mm', 'capacitance', { value: 1e-7, rest: 'film 5 mm' }],
    ['4u7 J', 'capacitance', { value: 4.7e-6, tolerancePercent: 5, rest: '' }],
  ])('%s', (text, kind, reading) => expect(readPart(text, kind)).toEqual(ok(reading)))

  test.each<[string, PartKind, 'unreadable' | 'negative']>([
    ['4k7x', 'resistance', 'unreadable'],
    ['X7R', 'capacitance', 'unreadable'],
    ['', 'inductance', 'unreadable'],
    ['-1k 5%', 'resistance', 'negative'],
  ])('%j is refused: %s', (text, kind, reason) => expect(readPart(text, kind)).toEqual(refuse(reason)))
})
