import type { Circle } from '../stats/fourier'
import type { Rule } from '../stats/gauss-beta'
import { type Counted, edgeSeries, type EdgeSeries } from './edge-series'

/** A complex function on the frequencies 0 … size/2; the other half is its mirror. */
export type Spectrum = { readonly re: Float64Array; readonly im: Float64Array }

/** Contributions below e^−LIMIT (1e-18) of the whole are left out: less than a double can show. */
const LIMIT = 41.5

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
 * Multiplies into `running` the characteristic function of a class: the mean over p of ∏ (1 − p + p·z^q)^people.
 * `rule` holds the values of p and their weights, rising. Three facts keep it quick:
 * |1 − p + p·z^q|² = 1 − 2p(1−p)(1 − cos qω), so each term is at most exp(−p(1−p)·Σ people·(1 − cos qω)) and most are
 * nothing; near p = 0 or 1 the logarithm is a short power series in p; elsewhere all powers share their squarings.
 * Domain: the circle holds more points than the class asked units.
 * Accuracy: terms below 1e-18 are left out; rounding about 1e-16 per person, relative.
 * Cost: O(size · classes · √members) at worst, far less where p keeps away from 0 and 1.
 */
export function multiplySpectrum(running: Spectrum, counted: Counted, rule: Rule, circle: Circle): void {
  const { size, cos, sin } = circle
  const ladder = ladderOf(counted)
  const edges = edgeSeries(counted, rule)
  const kinds = counted.length
  const people = Float64Array.from(counted, (each) => each.people)
  // Where z^q stands on the circle, moved on by q with each frequency; the last entry follows z^units.
  const stride = Int32Array.from([...counted.map((each) => each.quantity), edges.units])
  const place = new Int32Array(kinds + 1)
  const step = new Float64Array(2 * kinds) // z^q − 1, real and imaginary by turns
  const sum = new Float64Array(2)
  for (let j = 0; j <= size / 2; j += 1) {
    const beforeRe = running.re[j] as number
    const beforeIm = running.im[j] as number
    const limit = LIMIT + Math.log(beforeRe * beforeRe + beforeIm * beforeIm) / 2
    sum[0] = 0
    sum[1] = 0
    if (limit > 0) {
      let fade = 0 // Σ people (1 − cos qω)
      for (let i = 0; i < kinds; i += 1) {
        const at = place[i] as number
        const x = (cos[at] as number) - 1
        step[2 * i] = x
        step[2 * i + 1] = sin[at] as number
        fade -= (people[i] as number) * x
      }
      const all = place[kinds] as number
      edges.add(sum, step, fade, limit, cos[all] as number, sin[all] as number)
      addMiddle(sum, rule, edges, fade, limit, ladder, step)
    }
    const re = sum[0] as number
    const im = sum[1] as number
    running.re[j] = beforeRe * re - beforeIm * im
    running.im[j] = beforeRe * im + beforeIm * re
    for (let i = 0; i <= kinds; i += 1) {
      const next = (place[i] as number) + (stride[i] as number)
      place[i] = next < size ? next : next - size
    }
  }
}
