import poisson from '@stdlib/stats-base-dists-poisson'
import { expect, test } from 'vitest'
import { sparesFor } from '@/lib/core/size/spares'

test('500 posted, 2 % fail: 18 spares last with 99 % (Devore, Table A.2: Poisson 10)', () => {
  expect(sparesFor({ shipped: 500, failureRate: 0.02, confidence: 0.99 })).toBe(18)
})

test('agrees with @stdlib on a grid', () => {
  for (const shipped of [1, 40, 165, 1000]) {
    for (const failureRate of [0.003, 0.02, 0.11]) {
      for (const confidence of [0.5, 0.9, 0.99, 0.9999]) {
        expect(sparesFor({ shipped, failureRate, confidence })).toBe(
          // Its quantile of a likely 0 is −0.
          poisson.quantile(confidence, shipped * failureRate) + 0,
        )
      }
    }
  }
})

test('nothing posted or nothing failing needs no spare', () => {
  expect(sparesFor({ shipped: 0, failureRate: 0.5, confidence: 0.99 })).toBe(0)
  expect(sparesFor({ shipped: 90, failureRate: 0, confidence: 0.99 })).toBe(0)
})

test('RangeErrors', () => {
  expect(() => sparesFor({ shipped: -1, failureRate: 0.1, confidence: 0.9 })).toThrow(/shipped/)
  expect(() => sparesFor({ shipped: 1, failureRate: 1.1, confidence: 0.9 })).toThrow(
    /failureRate must be from 0 to 1/,
  )
  expect(() => sparesFor({ shipped: 1, failureRate: 0.1, confidence: 1 })).toThrow(/confidence/)
})
