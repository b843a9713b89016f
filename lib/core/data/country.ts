import { COUNTRIES, type CountryCode } from '@/lib/core/data/countries'

/**
 * Whether a text is an alpha-2 code that ISO 3166-1 has assigned, in capitals.
 * Source: ISO 3166-1; 249 codes. User-assigned ones (XK) are not among them.
 * @example isCountry('JP')  // → true
 * @example isCountry('jp')  // → false
 */
export function isCountry(code: string): code is CountryCode {
  return Object.hasOwn(COUNTRIES, code)
}

/**
 * The English short name of a country, for papers that want Latin letters; screens use the reader's language instead.
 * Domain: an assigned alpha-2 code → otherwise RangeError.
 * @example countryName('JP')  // → 'Japan'
 */
export function countryName(code: string): string {
  if (!isCountry(code))
    throw new RangeError(`countryName: code must be an ISO 3166-1 alpha-2 code, got ${code}`)
  return COUNTRIES[code].name
}
