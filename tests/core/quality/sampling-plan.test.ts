import { describe, expect, test } from 'vitest'
import { SAMPLING_105E } from '@/lib/core/data/sampling-105e'
import { acceptanceProbability } from '@/lib/core/quality/acceptance'
import { samplingPlan } from '@/lib/core/quality/sampling-plan'

describe('MIL-STD-105E, tables I and II-A', () => {
  test.each([
    [100, 1, 'F', 13, 0], // arrow up to E
    [250, 2.5, 'G', 32, 2],
    [250, 1, 'G', 50, 1], // arrow down to H
    [250, 0.65, 'G', 20, 0], // arrow up to F
    [5000, 2.5, 'L', 200, 10],
  ])(
    'lot %i, level II, AQL %d: letter %s, sample %i, accept %i',
    (lot, aqlPercent, letter, sample, accept) => {
      expect(samplingPlan({ lot, level: 'II', aqlPercent })).toEqual({
        ok: true,
        value: { letter, sample, accept, reject: accept + 1, inspectAll: false },
      })
    },
  )
  test('a sample as large as the lot means inspecting all', () => {
    expect(samplingPlan({ lot: 10, level: 'II', aqlPercent: 0.65 })).toEqual({
      ok: true,
      value: { letter: 'B', sample: 10, accept: 0, reject: 1, inspectAll: true },
    })
    expect(samplingPlan({ lot: 20, level: 'II', aqlPercent: 0.65 })).toMatchObject({
      value: { sample: 20, inspectAll: true },
    })
    expect(samplingPlan({ lot: 21, level: 'II', aqlPercent: 0.65 })).toMatchObject({
      value: { sample: 20, inspectAll: false },
    })
  })
  test('every lot size from 2, level and AQL leads to a plan', () => {
    for (const { from, to, letters } of SAMPLING_105E.codeLetters) {
      for (const level of Object.keys(letters) as (keyof typeof letters)[]) {
        for (const aqlPercent of SAMPLING_105E.aqlPercents) {
          for (const lot of [from, to ?? 10_000_000])
            expect(samplingPlan({ lot, level, aqlPercent }).ok).toBe(true)
        }
      }
    }
  })
  test('every plan accepts most lots that are as good as its AQL: 86 to 100 %, as the standard intends', () => {
    for (const { sample, accept } of SAMPLING_105E.plans) {
      accept.forEach((cell, column) => {
        if (typeof cell !== 'number') return
        const chance = acceptanceProbability(
          { sample, accept: cell },
          SAMPLING_105E.aqlPercents[column]! / 100,
        )
        expect(chance).toBeGreaterThan(0.86)
        expect(chance).toBeLessThan(0.9995)
      })
    }
  })
  test('the columns follow the diagonal rule 0, up, down, 1, 2, 3, 5, 7, 10, 14, 21 (from memory)', () => {
    const rule = [0, 'up', 'down', 1, 2, 3, 5, 7, 10, 14, 21]
    SAMPLING_105E.aqlPercents.forEach((_, column) => {
      const cells = SAMPLING_105E.plans.map(({ accept }) => accept[column]!)
      const first = cells.indexOf(0)
      if (first < 0) return
      cells.forEach((cell, i) => expect(cell).toBe(i < first ? 'down' : (rule[i - first] ?? 'up')))
    })
  })
  test('refusals', () => {
    const no = { ok: false, reason: 'not_in_table' }
    expect(samplingPlan({ lot: 1, level: 'II', aqlPercent: 1 })).toEqual(no)
    expect(samplingPlan({ lot: 100, level: 'II', aqlPercent: 1.2 })).toEqual(no)
    expect(samplingPlan({ lot: 100, level: 'II', aqlPercent: 10 })).toEqual(no)
    expect(samplingPlan({ lot: 100, level: 'IV' as 'III', aqlPercent: 1 })).toEqual(no)
  })
  test('RangeErrors', () => {
    expect(() => samplingPlan({ lot: 0, level: 'II', aqlPercent: 1 })).toThrow(
      /lot must be a whole number from 1, got 0/,
    )
    expect(() => samplingPlan({ lot: 10, level: 'II', aqlPercent: 0 })).toThrow(/aqlPercent/)
  })
})

describe('acceptanceProbability', () => {
  test('n = 52, c = 3: .980 at 2 %, .738 at 5 % (NIST e-Handbook 6.2.3.2 prints .739; from memory)', () => {
    expect(Math.abs(acceptanceProbability({ sample: 52, accept: 3 }, 0.02) - 0.98)).toBeLessThan(0.001)
    expect(Math.abs(acceptanceProbability({ sample: 52, accept: 3 }, 0.05) - 0.738)).toBeLessThan(0.001)
  })
  test('n = 80, c = 2 accepts 95, 50, 10 % at 1.03, 3.33, 6.52 % defective (MIL-STD-105E, table X-J; from memory)', () => {
    for (const [share, chance] of [
      [0.0103, 0.95],
      [0.0333, 0.5],
      [0.0652, 0.1],
    ] as const) {
      expect(Math.abs(acceptanceProbability({ sample: 80, accept: 2 }, share) - chance)).toBeLessThan(0.002)
    }
  })
  test('is the sum of binomial terms', () => {
    for (const p of [0.01, 0.1, 0.4]) {
      const sum = (1 - p) ** 30 + 30 * p * (1 - p) ** 29 + 435 * p * p * (1 - p) ** 28
      expect(acceptanceProbability({ sample: 30, accept: 2 }, p)).toBeCloseTo(sum, 12)
    }
    expect(acceptanceProbability({ sample: 5, accept: 5 }, 0.9)).toBe(1)
    expect([0, 1].map((p) => acceptanceProbability({ sample: 5, accept: 0 }, p))).toEqual([1, 0])
  })
  test('RangeErrors', () => {
    expect(() => acceptanceProbability({ sample: 0, accept: 0 }, 0.1)).toThrow(/sample/)
    expect(() => acceptanceProbability({ sample: 5, accept: -1 }, 0.1)).toThrow(/accept/)
    expect(() => acceptanceProbability({ sample: 5, accept: 0 }, 1.1)).toThrow(
      /fractionDefective must be from 0 to 1/,
    )
  })
})
