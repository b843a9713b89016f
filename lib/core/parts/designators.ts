import { ok, refuse, type Result } from '@/lib/core/result'

/** The most parts one range may name; a longer one is a slip of the hand (R1-R10000). */
const LONGEST_RANGE = 1000

/**
 * Writes out the designators of a parts list line, one by one, in the order given.
 * Lists are parted by comma, semicolon or space; a range needs one letter group (R1-R4, C10–12, C10…C12). Repeated ones
 * are kept, so that a check can find them. Letters become capitals. A blank text names none.
 * Refuses:  'unreadable' when anything is no designator, a range falls or changes its letters, or it names over 1,000 parts.
 * @example  expandDesignators('R1-R4, R7, C10–12')  // → ok(['R1', 'R2', 'R3', 'R4', 'R7', 'C10', 'C11', 'C12'])
 * @example  expandDesignators('R4-R1')  // → refuse('unreadable')
 */
export function expandDesignators(text: string): Result<string[], 'unreadable'> {
  const plain = text
    .normalize('NFKC')
    .toUpperCase()
    .replace(/\s*(?:[-‐-―−~]|\.{2,3})\s*/g, '-')
  const all: string[] = []
  for (const item of plain.split(/[\s,;]+/).filter(Boolean)) {
    const named = expandItem(item)
    if (named === null) return refuse('unreadable')
    all.push(...named)
  }
  return ok(all)
}

function expandItem(item: string): readonly string[] | null {
  // A section of a part may have a letter behind the number (U1A); ranges never do.
  if (/^[A-Z]+\d+[A-Z]?$/.test(item)) return [item]
  const range = /^([A-Z]+)(\d+)-([A-Z]*)(\d+)$/.exec(item)
  if (range === null) return null
  const [, letters = '', first = '', others = '', last = ''] = range
  const count = Number(last) - Number(first) + 1
  if ((others !== '' && others !== letters) || count < 1 || count > LONGEST_RANGE) return null
  return Array.from({ length: count }, (_, i) => `${letters}${Number(first) + i}`)
}

/** What a designator's letters stand for. */
export type PartClass =
  | 'resistor'
  | 'resistor_network'
  | 'potentiometer'
  | 'capacitor'
  | 'inductor'
  | 'ferrite'
  | 'diode'
  | 'transistor'
  | 'integrated_circuit'
  | 'connector'
  | 'switch'
  | 'crystal'
  | 'relay'
  | 'transformer'
  | 'fuse'
  | 'battery'
  | 'test_point'
  | 'mechanical'
  | 'other'

const CLASSES: Readonly<Record<string, PartClass>> = {
  R: 'resistor',
  RN: 'resistor_network',
  RV: 'potentiometer',
  VR: 'potentiometer',
  POT: 'potentiometer',
  TRIM: 'potentiometer',
  C: 'capacitor',
  L: 'inductor',
  FB: 'ferrite',
  D: 'diode',
  LED: 'diode',
  ZD: 'diode',
  Q: 'transistor',
  TR: 'transistor',
  U: 'integrated_circuit',
  IC: 'integrated_circuit',
  J: 'connector',
  JP: 'connector',
  P: 'connector',
  CN: 'connector',
  CON: 'connector',
  HDR: 'connector',
  X: 'connector',
  SW: 'switch',
  S: 'switch',
  Y: 'crystal',
  XTAL: 'crystal',
  K: 'relay',
  RY: 'relay',
  T: 'transformer',
  F: 'fuse',
  BT: 'battery',
  BAT: 'battery',
  TP: 'test_point',
  H: 'mechanical',
  MH: 'mechanical',
  MP: 'mechanical',
  FD: 'mechanical',
}

/**
 * What kind of part a designator names; 'other' where its letters are not in use for one.
 * Source:  IEEE 315 and common practice in hobby schematics.
 * @example classOf('R12')  // → 'resistor'
 * @example classOf('IC3')  // → 'integrated_circuit'
 */
export function classOf(designator: string): PartClass {
  const letters = /^[A-Z]+/.exec(designator.trim().toUpperCase())?.[0] ?? ''
  return CLASSES[letters] ?? 'other'
}
