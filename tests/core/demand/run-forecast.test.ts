import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { arrivals, stillToCome } from '@/lib/core/demand/clock'
import { forecastUnits } from '@/lib/core/demand/forecast'
import { newcomerUnits } from '@/lib/core/demand/newcomer-units'
import { arrivedSince, runForecast } from '@/lib/core/demand/run-forecast'

const silent = (count: number, arrivedShare: number, quantity = 1) =>
  Array.from({ length: count }, () => ({ quantity, arrivedShare }))
const listed = { name: 'certain', alpha: 6, beta: 4, ordered: 0, declined: 0, silent: silent(10, 0) }

describe('a run on its way', () => {
  test('before anybody could answer it is the plain forecast of the list', () => {
    const { forecast } = runForecast({ committed: 3, listed: [listed], newcomers: null })
    const plain = forecastUnits([{ alpha: 6, beta: 4, quantities: Array<number>(10).fill(1) }], {
      committed: 3,
    })
    expect([...forecast.pmf]).toEqual([...plain.pmf])
  })

  test('those who answered teach what to think of those who did not, and silence speaks against them', () => {
    const people = { ...listed, ordered: 12, declined: 3, silent: silent(20, 0.5) }
    const { forecast, groups } = runForecast({ committed: 12, listed: [people], newcomers: null })
    const still = stillToCome({ alpha: 18, beta: 7, arrivedShare: 0.5, silent: 20 })
    expect(groups[0]?.alpha).toBe(still.alpha)
    expect(forecast.mean).toBeCloseTo(12 + still.expected, 10)
  })

  test('at the end of the window nobody silent is expected', () => {
    const people = { ...listed, silent: silent(20, 1) }
    expect(runForecast({ committed: 4, listed: [people], newcomers: null }).forecast.mean).toBeCloseTo(4, 9)
  })

  test('the later it is, the less the silent are worth; nothing is lost of what is there', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.integer({ min: 0, max: 40 }),
        fc.integer({ min: 1, max: 30 }),
        (one, other, committed, count) => {
          const [early, late] = one < other ? [one, other] : [other, one]
          const at = (share: number) =>
            runForecast({
              committed,
              listed: [{ ...listed, silent: silent(count, share) }],
              newcomers: null,
            }).forecast
          expect(at(late).mean).toBeLessThanOrEqual(at(early).mean + 1e-9)
          expect(at(late).quantile(0.1)).toBeGreaterThanOrEqual(committed)
        },
      ),
    )
  })

  test('newcomers come on top, and are named apart', () => {
    const newcomers = { rate: { seen: 4, days: 9 }, daysLeft: 6, quantities: [1, 2] }
    const { forecast, fromListed, fromNewcomers } = runForecast({ committed: 1, listed: [listed], newcomers })
    // (4 + ½) people in 9 days make 3 in 6, one and a half units each; ten certain people make six.
    expect(fromNewcomers).toBeCloseTo(4.5, 12)
    expect(fromListed).toBeCloseTo(6, 12)
    expect(forecast.mean).toBeCloseTo(1 + 6 + 4.5, 12)
  })
})

describe('units of newcomers', () => {
  test('none, one and two units, by hand', () => {
    // One person seen nowhere in one day and one day left: P(0) = (1/2)^½, P(1) = ½·½·P(0), P(2) = ⅜·¼·P(0) (negative binomial).
    const none = Math.SQRT1_2
    const { pmf } = newcomerUnits({ rate: { seen: 0, days: 1 }, daysLeft: 1, quantities: [2] })
    expect(pmf[0]).toBeCloseTo(none, 12)
    expect(pmf[1]).toBe(0)
    expect(pmf[2]).toBeCloseTo(none / 4, 12)
    expect(pmf[4]).toBeCloseTo((none * 3) / 32, 12)
  })

  test('mean and spread given are those of the chances', () => {
    const { pmf, mean, sd } = newcomerUnits({
      rate: { seen: 7, days: 10 },
      daysLeft: 8,
      quantities: [1, 1, 3],
    })
    const at = [...pmf].reduce((sum, chance, k) => sum + chance * k, 0)
    const square = [...pmf].reduce((sum, chance, k) => sum + chance * (k - at) ** 2, 0)
    expect(mean).toBeCloseTo(at, 9)
    expect(sd).toBeCloseTo(Math.sqrt(square), 9)
  })

  test('nobody once no day is left', () => {
    expect(newcomerUnits({ rate: { seen: 5, days: 3 }, daysLeft: 0, quantities: [4] }).mean).toBe(0)
  })
})

describe('the share in by now of those asked later', () => {
  test('half of what is left of an even window', () => {
    expect(arrivedSince({ shareBy: (part) => part, tenths: [] }, 0.5, 0.75)).toBeCloseTo(0.5, 14)
  })
  test('none at the moment of asking, all at the end', () => {
    const curve = arrivals([])
    expect(arrivedSince(curve, 0.4, 0.4)).toBe(0)
    expect(arrivedSince(curve, 0.4, 1)).toBe(1)
    expect(arrivedSince(curve, 1, 1)).toBe(0)
  })
})
