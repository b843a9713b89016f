import { parseS10 } from '@/lib/core/post/s10'
import { ok, refuse, type Result } from '@/lib/core/result'

/** A tracking number as it is kept, and whether its check digit could be verified. */
export type Tracking = { readonly number: string; readonly kind: 's10' | 'other' }

const S10_SHAPE = /^[A-Z]{2}[0-9]{9}[A-Z]{2}$/

/**
 * A tracking number as typed or scanned, in capitals and without spaces. One that looks like a number of the post (S10) must
 * have its right check digit; numbers of other carriers are taken as they are, since nothing in them can be verified.
 * Refuses:  'check_digit'; 'characters' (other than letters, digits and hyphens, or no digit at all); 'length' (over 40).
 * Source:   Universal Postal Union, standard S10, for the post's own numbers.
 * @example  readTracking('rr 473 124 829 gb')  // → ok({ number: 'RR473124829GB', kind: 's10' })
 * @example  readTracking('RR473124828GB')  // → refuse('check_digit')
 * @example  readTracking('0340434-1')  // → ok({ number: '0340434-1', kind: 'other' })
 */
export function readTracking(typed: string): Result<Tracking, 'check_digit' | 'characters' | 'length'> {
  const number = typed.replace(/\s/g, '').toUpperCase()
  if (number.length > 40) return refuse('length')
  if (!/^[A-Z0-9-]+$/.test(number) || !/[0-9]/.test(number)) return refuse('characters')
  if (!S10_SHAPE.test(number)) return ok({ number, kind: 'other' })
  const read = parseS10(number)
  if (read.ok) return ok({ number, kind: 's10' })
  return read.reason === 'check_digit' ? refuse('check_digit') : ok({ number, kind: 'other' })
}
