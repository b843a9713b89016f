import { minor, type Minor } from '@/lib/core/brand'
import { roundHalfUp } from '@/lib/core/money/round'

function assertBasisPoints(name: string, basisPoints: number): void {
  if (!Number.isSafeInteger(basisPoints) || basisPoints < 0) {
    throw new RangeError(`${name}: basisPoints must be a whole number ≥ 0, got ${basisPoints}`)
  }
}

/**
 * The tax contained in one line's gross amount. Called once per line, never on a sum of lines:
 * three lines of 1.03 at 20 % hold .17 each, .51 together, where the sum at once would say .52.
 * Units:    minor units; rate in basis points (19 % is 1900).
 * Domain:   gross a safe integer (negative for a credit), basisPoints whole ≥ 0 → otherwise RangeError.
 * Rounding: half away from zero, once per line.
 * Accuracy: exact before the rounding.
 * Source:   gross · rate / (100 % + rate), arithmetic.
 * @example  taxInGross(10000, 1900)  // → 1597
 */
export function taxInGross(gross: number, basisPoints: number): Minor {
  assertBasisPoints('taxInGross', basisPoints)
  return minor(roundHalfUp(BigInt(minor(gross)) * BigInt(basisPoints), 10_000n + BigInt(basisPoints)))
}

/**
 * The tax to add to one line's net amount. Called once per line.
 * Units:    minor units; rate in basis points (25.5 % is 2550).
 * Domain:   net a safe integer (negative for a credit), basisPoints whole ≥ 0 → otherwise RangeError.
 * Rounding: half away from zero, once per line.
 * Accuracy: exact before the rounding.
 * @example  taxOnNet(10000, 2550)  // → 2550
 */
export function taxOnNet(net: number, basisPoints: number): Minor {
  assertBasisPoints('taxOnNet', basisPoints)
  return minor(roundHalfUp(BigInt(minor(net)) * BigInt(basisPoints), 10_000n))
}
