/** What a part's value measures; read and written in Ω, F and H. */
export type PartKind = 'resistance' | 'capacitance' | 'inductance'

type Letters = Readonly<Record<string, number>>

/** Power of ten by multiplier letter. Upper and lower case differ only where both are in use for different things. */
const LETTERS: Readonly<Record<PartKind, Letters>> = {
  resistance: { m: -3, R: 0, r: 0, E: 0, Ω: 0, K: 3, k: 3, M: 6, G: 9, T: 12 },
  capacitance: { p: -12, P: -12, n: -9, N: -9, u: -6, U: -6, μ: -6, m: -3, F: 0 },
  // In an inductance R marks the point in microhenry.
  inductance: { p: -12, n: -9, N: -9, u: -6, U: -6, μ: -6, R: -6, r: -6, m: -3, H: 0 },
}

const UNITS: Readonly<Record<PartKind, string>> = {
  resistance: 'Ω|[Oo]hms?|OHMS?',
  capacitance: 'F|f',
  inductance: 'H|h',
}

/** A value at the start of a text, in SI units, and how many characters of the text it takes. */
export type ValueToken = { readonly value: number; readonly length: number; readonly isCode: boolean }

type Reader = { readonly rkm: RegExp; readonly plain: RegExp; readonly letters: Letters }

const READERS: Readonly<Record<PartKind, Reader>> = {
  resistance: readerOf('resistance'),
  capacitance: readerOf('capacitance'),
  inductance: readerOf('inductance'),
}

function readerOf(kind: PartKind): Reader {
  const letters = LETTERS[kind]
  const any = Object.keys(letters).join('')
  return {
    letters,
    rkm: new RegExp(`^(\\d*)([${any}])(\\d*)(?:\\s?(?:${UNITS[kind]}))?`),
    plain: new RegExp(`^(\\d+(?:[.,]\\d+)?|[.,]\\d+)(?:\\s*([${any}]))?(?:\\s?(?:${UNITS[kind]}))?`),
  }
}

/** One way of writing for all: no-break and full-width forms, µ and Ω in their one spelling. */
export function plainText(text: string): string {
  return text
    .normalize('NFKC')
    .replace(/[‐-―−]/g, '-')
    .replace(/\s+/g, ' ')
    .trim()
}

/**
 * Reads the value at the start of a text that `plainText` has made; null when there is none.
 * Three digits alone on a capacitor or an inductor are the code of two digits and a power of ten, in pF and µH
 * (a last digit 8 or 9 stands for −2 and −1, EIA).
 */
export function valueAt(text: string, kind: PartKind): ValueToken | null {
  const { rkm, plain, letters } = READERS[kind]
  const code = kind === 'resistance' ? null : /^(\d\d)(\d)(?![\d.,]|\s?[a-zμ]|[A-Z]\d)/.exec(text)
  if (code !== null && !(text[3] !== undefined && text[3] in letters)) {
    const power = Number(code[2]) < 8 ? Number(code[2]) : Number(code[2]) - 10
    return { value: scaled(code[1]!, power + (kind === 'capacitance' ? -12 : -6)), length: 3, isCode: true }
  }
  const point = rkm.exec(text)
  if (point !== null && (point[1] !== '' || point[3] !== '') && !isSplitNumber(text, point)) {
    const [whole, , letter, part] = point
    return {
      value: scaled(`${point[1] || '0'}.${part || '0'}`, letters[letter!]!),
      length: whole.length,
      isCode: false,
    }
  }
  const number = plain.exec(text)
  if (number === null) return null
  const [whole, digits, letter] = number
  // A bare number is ohms; a capacitor or an inductor needs its unit, unless the unit itself is F or H.
  const hasUnit = letter !== undefined || (kind !== 'resistance' && /[FfHh]$/.test(whole))
  if (!hasUnit && kind !== 'resistance') return null
  const power = letter === undefined ? 0 : letters[letter]!
  return { value: scaled(digits!.replace(',', '.'), power), length: whole.length, isCode: false }
}

/** Whether what looks like a letter for the point stands after a number with a point of its own ("4.7k"). */
function isSplitNumber(text: string, point: RegExpExecArray): boolean {
  return (
    /[.,]/.test(text.slice(point[0].length, point[0].length + 1)) &&
    /\d/.test(text.charAt(point[0].length + 1))
  )
}

/** Decimal digits times a power of ten as the nearest double, never by multiplying doubles. */
function scaled(digits: string, power: number): number {
  return Number(`${digits.startsWith('.') ? '0' : ''}${digits}e${power}`)
}
