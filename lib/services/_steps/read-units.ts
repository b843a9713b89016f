import type { OfferKind } from '@/lib/contracts/fields'
import { offerKind } from '@/lib/contracts/fields'
import { ok, refuse, type Result } from '@/lib/core/result'
import { unitMistakes as words } from '@/lib/messages/units'

export type TypedUnit = { line: number; serial: string; offer: OfferKind }

/** A run has some hundreds of units; more is a mistake of the clipboard. */
const MOST = 500
const HEADING = /^serial\b/i

/**
 * Finished units as typed, a line each: the serial number, or the number and its form with a semicolon, comma or tab between.
 * A heading line that begins with "serial" is passed over.
 * Refuses: with the sentence of the first line that cannot be taken. Writes: nothing.
 */
export function readUnits(typed: string, offer: OfferKind): Result<TypedUnit[], string> {
  const units: TypedUnit[] = []
  const seen = new Set<string>()
  for (const [i, text] of typed.split('\n').entries()) {
    const at = i + 1
    if (text.trim() === '' || (i === 0 && HEADING.test(text))) continue
    const [serial = '', form = '', ...more] = text.split(/[;,\t]/).map((cell) => cell.trim())
    if (serial === '' || /\s/.test(serial) || more.some(Boolean)) return refuse(words.unreadable(at))
    if (serial.length > 40) return refuse(words.tooLong(at))
    const named = offerKind.safeParse(form === '' ? offer : form.toLowerCase())
    if (!named.success) return refuse(words.form(at, form))
    if (seen.has(serial.toUpperCase())) return refuse(words.twice(at, serial))
    seen.add(serial.toUpperCase())
    units.push({ line: at, serial, offer: named.data })
  }
  return units.length > MOST ? refuse(words.tooMany(MOST)) : ok(units)
}
