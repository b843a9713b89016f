import { minor } from '@/lib/core/brand'
import { exponentOf } from '@/lib/core/money/currency'

/**
 * An amount as plain digits with a point before the minor unit and nothing else, as `parseMoney` reads it back.
 * For CSV, form fields and machine-read papers; a person is shown `formatMoney`.
 * Domain: a safe integer and an ISO 4217 currency → otherwise RangeError.
 * Accuracy: exact, no floats.
 * @example plainMoney(-5, 'EUR')  // → '-0.05'
 * @example plainMoney(1250, 'JPY')  // → '1250'
 */
export function plainMoney(amount: number, code: string): `${number}` {
  const exponent = exponentOf(code)
  const digits = String(Math.abs(minor(amount))).padStart(exponent + 1, '0')
  const whole = digits.slice(0, digits.length - exponent)
  const fraction = exponent > 0 ? `.${digits.slice(-exponent)}` : ''
  return `${amount < 0 ? '-' : ''}${whole}${fraction}` as `${number}`
}
