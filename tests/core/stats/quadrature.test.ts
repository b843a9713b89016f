import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { fourier, unitCircle } from '@/lib/core/stats/fourier'
import { gaussBeta } from '@/lib/core/stats/gauss-beta'
import { reaches } from '@/lib/core/stats/tie'

describe('gaussBeta', () => {
  test('two points for the uniform weight are ½ ± 1/√12 (Gauss–Legendre)', () => {
    const { points, weights } = gaussBeta(1, 1, 2)
    expect(points[0]).toBeCloseTo(0.5 - 1 / Math.sqrt(12), 15)
    expect(points[1]).toBeCloseTo(0.5 + 1 / Math.sqrt(12), 15)
    expect(Array.from(weights)).toEqual([expect.closeTo(0.5, 15), expect.closeTo(0.5, 15)])
  })
  test('Beta(½, ½) is Chebyshev: points sin²((2i + 1)π / 4n), equal weights', () => {
    const { points, weights } = gaussBeta(0.5, 0.5, 9)
    points.forEach((x, i) => expect(x).toBeCloseTo(Math.sin(((2 * i + 1) * Math.PI) / 36) ** 2, 14))
    for (const w of weights) expect(w).toBeCloseTo(1 / 9, 14)
  })
  test('is exact for every power below 2·size: moments α…(α+k−1) / s…(s+k−1)', () => {
    const shape = fc.double({ min: 0.02, max: 1e4, noNaN: true })
    fc.assert(
      fc.property(shape, shape, fc.integer({ min: 1, max: 30 }), (alpha, beta, size) => {
        const { points, weights } = gaussBeta(alpha, beta, size)
        let moment = 1
        for (let k = 0; k < 2 * size; k += 1) {
          const found = weights.reduce((sum, w, i) => sum + w * points[i]! ** k, 0)
          expect(Math.abs(found - moment)).toBeLessThan(1e-13)
          moment *= (alpha + k) / (alpha + beta + k)
        }
        for (let i = 1; i < size; i += 1) expect(points[i]!).toBeGreaterThan(points[i - 1]!)
      }),
      { numRuns: 60 },
    )
  })
  test('RangeErrors', () => {
    expect(() => gaussBeta(0, 1, 3)).toThrow(/alpha/)
    expect(() => gaussBeta(1, Number.NaN, 3)).toThrow(/beta/)
    expect(() => gaussBeta(1, 1, 0)).toThrow(/size/)
  })
})

describe('fourier', () => {
  test('is Σ x(j) e^(−2πi·jk/n) by the definition', () => {
    const n = 32
    const re = Float64Array.from({ length: n }, (_, i) => ((i * 7) % 11) - 4)
    const im = Float64Array.from({ length: n }, (_, i) => ((i * 5) % 13) - 6)
    const [x, y] = [re.slice(), im.slice()]
    fourier(unitCircle(n), x, y)
    for (let k = 0; k < n; k += 1) {
      let sumRe = 0
      let sumIm = 0
      for (let j = 0; j < n; j += 1) {
        const angle = (-2 * Math.PI * j * k) / n
        sumRe += re[j]! * Math.cos(angle) - im[j]! * Math.sin(angle)
        sumIm += re[j]! * Math.sin(angle) + im[j]! * Math.cos(angle)
      }
      expect(x[k]).toBeCloseTo(sumRe, 11)
      expect(y[k]).toBeCloseTo(sumIm, 11)
    }
  })
  test('the circle is cosine and sine', () => {
    for (const size of [1, 2, 4, 64]) {
      const { cos, sin } = unitCircle(size)
      cos.forEach((c, j) => expect(c).toBeCloseTo(Math.cos((2 * Math.PI * j) / size), 14))
      sin.forEach((s, j) => expect(s).toBeCloseTo(Math.sin((2 * Math.PI * j) / size), 14))
    }
  })
  test('RangeErrors', () => {
    expect(() => unitCircle(12)).toThrow(/size must be a power of two, got 12/)
    expect(() => fourier(unitCircle(4), new Float64Array(3), new Float64Array(4))).toThrow(
      /must hold 4, got 3/,
    )
  })
})

test('reaches forgives rounding and nothing more', () => {
  expect(reaches(0.1 + 0.2 + 0.4, 0.7)).toBe(true)
  expect(reaches(0.7 - 1e-11, 0.7)).toBe(false)
})
