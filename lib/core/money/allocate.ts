import { minor, type Minor } from '@/lib/core/brand'
import { ok, refuse, type Result } from '@/lib/core/result'

function wholeWeights(name: string, weights: readonly number[]): bigint[] {
  return weights.map((weight, i) => {
    if (!Number.isSafeInteger(weight) || weight < 0) {
      throw new RangeError(`${name}: weights[${i}] must be a whole number ≥ 0, got ${weight}`)
    }
    return BigInt(weight)
  })
}

const sum = (values: readonly bigint[]) => values.reduce((total, value) => total + value, 0n)

/**
 * Splits a total into parts that add up to it exactly, by weight: the largest remainders get what the floors leave over.
 * For money that must be shared out now; a part may shrink when the total grows, so units of a mix use `divide`.
 * Units:    total and parts in minor units; weights are whole and relative to one another.
 * Domain:   total a safe integer (a negative one is split like its opposite), weights whole ≥ 0 → otherwise RangeError.
 * Refuses:  'no_weight' when there are no weights or all are 0.
 * Rounding: largest remainder (Hare quota), ties to the earlier.
 * Accuracy: exact.
 * Source:   method of largest remainders (Hamilton); Balinski & Young, Fair Representation, ch. 2.
 * @example  allocate(100, [1, 1, 1])  // → ok([34, 33, 33])
 * @example  allocate(100, [0, 0])  // → refuse('no_weight')
 */
export function allocate(total: number, weights: readonly number[]): Result<Minor[], 'no_weight'> {
  const size = BigInt(Math.abs(minor(total)))
  const shares = wholeWeights('allocate', weights)
  const whole = sum(shares)
  if (whole === 0n) return refuse('no_weight')
  const floors = shares.map((share) => (size * share) / whole)
  const remainders = shares.map((share) => (size * share) % whole)
  const spare = Number(size - sum(floors))
  const takers = new Set(
    remainders
      .map((_, i) => i)
      .sort((a, b) => compare(remainders[b]!, remainders[a]!) || a - b)
      .slice(0, spare),
  )
  const sign = total < 0 ? -1n : 1n
  return ok(floors.map((part, i) => minor(Number(sign * (part + (takers.has(i) ? 1n : 0n))))))
}

function compare(a: bigint, b: bigint): number {
  return a < b ? -1 : a > b ? 1 : 0
}

/**
 * Splits a number of units over a mix so that no part ever shrinks as the total grows (Sainte-Laguë):
 * the next unit goes where weight ÷ (2·given + 1) is greatest.
 * Units:    whole units; weights are whole and relative to one another.
 * Domain:   total a safe integer ≥ 0, weights whole ≥ 0 → otherwise RangeError.
 * Refuses:  'no_weight' when there are no weights or all are 0.
 * Rounding: highest quotient, ties to the earlier.
 * Accuracy: exact.
 * Source:   Webster / Sainte-Laguë; Balinski & Young, Fair Representation, app. A.
 * Cost:     independent of the total; weights² at worst.
 * @example  divide(10, [1, 1, 4])  // → ok([2, 2, 6])
 */
export function divide(total: number, weights: readonly number[]): Result<number[], 'no_weight'> {
  if (!Number.isSafeInteger(total) || total < 0) {
    throw new RangeError(`divide: total must be a whole number ≥ 0, got ${total}`)
  }
  const shares = wholeWeights('divide', weights)
  const whole = sum(shares)
  if (whole === 0n) return refuse('no_weight')
  // Rounding at the divisor whole/total gives a complete head of the queue of quotients, at most a few units off.
  const given = shares.map((share) => (2n * share * BigInt(total) + whole) / (2n * whole))
  let missing = BigInt(total) - sum(given)
  for (; missing > 0n; missing -= 1n) given[nextInQueue(shares, given)]! += 1n
  for (; missing < 0n; missing += 1n) given[lastInQueue(shares, given)]! -= 1n
  return ok(given.map(Number))
}

/** Who gets the next unit: the highest weight ÷ (2·given + 1), ties to the earlier. */
function nextInQueue(shares: readonly bigint[], given: readonly bigint[]): number {
  let best = 0
  for (let i = 1; i < shares.length; i++) {
    if (shares[i]! * (2n * given[best]! + 1n) > shares[best]! * (2n * given[i]! + 1n)) best = i
  }
  return best
}

/** Who got the last unit: the lowest weight ÷ (2·given − 1) among those that have one, ties to the later. */
function lastInQueue(shares: readonly bigint[], given: readonly bigint[]): number {
  let last = given.findIndex((units) => units > 0n)
  for (let i = last + 1; i < shares.length; i++) {
    if (given[i]! === 0n) continue
    if (shares[i]! * (2n * given[last]! - 1n) <= shares[last]! * (2n * given[i]! - 1n)) last = i
  }
  return last
}
