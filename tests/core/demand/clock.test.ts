import { describe, expect, test } from 'vitest'
import { arrivals, newcomers, stillToCome } from '@/lib/core/demand/clock'
import { betaBinomialPmf } from '@/lib/core/demand/beta-binomial'
import { farthest } from './enumeration'

describe('stillToCome', () => {
  test.each([
    [{ alpha: 3, beta: 7, arrivedShare: 0.6, silent: 25 }, 0.05579810885951734, 0.0042386986267424922],
    [{ alpha: 60, beta: 40, arrivedShare: 0.95, silent: 200 }, 0.013070326235794596, 0.00017439409159553726],
  ])(
    '%o: mean and second moment of the chance by quadrature of Bayes’ rule (mpmath 1.3)',
    (ask, mean, square) => {
      const { chance, expected, alpha, beta } = stillToCome(ask)
      expect(chance).toBeCloseTo(mean, 13)
      expect(expected).toBeCloseTo(mean * ask.silent, 11)
      expect(alpha / (alpha + beta)).toBeCloseTo(mean, 13)
      expect((alpha * (alpha + 1)) / ((alpha + beta) * (alpha + beta + 1))).toBeCloseTo(square, 12)
    },
  )
  test('people still to come: counted over a fine grid of p', () => {
    const { people } = stillToCome({ alpha: 2, beta: 3, arrivedShare: 0.5, silent: 4 })
    const expected = [0, 0, 0, 0, 0]
    let all = 0
    for (let i = 0; i < 4000; i += 1) {
      const p = (i + 0.5) / 4000
      const weight = p * (1 - p) ** 2 * (1 - p / 2) ** 4
      const late = p / 2 / (1 - p / 2)
      all += weight
      ;[1, 4, 6, 4, 1].forEach(
        (ways, k) => (expected[k]! += weight * ways * late ** k * (1 - late) ** (4 - k)),
      )
    }
    expect(
      farthest(
        people.pmf,
        expected.map((x) => x / all),
      ),
    ).toBeLessThan(1e-7)
  })
  test('nobody could have answered yet: the beta-binomial, and the same Beta', () => {
    const { people, alpha, beta } = stillToCome({ alpha: 6, beta: 4, arrivedShare: 0, silent: 30 })
    expect(farthest(people.pmf, betaBinomialPmf(30, 6, 4))).toBeLessThan(1e-14)
    expect([alpha, beta]).toEqual([expect.closeTo(6, 9), expect.closeTo(4, 9)])
  })
  test('everybody would have answered: nothing is left', () => {
    const { chance, expected, people, alpha } = stillToCome({
      alpha: 6,
      beta: 4,
      arrivedShare: 1,
      silent: 30,
    })
    expect([chance, expected, people.atLeast(1)]).toEqual([0, 0, 0])
    expect(alpha).toBeLessThan(1e-9)
  })
  test('falls with time and with every further silent person', () => {
    const chance = (arrivedShare: number, silent: number) =>
      stillToCome({ alpha: 3, beta: 5, arrivedShare, silent }).chance
    for (let tenth = 0; tenth < 10; tenth += 1) {
      expect(chance(tenth / 10 + 0.1, 12)).toBeLessThan(chance(tenth / 10, 12))
      if (tenth > 0) expect(chance(tenth / 10, 13)).toBeLessThan(chance(tenth / 10, 12))
    }
  })
  test('one silent person, uniform: P(late | silent) = ∫p/2 / ∫(1 − p/2) = 1/3', () => {
    expect(stillToCome({ alpha: 1, beta: 1, arrivedShare: 0.5, silent: 1 }).chance).toBeCloseTo(1 / 3, 14)
  })
  test('nobody is silent: nobody comes', () => {
    const { expected, chance, people } = stillToCome({ alpha: 1, beta: 1, arrivedShare: 0, silent: 0 })
    expect([expected, chance, people.atLeast(1)]).toEqual([0, 0.5, 0])
  })
  test('RangeErrors', () => {
    const good = { alpha: 1, beta: 1, arrivedShare: 0.5, silent: 3 }
    expect(() => stillToCome({ ...good, alpha: 0 })).toThrow(/alpha/)
    expect(() => stillToCome({ ...good, beta: -1 })).toThrow(/beta/)
    expect(() => stillToCome({ ...good, arrivedShare: 1.1 })).toThrow(
      /arrivedShare must be from 0 to 1, got 1.1/,
    )
    expect(() => stillToCome({ ...good, silent: 2.5 })).toThrow(/silent/)
  })
})

