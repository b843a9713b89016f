import { CURRENCIES, type CurrencyCode } from '@/lib/core/data/currencies'

/**
 * Whether a text is a currency in which something can be priced: an ISO 4217 code, in capitals, that has a minor unit.
 * Metals, accounting units and "no currency" (XAU, XDR, XXX …) are not; withdrawn codes of recent years still are,
 * so that old amounts can be read.
 * Source: ISO 4217, see lib/core/data/currencies.ts.
 * @example  isCurrency('EUR')  // → true
 * @example  isCurrency('XAU')  // → false
 */
export function isCurrency(code: string): code is CurrencyCode {
  return Object.hasOwn(CURRENCIES, code)
}

/**
 * How many decimal digits the minor unit of a currency has: 2 for cents, 0 for yen, 3 for fils.
 * Domain: a code for which `isCurrency` holds → otherwise RangeError.
 * Source: ISO 4217; never `Intl`, which gives display digits (0 for HUF, IDR, COP …, where the standard has 2).
 * @example  exponentOf('JPY')  // → 0
 * @example  exponentOf('KWD')  // → 3
 */
export function exponentOf(code: string): 0 | 2 | 3 | 4 {
  if (!isCurrency(code)) throw new RangeError(`exponentOf: code must be an ISO 4217 currency, got ${code}`)
  return CURRENCIES[code].exponent
}
