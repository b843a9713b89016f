import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { withAttrition } from '@/lib/core/costs/attrition'
import { readDecimal, timesFraction } from '@/lib/core/costs/decimal'
import { cheapestPurchase, type Buy } from '@/lib/core/costs/purchase'
import { ok, refuse } from '@/lib/core/result'

const buy = (over: Partial<Buy> = {}): Buy => ({
  breaks: [
    { from: 1, unitPrice: '100' },
    { from: 100, unitPrice: '80' },
  ],
  moq: 1,
  multiple: 1,
  setup: 0,
  ...over,
})

describe('cheapestPurchase', () => {
  test('90 needed: 100 for 80.00 rather than 90 for 90.00 (arithmetic)', () =>
    expect(cheapestPurchase({ needed: 90, ...buy({ multiple: 10 }) })).toEqual(
      ok({ quantity: 100, unitPrice: '80', cost: 8000, leftover: 10 }),
    ))

  test.each([
    [79, { quantity: 79, unitPrice: '100', cost: 7900, leftover: 0 }],
    [80, { quantity: 100, unitPrice: '80', cost: 8000, leftover: 20 }],
    [100, { quantity: 100, unitPrice: '80', cost: 8000, leftover: 0 }],
    [0, { quantity: 0, unitPrice: '0', cost: 0, leftover: 0 }],
  ])('%i needed: a tie of totals goes to the larger quantity', (needed, value) =>
    expect(cheapestPurchase({ needed, ...buy() })).toEqual(ok(value)),
  )

  test('a minimum order, a multiple, a set-up and a first break all bind', () => {
    expect(cheapestPurchase({ needed: 3, ...buy({ moq: 15, multiple: 10, setup: 250 }) })).toEqual(
      ok({ quantity: 20, unitPrice: '100', cost: 2250, leftover: 17 }),
    )
    expect(cheapestPurchase({ needed: 3, ...buy({ breaks: [{ from: 25, unitPrice: '2' }] }) })).toEqual(
      ok({ quantity: 25, unitPrice: '2', cost: 50, leftover: 22 }),
    )
  })

  test('fractions of a cent are exact and rounded half-up once: 1,005 × 0.1 cent is 101', () => {
    const one = (unitPrice: string, needed: number) =>
      cheapestPurchase({ needed, ...buy({ breaks: [{ from: 1, unitPrice }] }) })
    expect(one('0.1', 1005)).toMatchObject({ value: { cost: 101 } })
    expect(one('0.1', 1004)).toMatchObject({ value: { cost: 100 } })
    expect(one('1.005', 100)).toMatchObject({ value: { cost: 101 } })
    expect(one('0.400000', 90)).toMatchObject({ value: { cost: 36 } })
  })

  test('refuses what nobody sells', () =>
    expect(cheapestPurchase({ needed: 1, ...buy({ breaks: [] }) })).toEqual(refuse('not_sold')))

  const quotes = fc
    .record({
      froms: fc.uniqueArray(fc.integer({ min: 1, max: 60 }), { minLength: 1, maxLength: 4 }),
      prices: fc.array(fc.integer({ min: 1, max: 400 }), { minLength: 4, maxLength: 4 }),
      moq: fc.integer({ min: 0, max: 40 }),
      multiple: fc.integer({ min: 1, max: 12 }),
      setup: fc.integer({ min: 0, max: 50 }),
    })
    .map(({ froms, prices, ...rest }) => ({
      ...rest,
      breaks: froms.map((from, i) => ({
        from,
        unitPrice: `${Math.floor(prices[i]! / 10)}.${prices[i]! % 10}`,
      })),
    }))

  /** Tries every quantity that is sold, in whole tenths of a minor unit. */
  function bruteForce(needed: number, { breaks, moq, multiple, setup }: Buy): number {
    let least = Infinity
    for (let quantity = multiple; quantity <= 200; quantity += multiple) {
      if (quantity < needed || quantity < moq) continue
      const price = breaks.filter(({ from }) => from <= quantity).sort((a, b) => b.from - a.from)[0]
      if (price === undefined) continue
      least = Math.min(
        least,
        Math.floor((quantity * Number(price.unitPrice.replace('.', '')) + 5) / 10) + setup,
      )
    }
    return least
  }

  test('no quantity that is sold costs less (every one tried)', () => {
    fc.assert(
      fc.property(quotes, fc.integer({ min: 1, max: 80 }), (quote, needed) => {
        const found = cheapestPurchase({ needed, ...quote })
        if (!found.ok) return false
        const { quantity, cost, leftover } = found.value
        expect(cost).toBe(bruteForce(needed, quote))
        return (
          quantity % quote.multiple === 0 &&
          quantity >= quote.moq &&
          leftover === quantity - needed &&
          leftover >= 0
        )
      }),
    )
  })

  test('needing more never costs less', () => {
    fc.assert(
      fc.property(quotes, fc.integer({ min: 0, max: 80 }), (quote, needed) => {
        const [less, more] = [
          cheapestPurchase({ needed, ...quote }),
          cheapestPurchase({ needed: needed + 1, ...quote }),
        ]
        return less.ok && more.ok && less.value.cost <= more.value.cost
      }),
    )
  })

  test.each<[string, { needed?: number } & Partial<Buy>]>([
    ['needed', { needed: -1 }],
    ['needed', { needed: 1.5 }],
    ['moq', { moq: -1 }],
    ['multiple', { multiple: 0 }],
    ['setup', { setup: 0.5 }],
    ['from', { breaks: [{ from: 0, unitPrice: '1' }] }],
    [
      'from',
      {
        breaks: [
          { from: 5, unitPrice: '1' },
          { from: 5, unitPrice: '2' },
        ],
      },
    ],
    ['unitPrice', { breaks: [{ from: 1, unitPrice: '-1' }] }],
    ['unitPrice', { breaks: [{ from: 1, unitPrice: '1e3' }] }],
    ['unitPrice', { breaks: [{ from: 1, unitPrice: '1,5' }] }],
  ])('throws on a wrong %s', (name, { needed = 1, ...over }) => {
    expect(() => cheapestPurchase({ needed, ...buy(over) })).toThrow(RangeError)
    expect(() => cheapestPurchase({ needed, ...buy(over) })).toThrow(name)
  })

  test('does not change what it is given', () => {
    const frozen = Object.freeze({
      needed: 5,
      ...buy({ breaks: Object.freeze([...buy().breaks].reverse()) as Buy['breaks'] }),
    })
    expect(cheapestPurchase(frozen)).toMatchObject({ ok: true })
  })
})

