import { minor, type Minor } from '@/lib/core/brand'
import { exponentOf } from '@/lib/core/money/currency'
import { ok, refuse, type Result } from '@/lib/core/result'

const AMOUNT = /^(-?)([0-9]+)(?:[.,]([0-9]+))?$/

/**
 * An amount typed as plain digits: `[-]digits[(.|,)digits]`. One separator, which is the decimal one; no grouping,
 * no spaces, no sign of a currency: "1.000" in euros is refused as too precise and never read as a thousand or as one.
 * Domain:   an ISO 4217 currency → otherwise RangeError.
 * Refuses:  'not_a_number' for any other form; 'too_precise' for more digits than the minor unit has, even zeros;
 *           'too_large' beyond a safe integer of minor units.
 * Rounding: none.
 * Accuracy: exact; from text, never through floats. "-0" is 0.
 * @example  parseMoney('12,5', 'EUR')  // → ok(1250)
 * @example  parseMoney('1.5', 'JPY')  // → refuse('too_precise')
 * @example  parseMoney('1,250.00', 'USD')  // → refuse('not_a_number')
 */
export function parseMoney(
  text: string,
  code: string,
): Result<Minor, 'not_a_number' | 'too_precise' | 'too_large'> {
  const exponent = exponentOf(code)
  const [match, sign, whole = '', fraction = ''] = AMOUNT.exec(text) ?? []
  if (match === undefined) return refuse('not_a_number')
  if (fraction.length > exponent) return refuse('too_precise')
  const digits = `${whole}${fraction.padEnd(exponent, '0')}`.replace(/^0+(?=[0-9])/, '')
  const amount = digits.length > 16 ? Infinity : Number(digits)
  if (!Number.isSafeInteger(amount)) return refuse('too_large')
  return ok(minor(sign === '-' && amount !== 0 ? -amount : amount))
}
