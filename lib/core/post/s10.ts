import { isCountry } from '@/lib/core/data/country'
import { ok, refuse, type Result } from '@/lib/core/result'

/** A postal item's number: two letters of service, eight digits, a check digit, the country it was posted in. */
export type S10 = {
  /** The number as scanned and printed, without spaces, in capitals. */
  readonly number: string
  /** Service indicator: RR is registered, EE express, CP a parcel, LX tracked letter post. */
  readonly service: string
  /** The eight digits before the check digit, leading zeros kept. */
  readonly serial: string
  readonly checkDigit: number
  /** ISO 3166-1 alpha-2 of the country of posting. */
  readonly country: string
}

const WEIGHTS = [8, 6, 4, 2, 3, 5, 9, 7] as const

/**
 * The ninth digit of a postal item's number, by which a mistyped or misread digit is noticed.
 * Units:    the eight digits as text (leading zeros count).
 * Domain:   exactly eight digits → otherwise RangeError.
 * Accuracy: exact; every single wrong digit changes the result except where the rule maps two remainders to one digit
 *           (11 − S mod 11 = 10 becomes 0, 11 becomes 5).
 * Source:   Universal Postal Union, standard S10.
 * @example  s10CheckDigit('47312482')  // → 9
 */
export function s10CheckDigit(eightDigits: string): number {
  if (!/^[0-9]{8}$/.test(eightDigits)) {
    throw new RangeError(`s10CheckDigit: eightDigits must be eight digits, got ${eightDigits}`)
  }
  const sum = WEIGHTS.reduce((total, weight, i) => total + weight * Number(eightDigits[i]), 0)
  const rest = 11 - (sum % 11)
  return rest === 10 ? 0 : rest === 11 ? 5 : rest
}

/**
 * Reads a tracking number of the post as typed or scanned. Spaces and case are forgiven, nothing else.
 * Refuses:  'length' when it is not thirteen characters; 'characters' when they are not two letters, nine digits,
 *           two letters; 'country' when the last two are no ISO 3166-1 country; 'check_digit' when that digit is wrong.
 *           The first that applies, in this order.
 * Source:   Universal Postal Union, standard S10.
 * @example  parseS10('rr 4731 2482 9 gb')  // → ok({ number: 'RR473124829GB', service: 'RR', serial: '47312482', checkDigit: 9, country: 'GB' })
 * @example  parseS10('RR473124828GB')  // → refuse('check_digit')
 */
export function parseS10(text: string): Result<S10, 'length' | 'check_digit' | 'country' | 'characters'> {
  const number = text.replace(/\s/g, '').toUpperCase()
  if (number.length !== 13) return refuse('length')
  if (!/^[A-Z]{2}[0-9]{9}[A-Z]{2}$/.test(number)) return refuse('characters')
  const country = number.slice(11)
  if (!isCountry(country)) return refuse('country')
  const serial = number.slice(2, 10)
  const checkDigit = Number(number[10])
  if (s10CheckDigit(serial) !== checkDigit) return refuse('check_digit')
  return ok({ number, service: number.slice(0, 2), serial, checkDigit, country })
}
