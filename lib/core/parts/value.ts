import { restOf, type PartRest } from '@/lib/core/parts/value-rest'
import { plainText, valueAt, type PartKind } from '@/lib/core/parts/value-token'
import { ok, refuse, type Result } from '@/lib/core/result'

export type { PartKind } from '@/lib/core/parts/value-token'

/** What a parts list says of one part: its value, and what else stands beside it. */
export type PartReading = PartRest & { readonly value: number }

/**
 * Reads the value of a resistor, capacitor or inductor as makers write it.
 * The letter may stand for the point (RKM code: 4K7, R47, 2u2) or behind the number (4.7k, 4,7 kΩ, 0.1uF, 10 µF); a bare
 * number is ohms; three digits on a capacitor (pF) or inductor (µH) are two digits and a power of ten (104 is 100 nF).
 * In an inductance R is the point in µH. In a resistance k and K are kilo, M is mega and m is milli.
 * Units:    Ω, F, H.
 * Refuses:  'negative' for a value below 0, 'unreadable' for anything else, also for a value with more text behind it
 *           (`readPart` reads that) and for a decimal comma and point together.
 * Accuracy: the double nearest to the decimal number written.
 * Source:   IEC 60062 (RKM code); three-digit code: EIA, common practice.
 * @example  parseValue('4K7', 'resistance')  // → ok(4700)
 * @example  parseValue('R47', 'inductance')  // → ok(4.7e-7)
 * @example  parseValue('104', 'capacitance')  // → ok(1e-7)
 * @example  parseValue('-1k', 'resistance')  // → refuse('negative')
 */
export function parseValue(text: string, kind: PartKind): Result<number, 'unreadable' | 'negative'> {
  const plain = plainText(text)
  const unsigned = plain.replace(/^[-+]\s?/, '')
  const token = valueAt(unsigned, kind)
  if (token === null || token.length !== unsigned.length) return refuse('unreadable')
  if (plain.startsWith('-') && token.value > 0) return refuse('negative')
  return ok(token.value)
}

/**
 * Reads a value and what stands beside it: taper of a potentiometer (B100K, 100KB, 10k log), volts, watts, dielectric,
 * tolerance (5 %, or its letter).
 * Units:    Ω, F, H; volts, watts, per cent.
 * Refuses:  as `parseValue`, but text behind the value is taken as `rest` where it is not understood.
 * Source:   letters of tolerance and taper: common practice, no source.
 * @example  readPart('B100K', 'resistance')  // → ok({ value: 100000, taper: 'B', rest: '' })
 * @example  readPart('100n X7R 5%', 'capacitance')  // → ok({ value: 1e-7, dielectric: 'X7R', tolerancePercent: 5, rest: '' })
 */
export function readPart(text: string, kind: PartKind): Result<PartReading, 'unreadable' | 'negative'> {
  const plain = plainText(text)
  if (/^-\s?[\d.,]/.test(plain)) return refuse('negative')
  const before = kind === 'resistance' ? /^([ABCDGW])(?=[\d.,])/.exec(plain) : null
  const body = before === null ? plain : plain.slice(1)
  const token = valueAt(body, kind)
  if (token === null) return refuse('unreadable')
  const behind = body.slice(token.length)
  const after = kind === 'resistance' && before === null ? /^([ABCDGW])(?=$|[\s/,;])/.exec(behind) : null
  const letter = token.isCode ? /^[A-Z](?=$|[\s/,;])/.exec(behind) : null
  const taper = before?.[1] ?? after?.[1]
  const tail = behind.slice(after?.[0].length ?? 0)
  // What follows at once must be a separator, a taper or a tolerance letter: "4k7x" is no value.
  if (tail !== '' && letter === null && !/^[\s/,;(±@-]/.test(tail)) return refuse('unreadable')
  return ok({ value: token.value, ...(taper === undefined ? {} : { taper }), ...restOf(tail, kind) })
}

const STEPS: Readonly<Record<PartKind, readonly (readonly [letter: string, power: number])[]>> = {
  resistance: [
    ['R', 0],
    ['K', 3],
    ['M', 6],
    ['G', 9],
    ['T', 12],
  ],
  capacitance: [
    ['p', -12],
    ['n', -9],
    ['u', -6],
    ['m', -3],
    ['F', 0],
  ],
  inductance: [
    ['n', -9],
    ['u', -6],
    ['m', -3],
    ['H', 0],
  ],
}

/**
 * Writes a value in the RKM code, with all its digits and the letter of the greatest multiple that leaves 1 or more.
 * Units:    Ω, F, H in.
 * Domain:   finite ≥ 0 → otherwise RangeError.
 * Rounding: none: the shortest digits that name the same double, so that `parseValue` gives it back.
 * Source:   IEC 60062; an inductance is written with n, u, m instead of R.
 * @example  formatValue(4700, 'resistance')  // → '4K7'
 * @example  formatValue(1e-7, 'capacitance')  // → '100n'
 * @example  formatValue(0.47, 'resistance')  // → 'R47'
 */
export function formatValue(si: number, kind: PartKind): string {
  if (!Number.isFinite(si) || si < 0)
    throw new RangeError(`formatValue: si must be a finite number ≥ 0, got ${si}`)
  const steps = STEPS[kind]
  const [mantissa, exponent] = si.toExponential().split('e')
  const digits = mantissa!.replace('.', '')
  const power = Number(exponent)
  const [letter, step] = (si === 0 ? undefined : steps.findLast((each) => power >= each[1])) ?? steps[0]!
  const places = power - step + 1
  const padded = digits.padEnd(places, '0')
  const whole = places > 0 ? padded.slice(0, places) : ''
  const part = places > 0 ? padded.slice(places) : '0'.repeat(-places) + digits
  return `${si === 0 ? '0' : whole}${letter}${si === 0 ? '' : part.replace(/0+$/, '')}`
}
