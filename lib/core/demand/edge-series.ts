import type { Rule } from '../stats/gauss-beta'

/** How many people asked for each quantity. */
export type Counted = readonly { readonly quantity: number; readonly people: number }[]

/** The part of a class's characteristic function that comes from conversions near 0 and near 1. */
export type EdgeSeries = {
  /** The units the class asked for together. */
  readonly units: number
  /** Points before this index are near 0 … */
  readonly leftEnd: number
  /** … and points from this index on are near 1; both are summed by `add`. */
  readonly rightStart: number
  /** ln of each weight; −∞ where the weight is 0. */
  readonly logWeights: Float64Array
  /** Adds both edges to `sum` for one frequency: `step` holds z^q − 1, (allCos, allSin) is z^units. */
  readonly add: (
    sum: Float64Array,
    step: Float64Array,
    fade: number,
    limit: number,
    allCos: number,
    allSin: number,
  ) => void
}

/** Up to this distance r from 0 or 1 the series in r is used; 2r = 0.1 gains a digit with every term. */
const EDGE = 0.05
const MOST_TERMS = 28

/** How many terms of Σ ±(r·step)^k / k leave less than 1e-17 for all members together. */
function termsFor(members: number, r: number): number {
  let terms = 1
  for (let rest = 2 * members * r; terms < MOST_TERMS && rest > 1e-17; terms += 1) rest *= 2 * r
  return terms
}

/** The sums over the class of people · (z^q − 1)^k · (−1)^(k+1) / k, k = 1 … terms, real and imaginary by turns. */
function fill(out: Float64Array, counted: Counted, step: Float64Array, terms: number): void {
  out.fill(0, 0, 2 * terms + 2)
  for (let i = 0; i < counted.length; i += 1) {
    const x = step[2 * i] as number
    const y = step[2 * i + 1] as number
    let re = -(counted[i] as Counted[number]).people
    let im = 0
    for (let k = 2; k <= 2 * terms; k += 2) {
      const next = im * y - re * x
      im = -re * y - im * x
      re = next
      out[k] = (out[k] as number) + re
      out[k + 1] = (out[k + 1] as number) + im
    }
  }
  for (let k = 2; k <= terms; k += 1) {
    out[2 * k] = (out[2 * k] as number) / k
    out[2 * k + 1] = (out[2 * k + 1] as number) / k
  }
}

/**
 * Prepares the sum over the conversions near 0 and 1, where ln(1 + p(z^q − 1)) is a short power series in p
 * (near 1, in 1 − p after taking out z^q). Its coefficients are shared by all points of one frequency.
 * Accuracy: the cut leaves less than 1e-17 in the logarithm.
 */
export function edgeSeries(counted: Counted, { points, weights }: Rule): EdgeSeries {
  const members = counted.reduce((sum, each) => sum + each.people, 0)
  const count = points.length
  let leftEnd = 0
  while (leftEnd < count && (points[leftEnd] as number) <= EDGE) leftEnd += 1
  let rightStart = count
  while (rightStart > leftEnd && 1 - (points[rightStart - 1] as number) <= EDGE) rightStart -= 1
  const away = points.map((p, i) => (i < leftEnd ? p : 1 - p))
  const logWeights = weights.map((w) => (w > 0 ? Math.log(w) : -Infinity))
  const terms = Int32Array.from(away, (r, i) => (i < leftEnd || i >= rightStart ? termsFor(members, r) : 0))
  const series = new Float64Array(2 * MOST_TERMS + 2)
  const last = new Int32Array(2)

  /** The points of one edge that still count, walking inwards; how many terms the widest of them needs. */
  const reach = (from: number, to: number, by: number, fade: number, limit: number): number => {
    let most = 0
    let i = from
    for (; i !== to; i += by) {
      const r = away[i] as number
      if (r * (1 - r) * fade > limit) break
      most = Math.max(most, terms[i] as number)
    }
    last[by > 0 ? 0 : 1] = i
    return most
  }

  const addPoint = (sum: Float64Array, i: number, loss: number, limit: number): void => {
    if (loss - (logWeights[i] as number) > limit) return
    const r = away[i] as number
    let re = 0
    let im = 0
    for (let k = 2 * (terms[i] as number); k >= 2; k -= 2) {
      re = (re + (series[k] as number)) * r
      im = (im + (series[k + 1] as number)) * r
    }
    const length = (weights[i] as number) * Math.exp(re)
    sum[0] = (sum[0] as number) + length * Math.cos(im)
    sum[1] = (sum[1] as number) + length * Math.sin(im)
  }

  const mirror = new Float64Array(2)
  const add: EdgeSeries['add'] = (sum, step, fade, limit, allCos, allSin) => {
    const left = reach(0, leftEnd, 1, fade, limit)
    const right = reach(count - 1, rightStart - 1, -1, fade, limit)
    const most = Math.max(left, right)
    if (most === 0) return
    fill(series, counted, step, most)
    for (let i = 0; i < (last[0] as number); i += 1) {
      const r = away[i] as number
      addPoint(sum, i, r * (1 - r) * fade, limit)
    }
    mirror.fill(0)
    for (let i = count - 1; i > (last[1] as number); i -= 1) {
      const r = away[i] as number
      addPoint(mirror, i, r * (1 - r) * fade, limit)
    }
    const x = mirror[0] as number
    const y = -(mirror[1] as number)
    sum[0] = (sum[0] as number) + x * allCos - y * allSin
    sum[1] = (sum[1] as number) + x * allSin + y * allCos
  }
  const units = counted.reduce((sum, each) => sum + each.quantity * each.people, 0)
  return { units, leftEnd, rightStart, logWeights, add }
}
