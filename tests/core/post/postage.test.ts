import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { postage, volumetricGrams, type Zone } from '@/lib/core/post/postage'
import { ok, refuse } from '@/lib/core/result'

const small = {
  id: 'small',
  maxGrams: 2000,
  maxMm: 600,
  bands: [
    { upTo: 2000, price: 1800 },
    { upTo: 500, price: 700 },
  ],
}
const parcel = {
  id: 'parcel',
  maxGrams: 20000,
  maxMm: 1200,
  bands: [
    { upTo: 5000, price: 1800 },
    { upTo: 20000, price: 4100 },
  ],
}
const zones: Zone[] = [
  { id: 'eu', countries: ['FR', 'AT'], services: [small, parcel] },
  { id: 'world', countries: ['*'], services: [parcel] },
]
const size: [number, number, number] = [250, 150, 80]

describe('postage', () => {
  test.each([
    [500, 'small', 700],
    [501, 'small', 1800],
    [2001, 'parcel', 1800],
    [5000, 'parcel', 1800],
    [5001, 'parcel', 4100],
  ])('%i g within the zone: limits are inclusive, ties go to the earlier service', (grams, service, price) =>
    expect(postage(zones, 'FR', grams, size)).toEqual(ok({ zone: 'eu', service, price })),
  )

  test('a parcel too long for the cheap service takes the next', () =>
    expect(postage(zones, 'AT', 400, [100, 601, 20])).toEqual(
      ok({ zone: 'eu', service: 'parcel', price: 1800 }),
    ))

  test("'*' takes only countries no other zone names", () => {
    expect(postage(zones, 'US', 100, size)).toEqual(ok({ zone: 'world', service: 'parcel', price: 1800 }))
    expect(postage(zones.slice(0, 1), 'US', 100, size)).toEqual(refuse('no_zone'))
  })

  test('says what does not fit', () => {
    expect(postage(zones, 'FR', 20001, size)).toEqual(refuse('too_heavy'))
    expect(postage(zones, 'FR', 100, [1201, 10, 10])).toEqual(refuse('too_large'))
    expect(postage([{ id: 'x', countries: ['FR'], services: [] }], 'FR', 1, size)).toEqual(
      refuse('too_heavy'),
    )
  })

  test('a price list that ends below the service limit does not quote the gap', () => {
    const gap = { id: 'gap', maxGrams: 2000, maxMm: 600, bands: [{ upTo: 500, price: 700 }] }
    expect(postage([{ id: 'z', countries: ['FR'], services: [gap] }], 'FR', 900, size)).toEqual(
      refuse('too_heavy'),
    )
  })

  test.each([-1, NaN, Infinity])('throws on %d grams', (grams) =>
    expect(() => postage(zones, 'FR', grams, size)).toThrow(RangeError),
  )
  test('throws on a negative side and on a broken price', () => {
    expect(() => postage(zones, 'FR', 1, [1, -1, 1])).toThrow(RangeError)
    const broken = { ...small, bands: [{ upTo: 10, price: 1.5 }] }
    expect(() => postage([{ id: 'z', countries: ['FR'], services: [broken] }], 'FR', 1, size)).toThrow(
      RangeError,
    )
  })

  test('no service that fits is cheaper than the quote', () => {
    const band = fc.record({
      upTo: fc.integer({ min: 1, max: 3000 }),
      price: fc.integer({ min: 0, max: 5000 }),
    })
    const service = fc.record({
      id: fc.string(),
      maxGrams: fc.integer({ min: 1, max: 3000 }),
      maxMm: fc.integer({ min: 1, max: 900 }),
      bands: fc.array(band, { maxLength: 4 }),
    })
    fc.assert(
      fc.property(
        fc.array(service, { maxLength: 5 }),
        fc.integer({ min: 0, max: 3000 }),
        (services, grams) => {
          const quote = postage([{ id: 'z', countries: ['FR'], services }], 'FR', grams, [300, 10, 10])
          const prices = services
            .filter((s) => grams <= s.maxGrams && s.maxMm >= 300)
            .flatMap((s) => {
              const tops = s.bands.filter((b) => b.upTo >= grams)
              const least = Math.min(...tops.map((b) => b.upTo))
              return tops
                .filter((b) => b.upTo === least)
                .slice(0, 1)
                .map((b) => b.price)
            })
          return quote.ok ? quote.value.price === Math.min(...prices) : prices.length === 0
        },
      ),
    )
  })
})

describe('volumetricGrams', () => {
  test('140 × 100 × 90 cm over 6000 is 210 kg', () =>
    // Trade fact (common practice, no source).
    expect(volumetricGrams({ lengthMm: 1400, widthMm: 1000, heightMm: 900 }, 6000)).toBe(210_000))
  test('rounds up to a gram', () =>
    expect(volumetricGrams({ lengthMm: 10, widthMm: 10, heightMm: 10 }, 6000)).toBe(1))
  test.each([
    [{ lengthMm: -1, widthMm: 1, heightMm: 1 }, 5000],
    [{ lengthMm: 1, widthMm: NaN, heightMm: 1 }, 5000],
    [{ lengthMm: 1, widthMm: 1, heightMm: 1 }, 0],
  ])('throws on %o over %d', (sides, divisor) =>
    expect(() => volumetricGrams(sides, divisor)).toThrow(RangeError),
  )
})