describe('arrivals', () => {
  test('without history: a third in the first tenth, a quarter in the last (own values, no source)', () => {
    const { tenths, shareBy } = arrivals([])
    expect(tenths[0]).toBeCloseTo(0.33, 12)
    expect(tenths[9]).toBeCloseTo(0.25, 12)
    expect([shareBy(0), shareBy(1)]).toEqual([0, 1])
  })
  test('history outweighs the starting curve: 180 deposits at once, against its 20', () => {
    const { shareBy } = arrivals([new Array<number>(100).fill(0.02), new Array<number>(80).fill(0.02)])
    expect(shareBy(0.02)).toBeCloseTo((180 + 20 * 0.066) / 200, 12)
    expect(shareBy(0.01)).toBeCloseTo((20 * 0.033) / 200, 12)
  })
  test('never falls, from 0 to 1, whatever was seen', () => {
    const { shareBy, tenths } = arrivals([[0, 0.3, 0.3, 1, 0.99], [], [0.5]])
    let before = 0
    for (let part = 0; part <= 100; part += 1) {
      expect(shareBy(part / 100)).toBeGreaterThanOrEqual(before)
      before = shareBy(part / 100)
    }
    expect([shareBy(0), shareBy(1)]).toEqual([0, 1])
    expect(tenths.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 12)
  })
  test('RangeErrors', () => {
    expect(() => arrivals([[1.2]])).toThrow(/history must be from 0 to 1, got 1.2/)
    expect(() => arrivals([]).shareBy(-0.1)).toThrow(/part/)
  })
})

describe('newcomers', () => {
  test('the mean is rate × days; few days watched spread it', () => {
    const sure = newcomers({ rate: { seen: 300, days: 600 }, days: 10 })
    const unsure = newcomers({ rate: { seen: 5, days: 11 }, days: 10 })
    expect(sure.mean).toBeCloseTo((300.5 / 600) * 10, 12)
    expect(unsure.mean).toBeCloseTo(5, 12)
    expect(unsure.sd).toBeGreaterThan(sure.sd)
    for (const { pmf, mean, sd } of [sure, unsure]) {
      const first = pmf.reduce((sum, chance, k) => sum + k * chance, 0)
      const second = pmf.reduce((sum, chance, k) => sum + (k - first) ** 2 * chance, 0)
      expect(first).toBeCloseTo(mean, 11)
      expect(Math.sqrt(second)).toBeCloseTo(sd, 11)
      expect(pmf.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 13)
    }
  })
  test('is the mean over the rate of a Poisson count (summation over a fine grid)', () => {
    // Gamma(2.5, 4) for the rate, 3 days.
    let all = 0
    let none = 0
    let two = 0
    for (let i = 0; i < 60_000; i += 1) {
      const rate = (i + 0.5) / 5000
      const weight = rate ** 1.5 * Math.exp(-4 * rate)
      all += weight
      none += weight * Math.exp(-3 * rate)
      two += (weight * Math.exp(-3 * rate) * (3 * rate) ** 2) / 2
    }
    const { pmf } = newcomers({ rate: { seen: 2, days: 4 }, days: 3 })
    expect(pmf[0]).toBeCloseTo(none / all, 8)
    expect(pmf[2]).toBeCloseTo(two / all, 8)
  })
  test('a bare rate is a guess with half its size as spread; no days or no rate, nobody', () => {
    const guess = newcomers({ rate: 2, days: 1000 })
    expect([guess.mean, guess.sd / guess.mean]).toEqual([expect.closeTo(2000, 8), expect.closeTo(0.5, 2)])
    expect(Array.from(newcomers({ rate: 2, days: 0 }).pmf)).toEqual([1])
    expect(Array.from(newcomers({ rate: 0, days: 9 }).pmf)).toEqual([1])
  })
  test('RangeErrors', () => {
    expect(() => newcomers({ rate: -1, days: 3 })).toThrow(/rate must be 0 or more, got -1/)
    expect(() => newcomers({ rate: 1, days: Number.NaN })).toThrow(/days/)
    expect(() => newcomers({ rate: { seen: 1.5, days: 3 }, days: 3 })).toThrow(/rate.seen/)
    expect(() => newcomers({ rate: { seen: 1, days: 0 }, days: 3 })).toThrow(/rate.days/)
  })
})
