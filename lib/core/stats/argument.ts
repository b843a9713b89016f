/**
 * The checks a calculation makes on its arguments; each throws `RangeError` naming the argument and the value.
 * A failed check is a bug of the caller, never something to show to a person.
 */

function wrong(name: string, wanted: string, value: unknown): never {
  throw new RangeError(`${name} must be ${wanted}, got ${String(value)}`)
}

/**
 * Passes a whole number that is at least `least` and small enough to be exact; gives it back.
 * @example wholeFrom(1, 'need', 20)  // → 20
 */
export function wholeFrom(least: number, name: string, value: number): number {
  if (!Number.isSafeInteger(value) || value < least) wrong(name, `a whole number from ${least}`, value)
  return value
}

/**
 * Passes a finite number above 0; gives it back.
 * @example positive('alpha', 0.5)  // → 0.5
 */
export function positive(name: string, value: number): number {
  if (!(value > 0) || !Number.isFinite(value)) wrong(name, 'a finite number above 0', value)
  return value
}

/**
 * Passes a finite number of 0 or more; gives it back.
 * @example notNegative('sd', 0)  // → 0
 */
export function notNegative(name: string, value: number): number {
  if (!(value >= 0) || !Number.isFinite(value)) wrong(name, 'a finite number of 0 or more', value)
  return value
}

/**
 * Passes any finite number; gives it back.
 * @example finite('day', -1.5)  // → -1.5
 */
export function finite(name: string, value: number): number {
  if (!Number.isFinite(value)) wrong(name, 'a finite number', value)
  return value
}

/**
 * Passes a chance strictly between 0 and 1, as confidences and quantile levels are; gives it back.
 * @example insideUnit('confidence', 0.95)  // → 0.95
 */
export function insideUnit(name: string, value: number): number {
  if (!(value > 0 && value < 1)) wrong(name, 'above 0 and below 1', value)
  return value
}

/**
 * Passes a share from 0 to 1, both included; gives it back.
 * @example share('arrivedShare', 1)  // → 1
 */
export function share(name: string, value: number): number {
  if (!(value >= 0 && value <= 1)) wrong(name, 'from 0 to 1', value)
  return value
}
