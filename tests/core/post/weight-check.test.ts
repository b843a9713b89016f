import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { weightCheck } from '@/lib/core/post/weight-check'

// The tolerance is our own rule (5 %, at least 20 g); the values below follow from it by hand.
describe('weightCheck', () => {
  test.each([
    { expectedGrams: 420, grams: 420, isSurprising: false },
    { expectedGrams: 420, grams: 441, isSurprising: false }, // 5 % of 420 is 21
    { expectedGrams: 420, grams: 442, isSurprising: true },
    { expectedGrams: 420, grams: 399, isSurprising: false },
    { expectedGrams: 420, grams: 398, isSurprising: true },
    { expectedGrams: 150, grams: 170, isSurprising: false }, // at least 20 g
    { expectedGrams: 150, grams: 171, isSurprising: true },
    { expectedGrams: 421, grams: 443, isSurprising: false }, // 21.05 g, up to 22
  ])('$grams g where $expectedGrams g were expected', ({ isSurprising, ...weights }) => {
    expect(weightCheck({ ...weights, lightestGrams: 100 }).isSurprising).toBe(isSurprising)
  })

  test('a missing piece of the lightest line is noticed only above the tolerance', () => {
    const parcel = { expectedGrams: 2000, grams: 2000 }
    expect(weightCheck({ ...parcel, lightestGrams: 100 }).noticesLightest).toBe(false)
    expect(weightCheck({ ...parcel, lightestGrams: 101 }).noticesLightest).toBe(true)
  })

  test('when a parcel says it notices the lightest piece, taking one out surprises', () => {
    const weights = fc.record({
      lightestGrams: fc.integer({ min: 1, max: 999 }),
      rest: fc.integer({ min: 1, max: 9999 }),
    })
    fc.assert(
      fc.property(weights, ({ lightestGrams, rest }) => {
        const expectedGrams = lightestGrams + rest
        const { noticesLightest, isSurprising } = weightCheck({ expectedGrams, grams: rest, lightestGrams })
        expect(isSurprising).toBe(noticesLightest)
      }),
    )
  })

  test.each([{ expectedGrams: 0 }, { grams: 0 }, { grams: -1 }, { lightestGrams: Number.NaN }])(
    'throws for %o',
    (wrong) => {
      expect(() => weightCheck({ expectedGrams: 1, grams: 1, lightestGrams: 1, ...wrong })).toThrow(
        RangeError,
      )
    },
  )
})
