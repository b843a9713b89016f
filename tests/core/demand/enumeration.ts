import type { Group } from '@/lib/core/demand/group'

/** x (x+1) … (x+k−1) / (y (y+1) … (y+k−1)), term by term. */
function risingRatio(x: number, y: number, k: number): number {
  let product = 1
  for (let i = 0; i < k; i += 1) product *= (x + i) / (y + i)
  return product
}

/**
 * The distribution of one class without quadrature or transforms: subsets counted by (people, units), each weighted by
 * E[p^k (1−p)^(n−k)], a product of n ratios.
 */
export function enumerateGroup({ alpha, beta, quantities }: Group): number[] {
  const n = quantities.length
  const units = quantities.reduce((a, b) => a + b, 0)
  const subsets = Array.from({ length: n + 1 }, () => new Float64Array(units + 1))
  subsets[0]![0] = 1
  quantities.forEach((quantity, i) => {
    for (let k = i + 1; k >= 1; k -= 1) {
      const from = subsets[k - 1]!
      const to = subsets[k]!
      for (let u = units; u >= quantity; u -= 1) to[u]! += from[u - quantity]!
    }
  })
  const pmf = new Array<number>(units + 1).fill(0)
  for (let k = 0; k <= n; k += 1) {
    // E[p^k (1−p)^(n−k)] = α…(α+k−1) · β…(β+n−k−1) / ((α+β)…(α+β+n−1))
    const weight = risingRatio(alpha, alpha + beta, k) * risingRatio(beta, alpha + beta + k, n - k)
    for (let u = 0; u <= units; u += 1) pmf[u]! += subsets[k]![u]! * weight
  }
  return pmf
}

/** The distribution of a sum of independent counts, by the definition. */
export function convolve(a: ArrayLike<number>, b: ArrayLike<number>): number[] {
  const sum = new Array<number>(a.length + b.length - 1).fill(0)
  for (let i = 0; i < a.length; i += 1) for (let j = 0; j < b.length; j += 1) sum[i + j]! += a[i]! * b[j]!
  return sum
}

/** The largest difference between two lists of chances; lengths may differ by trailing zeros. */
export function farthest(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let worst = 0
  for (let k = 0; k < Math.max(a.length, b.length); k += 1)
    worst = Math.max(worst, Math.abs((a[k] ?? 0) - (b[k] ?? 0)))
  return worst
}
