import { classOf, expandDesignators, type PartClass } from '@/lib/core/parts/designators'
import { isPreferred } from '@/lib/core/parts/preferred'
import { readPart, type PartKind } from '@/lib/core/parts/value'

/** One line of a parts list, as far as its check needs it. */
export type PartsLine = {
  /** Names the line in the findings. */
  readonly id: string
  readonly designators: string
  /** Pieces per unit. */
  readonly quantity: number
  readonly value: string
  readonly description?: string
  /** Offers that need it. */
  readonly neededFor: readonly string[]
  /** How many quotes there are for the part, and how many alternates. */
  readonly quotes: number
  readonly alternates: number
  readonly lifecycle: 'active' | 'not_for_new_designs' | 'last_buy' | 'gone'
  /** Supply pins of one piece; 0 where it is no integrated circuit. */
  readonly supplyPins: number
  /** How a connector goes in ("stripe = −12 V, towards the edge"); blank when nobody has said. */
  readonly polarityNote: string
}

/** Something wrong ('error') or worth a look ('advice') in a parts list; `line` is null where it is about all of it. */
export type Finding = {
  readonly line: string | null
  readonly problem:
    | 'unreadable_designators'
    | 'count_differs'
    | 'repeated_designator'
    | 'unreadable_value'
    | 'value_not_preferred'
    | 'no_quote'
    | 'end_of_life_without_alternate'
    | 'too_few_bypass_capacitors'
    | 'fewer_bypass_capacitors_than_supply_pins'
    | 'no_polarity_note'
    | 'needed_for_no_offer'
  readonly severity: 'error' | 'advice'
  /** What it is about: the designator, the text of the value, or "found / wanted". */
  readonly detail: string
}

const KINDS: Readonly<Partial<Record<PartClass, PartKind>>> = {
  resistor: 'resistance',
  potentiometer: 'resistance',
  capacitor: 'capacitance',
  inductor: 'inductance',
}

/**
 * The parts list check: what would stop a run or shame a kit, line by line, then what is about the whole list.
 * Counts against designators, repeated designators, values that cannot be read or are not made, parts nobody quotes or that
 * are at their end without an alternate, connectors without a polarity note (jacks need none), lines no offer needs, and
 * bypass capacitors: from 47 to 220 nF, at least one for each integrated circuit (error), better one for each supply pin (advice).
 * Domain:   any lines; an empty list has no findings.
 * Note:     resistors may be of E24 or E192, capacitors and inductors of E24; a potentiometer's value is only read.
 * Source:   bypass capacitors: common practice, no source. Preferred values: IEC 60063.
 * @example  lintParts([])  // → []
 */
export function lintParts(lines: readonly PartsLine[]): Finding[] {
  const read = lines.map((line) => {
    const names = expandDesignators(line.designators)
    const kind = classOf(names.ok ? (names.value[0] ?? '') : line.designators)
    return { line, names: names.ok ? names.value : null, kind }
  })
  const seen = new Set<string>()
  const found = read.flatMap((each) => [
    ...designatorFindings(each, seen),
    ...valueFindings(each.line, each.kind),
    ...supplyFindings(each.line),
    ...connectorFindings(each.line, each.kind),
    ...(each.line.neededFor.length === 0 ? [finding(each.line, 'needed_for_no_offer', '')] : []),
  ])
  return [...found, ...bypassFindings(read)]
}

type ReadLine = {
  readonly line: PartsLine
  readonly names: readonly string[] | null
  readonly kind: PartClass
}

function designatorFindings({ line, names }: ReadLine, seen: Set<string>): Finding[] {
  if (names === null) return [finding(line, 'unreadable_designators', line.designators)]
  const repeated = names.filter((name) => seen.size === seen.add(name).size)
  const differs = names.length > 0 && names.length !== line.quantity
  return [
    ...(differs ? [finding(line, 'count_differs', `${names.length} / ${line.quantity}`)] : []),
    ...repeated.map((name) => finding(line, 'repeated_designator', name)),
  ]
}

function valueFindings(line: PartsLine, partClass: PartClass): Finding[] {
  const kind = KINDS[partClass]
  if (kind === undefined) return []
  const reading = readPart(line.value, kind)
  if (!reading.ok) return [finding(line, 'unreadable_value', line.value)]
  const { value } = reading.value
  const isMade = isPreferred(value || 1, 'E24') || (kind === 'resistance' && isPreferred(value, 'E192'))
  return partClass === 'potentiometer' || isMade
    ? []
    : [finding(line, 'value_not_preferred', line.value, 'advice')]
}

function supplyFindings(line: PartsLine): Finding[] {
  const isEnding = line.lifecycle !== 'active' && line.alternates === 0
  const severity = line.lifecycle === 'not_for_new_designs' ? 'advice' : 'error'
  return [
    ...(line.quotes === 0 ? [finding(line, 'no_quote', '')] : []),
    ...(isEnding ? [finding(line, 'end_of_life_without_alternate', line.lifecycle, severity)] : []),
  ]
}

function connectorFindings(line: PartsLine, partClass: PartClass): Finding[] {
  const isJack = /\bjacks?\b/i.test(`${line.value} ${line.description ?? ''}`)
  const isSilent = partClass === 'connector' && !isJack && line.polarityNote.trim() === ''
  return isSilent ? [finding(line, 'no_polarity_note', line.designators)] : []
}

function bypassFindings(read: readonly ReadLine[]): Finding[] {
  const sum = (of: (each: ReadLine) => number) => read.reduce((total, each) => total + of(each), 0)
  const capacitors = sum(({ line, kind }) =>
    kind === 'capacitor' && isBypass(line.value) ? line.quantity : 0,
  )
  const circuits = sum(({ line, kind }) => (kind === 'integrated_circuit' ? line.quantity : 0))
  const pins = sum(({ line, kind }) => (kind === 'integrated_circuit' ? line.quantity * line.supplyPins : 0))
  if (capacitors < circuits)
    return [finding(null, 'too_few_bypass_capacitors', `${capacitors} / ${circuits}`)]
  if (capacitors >= pins) return []
  return [finding(null, 'fewer_bypass_capacitors_than_supply_pins', `${capacitors} / ${pins}`, 'advice')]
}

function isBypass(value: string): boolean {
  const reading = readPart(value, 'capacitance')
  return reading.ok && reading.value.value >= 47e-9 && reading.value.value <= 220e-9
}

function finding(
  line: PartsLine | null,
  problem: Finding['problem'],
  detail: string,
  severity: Finding['severity'] = 'error',
): Finding {
  return { line: line?.id ?? null, problem, severity, detail }
}
