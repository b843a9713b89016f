import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { roundHalfEven, roundHalfUp } from '@/lib/core/money/round'

describe('rounding', () => {
  // By definition of the two modes.
  test.each([
    [1, 2, 1, 0],
    [3, 2, 2, 2],
    [5, 2, 3, 2],
    [7, 2, 4, 4],
    [-1, 2, -1, 0],
    [-3, 2, -2, -2],
    [-5, 2, -3, -2],
    [5, -2, -3, -2],
    [7, 3, 2, 2],
    [8, 3, 3, 3],
    [-8, 3, -3, -3],
    [0, 5, 0, 0],
    [700, 100, 7, 7],
  ])('%i/%i', (n, d, up, even) => {
    expect(roundHalfUp(n, d)).toBe(up)
    expect(roundHalfEven(n, d) + 0).toBe(even)
  })

  test('both are a nearest whole number, and differ only at a half', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), fc.integer({ min: 1, max: 1_000_000 }), (n, d) => {
        const [up, even] = [BigInt(roundHalfUp(n, d)), BigInt(roundHalfEven(n, d))]
        const off = (whole: bigint) => {
          const twice = 2n * (BigInt(n) - whole * BigInt(d))
          return twice < 0n ? -twice : twice
        }
        expect(off(up) <= BigInt(d) && off(even) <= BigInt(d)).toBe(true)
        if (up !== even) expect([off(up), even % 2n]).toEqual([BigInt(d), 0n])
      }),
    )
  })

  test('a half goes away from zero on either side, to the even neighbour on either side', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1_000_000, max: 1_000_000 }), (k) => {
        const half = 2 * k + 1
        expect(Math.abs(roundHalfUp(half, 2))).toBe(Math.ceil(Math.abs(half) / 2))
        expect(Math.abs(roundHalfEven(half, 2)) % 2).toBe(0)
      }),
    )
  })

  test('takes products beyond a safe integer as bigint (value by exact fractions in Python)', () => {
    expect(roundHalfUp(BigInt(Number.MAX_SAFE_INTEGER) * 1900n, 11900n)).toBe(1_438_124_250_756_965)
  })

  test.each([
    [1, 0],
    [1n, 0n],
    [0.5, 1],
    [1, 0.5],
    [NaN, 1],
    [2 ** 53, 1],
    [10n ** 30n, 1n],
  ])('throws for %s/%s', (n, d) => {
    expect(() => roundHalfUp(n, d)).toThrow(RangeError)
    expect(() => roundHalfEven(n, d)).toThrow(RangeError)
  })
})
