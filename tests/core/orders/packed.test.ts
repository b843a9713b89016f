import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { packedTogether } from '@/lib/core/orders/packed'

const piece = fc.record({
  quantity: fc.integer({ min: 1, max: 10 }),
  grams: fc.integer({ min: 1, max: 5000 }),
  sizeMm: fc.tuple(
    fc.integer({ min: 1, max: 900 }),
    fc.integer({ min: 1, max: 900 }),
    fc.integer({ min: 1, max: 900 }),
  ),
})

describe('packedTogether', () => {
  test('one piece is itself, its longest side first', () => {
    expect(packedTogether([{ quantity: 1, grams: 420, sizeMm: [60, 200, 140] }])).toEqual({
      grams: 420,
      sizeMm: [200, 140, 60],
    })
  })

  test('a parcel holds the volume of its pieces, and each of them lengthwise and crosswise', () => {
    fc.assert(
      fc.property(fc.array(piece, { minLength: 1, maxLength: 4 }), (pieces) => {
        const { grams, sizeMm } = packedTogether(pieces)
        const volume = pieces.reduce((sum, { quantity, sizeMm: [a, b, c] }) => sum + quantity * a * b * c, 0)
        expect(sizeMm[0] * sizeMm[1] * sizeMm[2]).toBeGreaterThanOrEqual(volume - 1e-6 * volume)
        expect(sizeMm[0]).toBeGreaterThanOrEqual(Math.max(...pieces.flatMap((each) => each.sizeMm)))
        expect(sizeMm[0]).toBeGreaterThanOrEqual(sizeMm[2])
        expect(grams).toBe(pieces.reduce((sum, each) => sum + each.quantity * each.grams, 0))
      }),
    )
  })

  test.each([
    ['pieces', []],
    ['quantity', [{ quantity: 0, grams: 1, sizeMm: [1, 1, 1] as const }]],
    ['quantity', [{ quantity: 1.5, grams: 1, sizeMm: [1, 1, 1] as const }]],
    ['grams', [{ quantity: 1, grams: 0, sizeMm: [1, 1, 1] as const }]],
    ['sizeMm', [{ quantity: 1, grams: 1, sizeMm: [1, Number.NaN, 1] as const }]],
  ])('a caller’s mistake with %s is thrown', (name, pieces) => {
    expect(() => packedTogether(pieces)).toThrow(new RegExp(`RangeError|${name}`))
    expect(() => packedTogether(pieces)).toThrow(RangeError)
  })
})
