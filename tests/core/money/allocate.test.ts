import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { allocate, divide } from '@/lib/core/money/allocate'
import { ok, refuse } from '@/lib/core/result'

const weights = fc
  .array(fc.nat({ max: 1000 }), { minLength: 1, maxLength: 8 })
  .filter((w) => w.some((x) => x > 0))
const values = (result: ReturnType<typeof allocate> | ReturnType<typeof divide>): number[] => {
  if (!result.ok) throw new Error(result.reason)
  return result.value
}
const sum = (parts: readonly number[]) => parts.reduce((a, b) => a + b, 0)

/** Sainte-Laguë seat by seat, as the definition reads. */
function seatBySeat(total: number, shares: readonly number[]): number[] {
  const given = shares.map(() => 0)
  for (let unit = 0; unit < total; unit++) {
    let best = 0
    for (let i = 1; i < shares.length; i++) {
      if (
        BigInt(shares[i]!) * BigInt(2 * given[best]! + 1) >
        BigInt(shares[best]!) * BigInt(2 * given[i]! + 1)
      )
        best = i
    }
    given[best]!++
  }
  return given
}

describe('allocate', () => {
  test('seats by largest remainder: 10 seats to 47000 16000 15800 12000 6100 3100 (Hare quota example, from memory)', () => {
    expect(allocate(10, [47000, 16000, 15800, 12000, 6100, 3100])).toEqual(ok([5, 2, 1, 1, 1, 0]))
  })

  // Arithmetic, reference values.
  test.each([
    [100, [1, 1, 1], [34, 33, 33]],
    [17, [1, 1, 4], [3, 3, 11]],
    [0, [1, 2], [0, 0]],
    [-100, [1, 1, 1], [-34, -33, -33]],
    [5, [0, 1, 0], [0, 5, 0]],
    [1, [1, 1], [1, 0]],
  ])('%i by %j', (total, by, parts) => {
    expect(allocate(total, by)).toEqual(ok(parts))
  })

  test('parts add up to the total, and each is within one unit of its exact share', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), weights, (total, by) => {
        const parts = values(allocate(total, by))
        expect(parts.reduce((a, b) => a + BigInt(b), 0n)).toBe(BigInt(total))
        const whole = BigInt(sum(by))
        parts.forEach((part, i) => {
          const off = BigInt(part) * whole - BigInt(total) * BigInt(by[i]!)
          expect(off < whole && off > -whole).toBe(true)
        })
      }),
    )
  })

  test('a weight of nothing gets nothing, and equal weights differ by one at most, the earlier not less', () => {
    fc.assert(
      fc.property(fc.nat({ max: 10_000 }), weights, (total, by) => {
        const parts = values(allocate(total, by))
        by.forEach((w, i) => {
          if (w === 0) expect(parts[i]).toBe(0)
          by.slice(i + 1).forEach((v, j) => {
            if (v === w) expect([0, 1]).toContain(parts[i]! - parts[i + 1 + j]!)
          })
        })
      }),
    )
  })

  test('does not change what it is given', () => {
    const by = Object.freeze([3, 1, 2])
    expect(values(allocate(7, by))).toHaveLength(3)
  })

  test.each([[[]], [[0]], [[0, 0, 0]]])('refuses %j', (by) => {
    expect(allocate(100, by)).toEqual(refuse('no_weight'))
    expect(divide(100, by)).toEqual(refuse('no_weight'))
  })

  test.each([
    ['total', 0.5, [1]],
    ['total', NaN, [1]],
    ['total', 2 ** 53, [1]],
    ['weights[1]', 1, [1, -1]],
    ['weights[0]', 1, [0.5]],
    ['weights[0]', 1, [NaN]],
  ])('throws for %s (%d, %j)', (argument, total, by) => {
    expect(() => allocate(total, by)).toThrow(RangeError)
    expect(() => divide(total, by)).toThrow(RangeError)
    expect(() => divide(total, by)).toThrow(argument)
  })
})

describe('divide', () => {
  test('10 by 1, 1, 4: quotients 4, 4/3, 1, 1, 4/5, 4/7, 4/9, 4/11, 1/3, 1/3 (by hand)', () => {
    expect(divide(10, [1, 1, 4])).toEqual(ok([2, 2, 6]))
  })

  test('the textbook case 53000 24000 23000, 7 seats: 3 2 2 (Sainte-Laguë by hand)', () => {
    // 53000/1 /3 /5 /7 = 53000 17667 10600 7571; 24000 8000; 23000 7667 → 53 24 23 17.7 10.6 8 7.667 → 3 2 2
    expect(divide(7, [53000, 24000, 23000])).toEqual(ok([3, 2, 2]))
  })

  test('is the same as giving out unit by unit', () => {
    fc.assert(
      fc.property(fc.nat({ max: 300 }), weights, (total, by) => {
        expect(divide(total, by)).toEqual(ok(seatBySeat(total, by)))
      }),
    )
  })

  test('no part shrinks as the total grows', () => {
    fc.assert(
      fc.property(fc.nat({ max: 1_000_000 }), weights, (total, by) => {
        const [less, more] = [values(divide(total, by)), values(divide(total + 1, by))]
        expect(sum(more)).toBe(total + 1)
        expect(more.every((part, i) => part >= less[i]!)).toBe(true)
      }),
    )
  })

  test('where the largest remainder does shrink a part (the Alabama paradox), divide does not', () => {
    // Weights 6, 6, 2 with 10 and 11 units: the classic example of the paradox (Balinski & Young, from memory).
    expect([values(allocate(10, [6, 6, 2]))[2], values(allocate(11, [6, 6, 2]))[2]]).toEqual([2, 1])
    expect(values(divide(11, [6, 6, 2]))[2]).toBeGreaterThanOrEqual(values(divide(10, [6, 6, 2]))[2]!)
  })

  test('throws for a negative total', () => {
    expect(() => divide(-1, [1])).toThrow(/total.*-1/)
  })
})
