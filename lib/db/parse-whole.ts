/**
 * Reads a 64-bit whole number of the database as a number.
 * Throws for one a number cannot hold exactly: a wrong sum is worse than none.
 */
export function parseWhole(text: string): number {
  const whole = Number(text)
  if (!Number.isSafeInteger(whole)) throw new RangeError(`parseWhole: ${text} is not a safe integer`)
  return whole
}
