import type { Circle } from '../stats/fourier'
import type { Rule } from '../stats/gauss-beta'
import { type Counted, edgeSeries, type EdgeSeries } from './edge-series'
import { fadeBound } from './fade-bound'

/** A complex function on the frequencies 0 … size/2; the other half is its mirror. */
export type Spectrum = { readonly re: Float64Array; readonly im: Float64Array }

/** The characteristic function of one class, frequency by frequency from 0 on. */
export type ClassSpectrum = {
  /** Goes to the next frequency (the first call to 0) and gives a bound of ln |value| there. */
  readonly next: () => number
  /** Puts the value there into `sum`, leaving out terms below e^−limit. */
  readonly put: (sum: Float64Array, limit: number) => void
}

/** Contributions below e^−LIMIT (6e-18) of the whole are left out: less than a double can show. */
const LIMIT = 39.7

/** Which quantities are multiplied in after each squaring, from the highest bit of the head counts down. */
function ladderOf(counted: Counted): Int32Array[] {
  let bits = 0
  for (const { people } of counted) bits = Math.max(bits, 32 - Math.clz32(people))
  return Array.from({ length: bits }, (_, up) =>
    Int32Array.from(counted.flatMap(({ people }, at) => ((people >> (bits - 1 - up)) & 1 ? [at] : []))),
  )
}

/** Adds weight · ∏ (1 + p·step)^people to `sum`; all powers share their squarings (Straus's method). */
function addPowers(
  sum: Float64Array,
  p: number,
  weight: number,
  ladder: Int32Array[],
  step: Float64Array,
): void {
  let re = 1
  let im = 0
  for (let up = 0; up < ladder.length; up += 1) {
    const rung = ladder[up] as Int32Array
    const square = re * re - im * im
    im = 2 * re * im
    re = square
    for (let r = 0; r < rung.length; r += 1) {
      const at = 2 * (rung[r] as number)
      const x = 1 + p * (step[at] as number)
      const y = p * (step[at + 1] as number)
      const next = re * x - im * y
      im = re * y + im * x
      re = next
    }
  }
  sum[0] = (sum[0] as number) + weight * re
  sum[1] = (sum[1] as number) + weight * im
}

/** Adds the values of p between the two edges, as far as they still count. */
function addMiddle(
  sum: Float64Array,
  { points, weights }: Rule,
  edges: EdgeSeries,
  fade: number,
  limit: number,
  ladder: Int32Array[],
  step: Float64Array,
): void {
  for (let i = edges.leftEnd; i < edges.rightStart; i += 1) {
    const p = points[i] as number
    const loss = p * (1 - p) * fade
    if (loss > limit && p < 0.5) {
      // Beyond here the loss only grows until the mirror image of p.
      while (i + 1 < edges.rightStart && (points[i + 1] as number) < 1 - p) i += 1
      continue
    }
    if (loss - (edges.logWeights[i] as number) <= limit) addPowers(sum, p, weights[i] as number, ladder, step)
  }
}

/**
 * The mean over p of ∏ (1 − p + p·z^q)^people for a class; `rule` holds the values of p and their weights, rising.
 * |1 − p + p·z^q|² = 1 − 2p(1−p)(1 − cos qω), so each term is at most exp(−p(1−p)·fade) with
 * fade = Σ people·(1 − cos qω), and most are nothing; near p = 0 or 1 the logarithm is a short power series in p;
 * elsewhere all powers share their squarings.
 * Domain: the circle holds more points than the class asked units.
 */
export function classSpectrum(counted: Counted, rule: Rule, { size, cos, sin }: Circle): ClassSpectrum {
  const ladder = ladderOf(counted)
  const edges = edgeSeries(counted, rule)
  const kinds = counted.length
  const people = Float64Array.from(counted, (each) => each.people)
  const bound = fadeBound(rule, 2 * people.reduce((sum, count) => sum + count, 0))
  // Where z^q stands on the circle, moved on by q with each frequency; the last entry follows z^units.
  const stride = Int32Array.from([...counted.map((each) => each.quantity), edges.units])
  const place = new Int32Array(kinds + 1).map((_, i) => size - (stride[i] as number))
  const step = new Float64Array(2 * kinds) // z^q − 1, real and imaginary by turns
  let fade = 0
  const next = () => {
    fade = 0
    for (let i = 0; i <= kinds; i += 1) {
      const moved = (place[i] as number) + (stride[i] as number)
      place[i] = moved < size ? moved : moved - size
    }
    for (let i = 0; i < kinds; i += 1) {
      const at = place[i] as number
      const x = (cos[at] as number) - 1
      step[2 * i] = x
      step[2 * i + 1] = sin[at] as number
      fade -= (people[i] as number) * x
    }
    return bound(fade)
  }
  const put = (sum: Float64Array, limit: number) => {
    sum[0] = 0
    sum[1] = 0
    const all = place[kinds] as number
    edges.add(sum, step, fade, limit, cos[all] as number, sin[all] as number)
    addMiddle(sum, rule, edges, fade, limit, ladder, step)
  }
  return { next, put }
}

/**
 * The product of the classes' characteristic functions, times `weight`. Where the bounds say that it is nothing, nothing
 * is worked out; elsewhere each class is worked out only as far as the others leave it to matter.
 * Accuracy: terms below 6e-18 are left out; rounding about 1e-16 per person, relative.
 * Cost: O(size · classes · √members) at worst, far less where conversions keep away from 0 and 1.
 */
export function productOf(classes: readonly ClassSpectrum[], weight: number, { size }: Circle): Spectrum {
  const half = size / 2 + 1
  const re = new Float64Array(half)
  const im = new Float64Array(half)
  const bounds = new Float64Array(classes.length)
  const value = new Float64Array(2)
  for (let j = 0; j < half; j += 1) {
    let left = LIMIT + Math.log(weight)
    for (let c = 0; c < classes.length; c += 1) {
      bounds[c] = (classes[c] as ClassSpectrum).next()
      left += bounds[c] as number
    }
    if (left <= 0) continue
    let x = weight
    let y = 0
    for (let c = 0; c < classes.length && left > 0; c += 1) {
      left -= bounds[c] as number
      ;(classes[c] as ClassSpectrum).put(value, left)
      const [a, b] = [value[0] as number, value[1] as number]
      left += Math.log(a * a + b * b) / 2
      const turned = x * a - y * b
      y = x * b + y * a
      x = turned
    }
    re[j] = left > 0 ? x : 0
    im[j] = left > 0 ? y : 0
  }
  return { re, im }
}
