import type { PartKind } from '@/lib/core/parts/value-token'

/** What a parts list may say beside a value; a field that is not there was not said. */
export type PartRest = {
  /** Potentiometer: A logarithmic, B linear, C reverse logarithmic, W S-shaped (common practice; some makers differ). */
  readonly taper?: string
  readonly volts?: number
  readonly watts?: number
  /** Class of a ceramic ('X7R', 'C0G', also for NP0) or kind of a capacitor ('PP', 'PET'). */
  readonly dielectric?: string
  readonly tolerancePercent?: number
  /** What was not understood, as it stands. */
  readonly rest: string
}

const TOLERANCE: Readonly<Record<string, number>> = {
  B: 0.1,
  C: 0.25,
  D: 0.5,
  F: 1,
  G: 2,
  J: 5,
  K: 10,
  M: 20,
}
const DIELECTRIC = /^(?:[CXYZ][5-8][FPRSTUV]|C0G|COG|NP0|NPO|PP|PET|PPS|PEN|MK[PST])$/i
const TAPER: Readonly<Record<string, string>> = {
  lin: 'B',
  linear: 'B',
  log: 'A',
  audio: 'A',
  revlog: 'C',
  antilog: 'C',
}

/** Reads the words behind a value; what none of the rules knows is kept in `rest`. */
export function restOf(text: string, kind: PartKind): PartRest {
  const found: { -readonly [K in keyof PartRest]: PartRest[K] } = { rest: '' }
  const unknown: string[] = []
  const words = text
    .replace(/(\d),(\d)/g, '$1.$2')
    .replace(/(\d)\s+(?=%|V\b|m?W\b)/g, '$1')
    .replace(/±\s*|\+\/-\s*/g, '')
    .replace(/1\/([248])\s?W/gi, (_, part) => `${1 / Number(part)}W`)
    .split(/[\s/;,()@]+/)
  for (const word of words.filter(Boolean)) {
    const volts = /^(\d+(?:\.\d+)?)V(\d+)?(?:[AD]C)?$/i.exec(word)
    const watts = /^(\d+(?:\.\d+)?)(m?)W$/i.exec(word)
    const percent = /^-?(\d+(?:\.\d+)?)%$/.exec(word)
    if (volts !== null) found.volts = Number(volts[2] === undefined ? volts[1] : `${volts[1]}.${volts[2]}`)
    else if (watts !== null) found.watts = Number(watts[1]) / (watts[2] === '' ? 1 : 1000)
    else if (percent !== null) found.tolerancePercent = Number(percent[1])
    else if (DIELECTRIC.test(word)) found.dielectric = dielectricOf(word)
    else if (TAPER[word.toLowerCase()] !== undefined && kind === 'resistance')
      found.taper = TAPER[word.toLowerCase()]
    else if (TOLERANCE[word] !== undefined) found.tolerancePercent = TOLERANCE[word]
    else unknown.push(word)
  }
  return { ...found, rest: unknown.join(' ') }
}

function dielectricOf(word: string): string {
  const name = word.toUpperCase()
  return ['COG', 'NP0', 'NPO'].includes(name) ? 'C0G' : name
}
