/** A series of preferred values, by how many there are in a decade. */
export type Series = 'E3' | 'E6' | 'E12' | 'E24' | 'E48' | 'E96' | 'E192'

/** Where the published E24 differs from 10^(i/24) rounded to one decimal: position and value. */
const E24_EXCEPTIONS: Readonly<Record<number, number>> = {
  10: 2.7,
  11: 3.0,
  12: 3.3,
  13: 3.6,
  14: 3.9,
  15: 4.3,
  16: 4.7,
  22: 8.2,
}

/** Where the published E192 differs from 10^(i/192) rounded to two decimals. */
const E192_EXCEPTIONS: Readonly<Record<number, number>> = { 185: 9.2 }

const E24 = Array.from({ length: 24 }, (_, i) => E24_EXCEPTIONS[i] ?? Number((10 ** (i / 24)).toFixed(1)))
const E192 = Array.from({ length: 192 }, (_, i) => E192_EXCEPTIONS[i] ?? Number((10 ** (i / 192)).toFixed(2)))

const every = (list: readonly number[], step: number) => list.filter((_, i) => i % step === 0)

const SERIES: Readonly<Record<Series, readonly number[]>> = {
  E3: every(E24, 8),
  E6: every(E24, 4),
  E12: every(E24, 2),
  E24,
  E48: every(E192, 4),
  E96: every(E192, 2),
  E192,
}

/**
 * The preferred values of one decade, rising from 1.
 * Domain:  'E3' to 'E192' → otherwise RangeError.
 * Source:  IEC 60063: rounded powers of ten with its published exceptions; E3, E6, E12 are taken from E24, E48 and E96 from
 *          E192.
 * @example preferredValues('E6')  // → [1, 1.5, 2.2, 3.3, 4.7, 6.8]
 */
export function preferredValues(series: Series): readonly number[] {
  if (!Object.hasOwn(SERIES, series))
    throw new RangeError(`preferredValues: series must be E3 to E192, got ${series}`)
  return SERIES[series]
}

/**
 * Whether a value is one of a series, in any decade.
 * Domain:   value finite > 0 → otherwise RangeError.
 * Accuracy: compared in twelve significant digits, so that a value that was computed (0.1 · 47) is recognised.
 * @example  isPreferred(4700, 'E12')  // → true
 * @example  isPreferred(5000, 'E24')  // → false
 */
export function isPreferred(value: number, series: Series): boolean {
  const values = preferredValues(series)
  const [mantissa] = decimalOf('isPreferred', value)
  return values.includes(mantissa)
}

/**
 * The value of a series nearest to a wanted one by ratio, which is how a wrong value matters in a circuit.
 * Domain:   value finite > 0 → otherwise RangeError.
 * Rounding: nearest ratio; a tie goes to the lower.
 * @example  nearestPreferred(5000, 'E12')  // → 4700
 * @example  nearestPreferred(9800, 'E12')  // → 10000
 */
export function nearestPreferred(value: number, series: Series): number {
  const values = preferredValues(series)
  const [mantissa, power] = decimalOf('nearestPreferred', value)
  const candidates = [...values.map((each) => [each, power] as const), [1, power + 1] as const]
  const ratio = ([each, at]: readonly [number, number]) => {
    const scaled = at === power ? each : 10
    return Math.max(scaled / mantissa, mantissa / scaled)
  }
  const [best, at] = candidates.reduce((nearest, each) => (ratio(each) < ratio(nearest) ? each : nearest))
  return Number(`${best}e${at}`)
}

/** The value as mantissa from 1 to below 10 and power of ten, by its decimal digits. */
function decimalOf(name: string, value: number): readonly [mantissa: number, power: number] {
  if (!Number.isFinite(value) || value <= 0)
    throw new RangeError(`${name}: value must be a finite number > 0, got ${value}`)
  const [mantissa, power] = value.toExponential(11).split('e')
  return [Number(mantissa), Number(power)]
}
