import { exponentOf } from '@/lib/core/money/currency'
import { plainMoney } from '@/lib/core/money/plain'

/**
 * An amount as a person of a locale writes it, always with all digits of the ISO minor unit.
 * Units:    minor units in; text out (it may hold no-break spaces).
 * Domain:   a safe integer, an ISO 4217 currency, a well-formed locale tag → otherwise RangeError.
 * Accuracy: exact: digits are handed to the formatter as text, never as a float.
 * @example  formatMoney(1890050, 'USD', 'en')  // → '$18,900.50'
 * @example  formatMoney(2500, 'HUF', 'en')  // → 'HUF\u00a025.00'
 */
export function formatMoney(minor: number, code: string, locale: string): string {
  const digits = exponentOf(code)
  const format = new Intl.NumberFormat(locale, {
    style: 'currency',
    currency: code,
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  })
  return format.format(plainMoney(minor, code))
}
