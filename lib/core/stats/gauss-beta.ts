import { positive, wholeFrom } from './argument'

/** Points and weights of a quadrature rule; the weights add up to 1. */
export type Rule = { readonly points: Float64Array; readonly weights: Float64Array }

/** Applies the implicit QL turns for one eigenvalue block; `first` is the first row of the eigenvectors. */
function turn(diagonal: Float64Array, off: Float64Array, first: Float64Array, l: number, m: number): void {
  const at = (v: Float64Array, k: number) => v[k] as number
  let g = (at(diagonal, l + 1) - at(diagonal, l)) / (2 * at(off, l))
  let r = Math.hypot(g, 1)
  g = at(diagonal, m) - at(diagonal, l) + at(off, l) / (g + (g >= 0 ? r : -r))
  let s = 1
  let c = 1
  let p = 0
  for (let i = m - 1; i >= l; i -= 1) {
    const f = s * at(off, i)
    const b = c * at(off, i)
    r = Math.sqrt(f * f + g * g)
    off[i + 1] = r
    if (r === 0) {
      diagonal[i + 1] = at(diagonal, i + 1) - p
      off[m] = 0
      return
    }
    s = f / r
    c = g / r
    g = at(diagonal, i + 1) - p
    r = (at(diagonal, i) - g) * s + 2 * c * b
    p = s * r
    diagonal[i + 1] = g + p
    g = c * r - b
    const z = at(first, i + 1)
    first[i + 1] = s * at(first, i) + c * z
    first[i] = c * at(first, i) - s * z
  }
  diagonal[l] = at(diagonal, l) - p
  off[l] = g
  off[m] = 0
}

/** The eigenvalues of a symmetric tridiagonal matrix (into `diagonal`) and the first row of its eigenvectors. */
function solve(diagonal: Float64Array, off: Float64Array): Float64Array {
  const n = diagonal.length
  const first = new Float64Array(n)
  first[0] = 1
  for (let l = 0; l < n; l += 1) {
    for (;;) {
      let m = l
      while (m < n - 1) {
        const size = Math.abs(diagonal[m] as number) + Math.abs(diagonal[m + 1] as number)
        if (Math.abs(off[m] as number) <= Number.EPSILON * size) break
        m += 1
      }
      if (m === l) break
      turn(diagonal, off, first, l, m)
    }
  }
  return first
}

/**
 * Gauss's quadrature for a Beta(alpha, beta) weight: Σ wᵢ f(xᵢ) is the mean of f(p), p ~ Beta(alpha, beta), exact for
 * every polynomial f of degree below 2·size. Points rise.
 * Domain: alpha, beta > 0, whole size ≥ 1 → otherwise RangeError.
 * Accuracy: points and weights within 1e-14 (absolute); the moments of the Beta within 1e-13.
 * Source: G. Golub, J. Welsch, *Calculation of Gauss Quadrature Rules*, Math. Comp. 23 (1969) 221; the recurrence of
 * the Jacobi polynomials, NIST Digital Library of Mathematical Functions 18.9.
 * Cost: O(size²): 8 ms for 400 points.
 * @example gaussBeta(2, 2, 1).points[0]  // → ≈ 0.5
 */
export function gaussBeta(alpha: number, beta: number, size: number): Rule {
  positive('alpha', alpha)
  positive('beta', beta)
  wholeFrom(1, 'size', size)
  const s = alpha + beta
  const diagonal = new Float64Array(size)
  const off = new Float64Array(size)
  diagonal[0] = alpha / s
  if (size > 1) off[0] = Math.sqrt(((alpha / s) * (beta / s)) / (s + 1))
  for (let k = 1; k < size; k += 1) {
    const t = 2 * k + s
    diagonal[k] = 0.5 + (((alpha - beta) / t) * ((s - 2) / (t - 2))) / 2
    const j = k + 1
    const u = 2 * j + s - 2
    // Split so that no product overflows or loses digits for very large alpha + beta.
    const square = (j / (u + 1)) * ((j + alpha - 1) / u) * ((j + beta - 1) / u) * ((j + s - 2) / (u - 1))
    if (j < size) off[k] = Math.sqrt(square)
  }
  const first = solve(diagonal, off)
  const order = Array.from(diagonal, (_, k) => k).sort(
    (a, b) => (diagonal[a] as number) - (diagonal[b] as number),
  )
  let total = 0
  for (const z of first) total += z * z
  const points = Float64Array.from(order, (k) => Math.min(1, Math.max(0, diagonal[k] as number)))
  const weights = Float64Array.from(order, (k) => (first[k] as number) ** 2 / total)
  return { points, weights }
}
