import { exponentOf } from '@/lib/core/money/currency'
import { ok, refuse, type Result } from '@/lib/core/result'

/** Digits behind the minor unit's point that are kept, as the quotes are stored. */
const PLACES = 6

/**
 * A price of one piece typed in major units, as the decimal string of minor units that costs are computed from. Parts
 * cost fractions of a cent, so it may be finer than the currency.
 * Domain:  an ISO 4217 currency → otherwise RangeError.
 * Refuses: 'not_a_price' for anything but plain digits with one separator, more than nine digits before it, or finer than
 *          a millionth of the minor unit.
 * Rounding: none.
 * Accuracy: exact; from text, never through floats.
 * @example  readUnitPrice('0,0041', 'EUR')  // → ok('0.41')
 * @example  readUnitPrice('12', 'JPY')  // → ok('12')
 * @example  readUnitPrice('1.000,00', 'EUR')  // → refuse('not_a_price')
 */
export function readUnitPrice(text: string, code: string): Result<string, 'not_a_price'> {
  const exponent = exponentOf(code)
  const [match, whole = '', fraction = ''] = /^([0-9]{1,9})(?:[.,]([0-9]+))?$/.exec(text.trim()) ?? []
  if (match === undefined || fraction.length > exponent + PLACES) return refuse('not_a_price')
  const digits = fraction.padEnd(exponent, '0')
  return ok(plain(`${whole}${digits.slice(0, exponent)}`, digits.slice(exponent)))
}

/**
 * A price of one piece in major units for a form field; `readUnitPrice` reads it back.
 * Domain:  a decimal string of minor units ≥ 0, an ISO 4217 currency → otherwise RangeError.
 * @example  writeUnitPrice('0.41', 'EUR')  // → '0.0041'
 * @example  writeUnitPrice('1250.000000', 'EUR')  // → '12.50'
 */
export function writeUnitPrice(minorPrice: string, code: string): string {
  const exponent = exponentOf(code)
  const [match, whole = '', fraction = ''] = /^([0-9]+)(?:\.([0-9]+))?$/.exec(minorPrice) ?? []
  if (match === undefined)
    throw new RangeError(`writeUnitPrice: minorPrice must be a decimal such as '0.4', got ${minorPrice}`)
  const digits = whole.padStart(exponent + 1, '0')
  const at = digits.length - exponent
  const behind = digits.slice(at) + fraction.replace(/0+$/, '')
  return behind === '' ? digits : `${digits.slice(0, at)}.${behind}`
}

function plain(whole: string, fraction: string): string {
  const ahead = whole.replace(/^0+(?=[0-9])/, '')
  const behind = fraction.replace(/0+$/, '')
  return behind === '' ? ahead : `${ahead}.${behind}`
}
