import { minor, type Minor } from '@/lib/core/brand'
import { exponentOf } from '@/lib/core/money/currency'
import {
  PROVIDER_MAXIMUM,
  PROVIDER_MINIMUM,
  PROVIDER_TWO_DECIMALS_OF_ZERO,
  PROVIDER_ZERO_DECIMAL,
} from '@/lib/core/money/provider-rules'
import { roundHalfUp } from '@/lib/core/money/round'
import { ok, refuse, type Result } from '@/lib/core/result'

/** How many decimals the provider's amounts have in a currency, where it differs from ISO 4217. */
function providerDecimals(code: string): number {
  const exponent = exponentOf(code)
  if (PROVIDER_ZERO_DECIMAL.includes(code)) return 0
  return PROVIDER_TWO_DECIMALS_OF_ZERO.includes(code) ? 2 : exponent
}

/** The provider's amount, if it has one: three-decimal amounts must end in 0 and four decimals do not exist there. */
function represent(amount: number, code: string): Result<number, 'not_representable'> {
  const shift = providerDecimals(code) - exponentOf(code)
  const scaled = shift >= 0 ? minor(amount) * 10 ** shift : minor(amount) / 10 ** -shift
  if (!Number.isSafeInteger(scaled) || exponentOf(code) === 4) return refuse('not_representable')
  if (exponentOf(code) === 3 && scaled % 10 !== 0) return refuse('not_representable')
  return ok(scaled)
}

/**
 * The amount to ask the payment provider for: its decimals are a second table, not ISO's
 * (MGA has none there, ISK and UGX have two that must be 00, three-decimal amounts end in 0).
 * Checked when a price is set, so that no buyer meets the refusal.
 * Units:    ISO minor units in, the provider's units out.
 * Domain:   a safe integer, an ISO 4217 currency → otherwise RangeError.
 * Refuses:  'not_representable' when the provider cannot write the amount; 'below_minimum' under its smallest charge
 *           (0 and less always); 'above_maximum' over its largest.
 * Source:   the provider's public API documentation; see provider-rules.ts for what is from memory.
 * @example  toProvider(2500, 'EUR')  // → ok(2500)
 * @example  toProvider(2500, 'ISK')  // → ok(250000)
 * @example  toProvider(5125, 'KWD')  // → refuse('not_representable')
 */
export function toProvider(
  minor: number,
  code: string,
): Result<number, 'below_minimum' | 'above_maximum' | 'not_representable'> {
  const amount = represent(minor, code)
  if (!amount.ok) return amount
  if (amount.value < Math.max(1, PROVIDER_MINIMUM[code] ?? 1)) return refuse('below_minimum')
  return amount.value > (PROVIDER_MAXIMUM[code] ?? PROVIDER_MAXIMUM.others) ? refuse('above_maximum') : amount
}

/**
 * The amount of a refund in the provider's units: as for a charge, but any positive part may go back.
 * Domain:  a safe integer > 0, an ISO 4217 currency → otherwise RangeError.
 * Refuses: 'not_representable' when the provider cannot write the amount.
 * @example refundToProvider(20, 'EUR')  // → ok(20)
 */
export function refundToProvider(amount: number, code: string): Result<number, 'not_representable'> {
  if (!(amount > 0)) throw new RangeError(`refundToProvider: amount must be > 0, got ${amount}`)
  return represent(amount, code)
}

/**
 * An amount of the provider's lists and events in ISO minor units; the inverse of `toProvider`.
 * Units:  the provider's units in (negative where money left), ISO minor units out.
 * Domain: a safe integer that the currency can carry (ISK and UGX end in 00) → otherwise RangeError.
 * @example fromProvider(250000, 'ISK')  // → 2500
 * @example fromProvider(7, 'MGA')  // → 700
 */
export function fromProvider(amount: number, code: string): Minor {
  const shift = exponentOf(code) - providerDecimals(code)
  const scaled = shift >= 0 ? minor(amount) * 10 ** shift : minor(amount) / 10 ** -shift
  if (!Number.isSafeInteger(scaled)) {
    throw new RangeError(`fromProvider: amount must be whole in ${code}, got ${amount}`)
  }
  return minor(scaled)
}

/** What a payment provider keeps of one charge: a share and a fixed sum. */
export type ProcessingFee = { readonly basisPoints: number; readonly fixed: number }

/**
 * The provider's fee for one charge: its share of the amount and its fixed sum.
 * A payment that is not made costs nothing: do not ask for it.
 * Units:    minor units of the charge's currency; share in basis points.
 * Domain:   amount and fixed safe integers ≥ 0, basisPoints whole ≥ 0 → otherwise RangeError.
 * Rounding: the share half away from zero, once.
 * @example  processingFee(2500, { basisPoints: 150, fixed: 25 })  // → 63
 */
export function processingFee(amount: number, { basisPoints, fixed }: ProcessingFee): Minor {
  for (const [name, value] of Object.entries({ amount, basisPoints, fixed })) {
    if (!Number.isSafeInteger(value) || value < 0) {
      throw new RangeError(`processingFee: ${name} must be a whole number ≥ 0, got ${value}`)
    }
  }
  return minor(roundHalfUp(BigInt(amount) * BigInt(basisPoints), 10_000) + fixed)
}
