/** How small beside the largest term a term may get before the series is cut. */
const CUT = 1e-22

/**
 * The chances of 0, 1, 2, … from the ratio of neighbours, scaled so that they add up to 1.
 * Starts at the most likely count and walks both ways, so that nothing is lost to underflow; an endless series is
 * cut where its terms fall below 1e-22 of the largest, a finite one ends where the ratio is 0.
 * Domain: `ratio(k)` = P(k+1)/P(k); `from` = the most likely count; `cut` = 0 keeps every term of a finite series.
 * Accuracy: relative error of a term about 2e-16 times its distance from `from`.
 * @example chancesFromRatio((k) => (2 - k) / (k + 1), 1)  // → new Float64Array([0.25, 0.5, 0.25])
 */
export function chancesFromRatio(ratio: (count: number) => number, from: number, cut = CUT): Float64Array {
  const up: number[] = [1]
  for (let k = from, term = 1; ; k += 1) {
    term *= ratio(k)
    if (!(term > cut)) break
    up.push(term)
  }
  const chances = new Float64Array(from + up.length)
  chances.set(up, from)
  for (let k = from - 1, term = 1; k >= 0 && term > 0; k -= 1) {
    term /= ratio(k)
    chances[k] = term
  }
  let total = 0
  for (const chance of chances) total += chance
  for (let k = 0; k < chances.length; k += 1) chances[k] = (chances[k] ?? 0) / total
  return chances
}
