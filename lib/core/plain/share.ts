import { ok, refuse, type Result } from '@/lib/core/result'

const SHARE = /^([0-9]{1,3})(?:[.,]([0-9]{1,2}))?$/

/**
 * A share typed as a percentage, as whole basis points.
 * Refuses: 'not_a_share' for anything but digits with at most two decimals, or above 100.
 * Rounding: none.
 * @example  readShare('2,5')  // → ok(250)
 * @example  readShare('100.01')  // → refuse('not_a_share')
 */
export function readShare(text: string): Result<number, 'not_a_share'> {
  const [match, whole = '', fraction = ''] = SHARE.exec(text.trim()) ?? []
  if (match === undefined) return refuse('not_a_share')
  const basisPoints = Number(whole) * 100 + Number(fraction.padEnd(2, '0'))
  return basisPoints > 10_000 ? refuse('not_a_share') : ok(basisPoints)
}

/**
 * Basis points as a plain percentage for a form field; `readShare` reads it back.
 * Domain:  whole 0 to 10,000 → otherwise RangeError.
 * @example  writeShare(250)  // → '2.5'
 * @example  writeShare(10000)  // → '100'
 */
export function writeShare(basisPoints: number): string {
  if (!Number.isInteger(basisPoints) || basisPoints < 0 || basisPoints > 10_000)
    throw new RangeError(`writeShare: basisPoints must be whole from 0 to 10000, got ${basisPoints}`)
  const digits = String(basisPoints).padStart(3, '0')
  const behind = digits.slice(-2).replace(/0+$/, '')
  return behind === '' ? digits.slice(0, -2) : `${digits.slice(0, -2)}.${behind}`
}
