import { readDecimal } from '@/lib/core/costs/decimal'
import { roundHalfUp } from '@/lib/core/money/round'
import { wholeFrom } from '@/lib/core/stats/argument'

/** Multiplies amounts and prices by the same share. */
export type Scaled = {
  /** Whole minor units, rounded half-up. */
  readonly whole: (amount: number) => number
  /** A price below a minor unit, exactly. */
  readonly exact: (price: string) => string
}

/**
 * How amounts and prices look at another level: 110 is a tenth more, 90 a tenth less.
 * Units:    hundredths of what it was; minor units; decimal strings of minor units.
 * Domain:   whole hundredths ≥ 0; decimals without sign → otherwise RangeError.
 * @example  scaled(110).exact('1.25')  // → '1.3750'
 */
export function scaled(hundredths: number): Scaled {
  wholeFrom(0, 'scaled: hundredths', hundredths)
  return {
    whole: (amount) => roundHalfUp(amount * hundredths, 100),
    exact: (price) => {
      const { digits, scale } = readDecimal('scaled: price', price)
      const places = String(scale).length + 1
      const text = String(digits * BigInt(hundredths)).padStart(places + 1, '0')
      return `${text.slice(0, -places)}.${text.slice(-places)}`
    },
  }
}
