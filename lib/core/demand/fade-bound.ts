import type { Rule } from '../stats/gauss-beta'

/** Grid points per factor of e in the fade. */
const PER_E = 6

/**
 * A bound, falling in `fade`, of the logarithm of a class's characteristic function: ln Σ wᵢ exp(−pᵢ(1−pᵢ)·fade), looked
 * up at the next lower point of a geometric grid.
 * Domain: 0 ≤ fade ≤ most (more gives the bound of `most`).
 * Cost: O(points · ln most) once, then one logarithm.
 * @example fadeBound({ points: new Float64Array([0.5]), weights: new Float64Array([1]) }, 4)(0)  // → 0
 */
export function fadeBound({ points, weights }: Rule, most: number): (fade: number) => number {
  const count = Math.max(1, Math.ceil(PER_E * Math.log(Math.max(1, most))) + 1)
  const table = Float64Array.from({ length: count }, (_, i) => {
    const fade = Math.exp(i / PER_E)
    let sum = 0
    for (let k = 0; k < points.length; k += 1) {
      const p = points[k] as number
      sum += (weights[k] as number) * Math.exp(-p * (1 - p) * fade)
    }
    return Math.min(0, Math.log(sum))
  })
  return (fade) => (fade < 1 ? 0 : (table[Math.min(count - 1, Math.floor(PER_E * Math.log(fade)))] as number))
}