describe('withAttrition', () => {
  test.each([
    [100, 700, 0, 107],
    [100, 701, 0, 108],
    [100, 700, 20, 120],
    [0, 700, 5, 5],
    [1, 1, 0, 2],
  ])('%i at %i basis points, at least %i, is %i', (needed, basisPoints, atLeast, wanted) =>
    expect(withAttrition(needed, { basisPoints, atLeast })).toBe(wanted),
  )
  test.each([
    [-1, 0, 0],
    [1, 0.5, 0],
    [1, 0, NaN],
  ])('throws on %d, %d, %d', (needed, basisPoints, atLeast) =>
    expect(() => withAttrition(needed, { basisPoints, atLeast })).toThrow(RangeError),
  )
})

describe('exact decimals', () => {
  test('plain and big-integer arithmetic agree, with fractions by the hundredth', () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: 0n, max: 10n ** 12n }),
        fc.bigInt({ min: 1n, max: 10n ** 10n }),
        fc.integer({ min: 0, max: 1000 }),
        (top, bottom, factor) => {
          const exact = (2n * BigInt(factor) * top + bottom) / (2n * bottom)
          return (
            exact > BigInt(Number.MAX_SAFE_INTEGER) || timesFraction(top, bottom)(factor) === Number(exact)
          )
        },
      ),
    )
  })
  test('reads decimals as they are written', () => {
    expect(readDecimal('x', '007.2500')).toEqual({ digits: 725n, scale: 100n })
    expect(() => readDecimal('x', '')).toThrow(RangeError)
    expect(() => readDecimal('x', '.5')).toThrow(RangeError)
  })
  test('throws where the result is no safe integer', () =>
    expect(() => timesFraction(10n ** 15n, 1n)(10 ** 6)).toThrow(RangeError))
})
