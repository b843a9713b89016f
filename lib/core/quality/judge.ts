import { ok, refuse, type Result } from '../result'
import type { Verdict } from './yield'

/** What the instrument or the person at the bench says: a number, over range, a yes or no, or a word. */
export type ReadingValue = number | 'over_range' | boolean | string

/** A limit as a number or as the decimal text it is stored as; none = open on that side. */
type Limit = number | string | null

/** What a step of a test plan asks; `kind` is 'measure' unless said otherwise. */
export type StepLimits = {
  readonly kind?: 'measure' | 'yes_no' | 'text'
  readonly low?: Limit
  readonly high?: Limit
}

function limitOf(name: string, limit: Limit | undefined): number | null {
  if (limit === null || limit === undefined) return null
  const value = typeof limit === 'string' && limit.trim() !== '' ? Number(limit) : limit
  if (typeof value !== 'number' || !Number.isFinite(value))
    throw new RangeError(`${name} must be a number, got ${limit}`)
  return value
}

function judgeMeasure(step: StepLimits, value: ReadingValue): Verdict {
  const low = limitOf('low', step.low)
  const high = limitOf('high', step.high)
  if (low !== null && high !== null && low > high)
    throw new RangeError(`low must be at most high, got ${low} > ${high}`)
  // More than the instrument can show: fine for "at least 1 MΩ", too much under any upper limit.
  if (value === 'over_range') return high === null ? 'pass' : 'fail'
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new RangeError(`value must be a number or 'over_range', got ${String(value)}`)
  }
  return (low === null || value >= low) && (high === null || value <= high) ? 'pass' : 'fail'
}

/**
 * Whether a reading meets its step: within closed limits, where a reading on a limit passes and a missing limit is open;
 * yes for a yes/no step; any words for a text step. Over range passes only where no upper limit stands.
 * Units: limits and value in the step's own unit.
 * Domain: finite limits, low ≤ high; a number or 'over_range' to measure, true/false or 'yes'/'no' for yes/no, a string
 * for text → otherwise RangeError.
 * Rounding: none; compared as read, so a limit of 4.98 is met by a reading of 4.98.
 * @example judgeReading({ low: 4.9, high: 5.1 }, 5.1)  // → 'pass'
 */
export function judgeReading(step: StepLimits, value: ReadingValue): Verdict {
  const { kind = 'measure' } = step
  if (kind === 'measure') return judgeMeasure(step, value)
  if (kind === 'text') {
    if (typeof value !== 'string') throw new RangeError(`value must be text, got ${String(value)}`)
    return value.trim() === '' ? 'fail' : 'pass'
  }
  if (value === true || value === 'yes') return 'pass'
  if (value === false || value === 'no') return 'fail'
  throw new RangeError(`value must be yes or no, got ${String(value)}`)
}

/**
 * A reading as typed or sent by an instrument: digits with one point or comma, a sign, an exponent; "OL" (over limit)
 * is a reading too. "4,98" is 4.98 and "1,234" is 1.234: no thousands are ever read.
 * Refuses: 'unreadable' for anything else, both separators together and units included: the step has the unit.
 * Rounding: to the nearest double.
 * @example parseReading('4,98')  // → ok(4.98)
 * @example parseReading('OL')  // → ok('over_range')
 * @example parseReading('1.234,5')  // → refuse('unreadable')
 */
export function parseReading(text: string): Result<number | 'over_range', 'unreadable'> {
  const tidy = text.trim().replace(/^[−–]/u, '-')
  if (/^[+-]?0?\.?[oO0]\.?[lL]\.?$/u.test(tidy)) return ok('over_range')
  if (!/^[+-]?(\d+([.,]\d*)?|[.,]\d+)([eE][+-]?\d{1,3})?$/u.test(tidy)) return refuse('unreadable')
  const value = Number(tidy.replace(',', '.'))
  // −0.00 on a display is 0.
  return Number.isFinite(value) ? ok(value === 0 ? 0 : value) : refuse('unreadable')
}

/**
 * The first step, in the order of the plan, whose latest reading fails: it names the place, since plans go from the power
 * stage by stage. null = no step failed; a step without a reading has not failed.
 * Units: readings in the order taken; a later one of the same step replaces the earlier.
 * Domain: as `judgeReading`.
 * @example firstFailure([{ key: 'rail', low: 11.5 }, { key: 'out' }], [{ stepKey: 'rail', value: 3 }])?.key  // → 'rail'
 */
export function firstFailure<S extends StepLimits & { readonly key: string }>(
  plan: readonly S[],
  readings: readonly { readonly stepKey: string; readonly value: ReadingValue }[],
): S | null {
  const latest = new Map(readings.map(({ stepKey, value }) => [stepKey, value]))
  const failing = plan.find((step) => {
    const value = latest.get(step.key)
    return value !== undefined && judgeReading(step, value) === 'fail'
  })
  return failing ?? null
}
