type Whole = number | bigint

function toFraction(name: string, n: Whole, d: Whole): { n: bigint; d: bigint } {
  for (const [argument, value] of [
    ['n', n],
    ['d', d],
  ] as const) {
    if (typeof value === 'number' && !Number.isSafeInteger(value)) {
      throw new RangeError(`${name}: ${argument} must be a safe integer, got ${value}`)
    }
  }
  if (d === 0 || d === 0n) throw new RangeError(`${name}: d must not be 0, got ${d}`)
  const [top, bottom] = [BigInt(n), BigInt(d)]
  return bottom < 0n ? { n: -top, d: -bottom } : { n: top, d: bottom }
}

function toSafeNumber(name: string, value: bigint): number {
  const result = Number(value)
  if (!Number.isSafeInteger(result))
    throw new RangeError(`${name}: result must be a safe integer, got ${value}`)
  return result
}

/**
 * The fraction n/d to the nearest whole number, a half going away from zero: the way prices and tax are rounded by hand.
 * Units:    whole numbers; a bigint is taken where a product outgrows a safe integer.
 * Domain:   d ≠ 0, both whole, the result a safe integer → otherwise RangeError.
 * Rounding: half away from zero, once.
 * Accuracy: exact (whole-number arithmetic throughout).
 * @example  roundHalfUp(5, 2)  // → 3
 * @example  roundHalfUp(-5, 2)  // → -3
 */
export function roundHalfUp(n: Whole, d: Whole): number {
  const f = toFraction('roundHalfUp', n, d)
  const rounded = f.n < 0n ? -((-f.n * 2n + f.d) / (f.d * 2n)) : (f.n * 2n + f.d) / (f.d * 2n)
  return toSafeNumber('roundHalfUp', rounded)
}

/**
 * The fraction n/d to the nearest whole number, a half going to the even neighbour, so that many halves do not drift.
 * Units:    whole numbers; a bigint is taken where a product outgrows a safe integer.
 * Domain:   d ≠ 0, both whole, the result a safe integer → otherwise RangeError.
 * Rounding: half to even, once.
 * Accuracy: exact (whole-number arithmetic throughout).
 * @example  roundHalfEven(5, 2)  // → 2
 * @example  roundHalfEven(7, 2)  // → 4
 */
export function roundHalfEven(n: Whole, d: Whole): number {
  const f = toFraction('roundHalfEven', n, d)
  const truncated = f.n / f.d
  const floor = f.n < 0n && truncated * f.d !== f.n ? truncated - 1n : truncated
  const twiceRest = (f.n - floor * f.d) * 2n
  const up = twiceRest > f.d || (twiceRest === f.d && floor % 2n !== 0n)
  return toSafeNumber('roundHalfEven', up ? floor + 1n : floor)
}
