/** An exact decimal number of 0 or more: `digits` ÷ `scale`, the scale a power of ten. */
export type Decimal = { readonly digits: bigint; readonly scale: bigint }

/**
 * Reads plain decimal digits exactly, as prices below a minor unit and exchange rates are written.
 * Domain:   digits with at most one point, no sign, no exponent → otherwise RangeError naming the argument.
 * Accuracy: exact; trailing zeros are kept out of the scale.
 * @example  readDecimal('rate', '0.40').scale  // → 10n
 */
export function readDecimal(name: string, text: string): Decimal {
  const match = /^([0-9]+)(?:\.([0-9]+))?$/.exec(text)
  if (match === null) throw new RangeError(`${name} must be a decimal such as '0.4', got ${text}`)
  const fraction = (match[2] ?? '').replace(/0+$/, '')
  return { digits: BigInt(match[1]! + fraction), scale: 10n ** BigInt(fraction.length) }
}

/**
 * A function that multiplies whole numbers by a fixed fraction and rounds half-up to a whole number, in plain numbers as
 * long as they are exact and in big integers beyond.
 * Domain:   top ≥ 0, bottom > 0; factors whole ≥ 0, results safe integers → otherwise RangeError.
 * Rounding: half-up, once.
 * Accuracy: exact before the rounding.
 * @example  timesFraction(4n, 10n)(101)  // → 40
 */
export function timesFraction(top: bigint, bottom: bigint): (factor: number) => number {
  const shared = commonDivisor(top, bottom)
  const [over, under] = [top / shared, bottom / shared]
  const [n, d] = [Number(over), Number(under)]
  const limit = n === 0 ? Number.MAX_SAFE_INTEGER : Math.floor(Number.MAX_SAFE_INTEGER / n)
  const isSmall = Number.isSafeInteger(n) && Number.isSafeInteger(2 * d)
  return (factor) => {
    if (isSmall && factor <= limit) {
      const product = factor * n
      // Exact although it divides doubles: below 2^53 the quotient cannot round across a whole number.
      const whole = Math.floor(product / d)
      return 2 * (product - whole * d) >= d ? whole + 1 : whole
    }
    const rounded = Number((2n * BigInt(factor) * over + under) / (2n * under))
    if (!Number.isSafeInteger(rounded))
      throw new RangeError(`amount must stay a safe integer, got ${rounded}`)
    return rounded
  }
}

function commonDivisor(a: bigint, b: bigint): bigint {
  return b === 0n ? a : commonDivisor(b, a % b)
}
