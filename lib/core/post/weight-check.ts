/** What the scale says about a parcel. */
export type WeightCheck = {
  /** Weighed less expected, grams. */
  readonly differenceGrams: number
  /** Difference that wrapping and scale explain, grams. */
  readonly toleranceGrams: number
  readonly isSurprising: boolean
  /** False where a missing piece of the lightest line would stay within the tolerance. */
  readonly noticesLightest: boolean
}

/** Share of the expected weight that wrapping makes uncertain, in percent. Own rule, until first parcels teach better. */
const TOLERANCE_PERCENT = 5
/** Least tolerance in grams: tape, a label and a kitchen scale that shows whole grams. Own rule. */
const LEAST_TOLERANCE_G = 20

/**
 * Whether a packed parcel weighs what its lines should weigh together; a missing or wrong piece shows on the scale.
 * Units:    whole grams; lightestGrams is one piece of the lightest line.
 * Domain:   all > 0 and finite → otherwise RangeError.
 * Rounding: the tolerance up to a whole gram.
 * Source:   own rule: 5 % of the expected weight, at least 20 g; common practice, no source.
 * @example weightCheck({ expectedGrams: 840, grams: 425, lightestGrams: 420 })  // → { differenceGrams: -415, toleranceGrams: 42, isSurprising: true, noticesLightest: true }
 * @example weightCheck({ expectedGrams: 1000, grams: 1050, lightestGrams: 40 })  // → { differenceGrams: 50, toleranceGrams: 50, isSurprising: false, noticesLightest: false }
 */
export function weightCheck(parcel: {
  readonly expectedGrams: number
  readonly grams: number
  readonly lightestGrams: number
}): WeightCheck {
  for (const [name, grams] of Object.entries(parcel)) {
    if (!(grams > 0) || !Number.isFinite(grams))
      throw new RangeError(`weightCheck: ${name} must be above 0, got ${grams}`)
  }
  const toleranceGrams = Math.max(
    LEAST_TOLERANCE_G,
    Math.ceil((parcel.expectedGrams * TOLERANCE_PERCENT) / 100),
  )
  const differenceGrams = parcel.grams - parcel.expectedGrams
  return {
    differenceGrams,
    toleranceGrams,
    isSurprising: Math.abs(differenceGrams) > toleranceGrams,
    noticesLightest: parcel.lightestGrams > toleranceGrams,
  }
}
