import { expect, test } from 'vitest'
import { STARTING_CONVERSION, updateConversion } from '@/lib/core/demand/conversion'
import { together } from '@/lib/core/demand/together'
import { forecastOf } from '@/lib/core/demand/units-forecast'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { convolve, farthest } from './enumeration'

test('a uniform prior and 437 of 980 make Beta(438, 544), mean .446 (Gelman et al., BDA, ch. 2; from memory)', () => {
  const posterior = updateConversion({ alpha: 1, beta: 1 }, { converted: 437, notConverted: 543 })
  expect(posterior).toEqual({ alpha: 438, beta: 544 })
  expect(posterior.alpha / (posterior.alpha + posterior.beta)).toBeCloseTo(0.446, 3)
})

test('starting conversions fall with certainty, and deposit holders mostly pay', () => {
  const mean = ({ alpha, beta }: { alpha: number; beta: number }) => alpha / (alpha + beta)
  const { certain, likely, curious, depositHolder, oldSignUp } = STARTING_CONVERSION
  expect(mean(depositHolder)).toBeGreaterThan(mean(certain))
  expect(mean(certain)).toBeGreaterThan(mean(likely))
  expect(mean(likely)).toBeGreaterThan(mean(oldSignUp))
  expect(mean(oldSignUp)).toBeGreaterThan(mean(curious))
})

test('RangeErrors of updateConversion', () => {
  expect(() => updateConversion({ alpha: 0, beta: 1 }, { converted: 1, notConverted: 1 })).toThrow(/alpha/)
  expect(() => updateConversion({ alpha: 1, beta: -1 }, { converted: 1, notConverted: 1 })).toThrow(/beta/)
  expect(() => updateConversion({ alpha: 1, beta: 1 }, { converted: -1, notConverted: 1 })).toThrow(
    /^converted/,
  )
  expect(() => updateConversion({ alpha: 1, beta: 1 }, { converted: 1, notConverted: 0.5 })).toThrow(
    /notConverted/,
  )
})

test('together adds independent counts', () => {
  const a = forecastUnits([{ alpha: 2, beta: 3, quantities: [1, 2, 2] }], { committed: 4 })
  const b = forecastUnits([{ alpha: 1, beta: 3, quantities: [3, 1] }])
  const sum = together([a, b])
  expect(farthest(sum.pmf, convolve(a.pmf, b.pmf))).toBeLessThan(1e-15)
  expect(sum.mean).toBeCloseTo(a.mean + b.mean, 12)
  expect(sum.sd).toBeCloseTo(Math.hypot(a.sd, b.sd), 12)
  expect(Array.from(together([]).pmf)).toEqual([1])
})

test('forecastOf wants chances that add up to 1', () => {
  expect(() => forecastOf(new Float64Array([0.5, 0.4]))).toThrow(/pmf must add up to 1, got 0.9/)
  expect(() => forecastOf(new Float64Array([1.5, -0.5]))).toThrow(/got -0.5 at 1/)
  const { mean, sd } = forecastOf(new Float64Array([0.25, 0.5, 0.25]))
  expect([mean, sd]).toEqual([1, Math.SQRT1_2])
})
