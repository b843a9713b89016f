import { positive, wholeFrom } from '../stats/argument'
import type { Conversion } from './group'

export type { Conversion } from './group'

/** How sure a person said they were when signing up. */
export type Certainty = 'certain' | 'likely' | 'curious'

/** The classes whose conversion the workshop learns. */
export type ConversionClass = Certainty | 'depositHolder' | 'oldSignUp'

/**
 * What to believe about each class before the workshop has a history: of ten `certain` people six place a deposit, of
 * ten `likely` three, of twelve `curious` one; of forty deposit holders thirty-eight pay; sign-ups older than 90 days
 * one in ten whatever they said. Each weighs as much as ten to forty people seen, and a first closed run outweighs it.
 * Source: our own values; common practice, no source. Replaced by the workshop's history through `updateConversion`.
 * @example STARTING_CONVERSION.certain  // → { alpha: 6, beta: 4 }
 */
export const STARTING_CONVERSION: Readonly<Record<ConversionClass, Conversion>> = {
  certain: { alpha: 6, beta: 4 },
  likely: { alpha: 3, beta: 7 },
  curious: { alpha: 1, beta: 11 },
  depositHolder: { alpha: 38, beta: 2 },
  oldSignUp: { alpha: 1, beta: 9 },
}

/**
 * After how many days a sign-up counts as old.
 * Units: days. Source: our own value; common practice, no source.
 * @example OLD_AFTER_DAYS  // → 90
 */
export const OLD_AFTER_DAYS = 90

/**
 * What to believe after seeing how many converted and how many did not.
 * Domain: alpha, beta > 0; whole counts ≥ 0 → otherwise RangeError.
 * Source: conjugate update, Gelman et al., *Bayesian Data Analysis* (3rd ed., 2013), section 2.4.
 * @example updateConversion({ alpha: 1, beta: 1 }, { converted: 12, notConverted: 28 })  // → { alpha: 13, beta: 29 }
 */
export function updateConversion(
  { alpha, beta }: Conversion,
  { converted, notConverted }: { readonly converted: number; readonly notConverted: number },
): Conversion {
  return {
    alpha: positive('alpha', alpha) + wholeFrom(0, 'converted', converted),
    beta: positive('beta', beta) + wholeFrom(0, 'notConverted', notConverted),
  }
}
