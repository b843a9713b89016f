import { describe, expect, test } from 'vitest'
import { finishDays, type FinishForecast, type ScheduleStep } from '@/lib/core/schedule/finish'
import { fine, simulate, step, within } from './summation'

function exactly(steps: readonly ScheduleStep[]): Extract<FinishForecast, { exact: true }> {
  const found = finishDays(steps)
  if (!found.ok || !found.value.exact) throw new Error('expected an exact finish')
  return found.value
}

function bounded(steps: readonly ScheduleStep[]): Extract<FinishForecast, { exact: false }> {
  const found = finishDays(steps)
  if (!found.ok || found.value.exact) throw new Error('expected bounds')
  return found.value
}

describe('certain steps are the longest path', () => {
  const plan = [step('a', 3, 3, 3), step('b', 5, 5, 5), step('c', 4, 4, 4, 'a', 'b'), step('d', 1, 1, 1, 'a')]
  test('to the day', () => {
    const { chanceBy, dayFor, mean, criticalShare } = exactly(plan)
    expect([chanceBy(8.9), chanceBy(9), chanceBy(400)]).toEqual([0, 1, 1])
    expect([dayFor(0.01), dayFor(0.99), mean]).toEqual([9, 9, 9])
    expect(criticalShare).toEqual({ a: 0, b: 1, c: 1, d: 0 })
  })
  test('a tie counts half to either side', () => {
    expect(exactly([step('a', 5, 5, 5), step('b', 5, 5, 5)]).criticalShare).toEqual({ a: 0.5, b: 0.5 })
  })
  test('no steps are done on day 0; a third of a day keeps its mean', () => {
    const nothing = exactly([])
    expect([nothing.chanceBy(0), nothing.dayFor(0.9), nothing.mean, nothing.criticalShare]).toEqual([
      1,
      0,
      0,
      {},
    ])
    expect(exactly([step('a', 1.3, 1.3, 1.3)]).mean).toBeCloseTo(1.3, 12)
  })
})

test('one step is its Beta at every half day', () => {
  const boards = step('boards', 8, 10, 21)
  const { chanceBy, mean } = exactly([boards])
  for (let day = 7; day <= 22; day += 0.5) expect(chanceBy(day)).toBeCloseTo(within(boards, day), 12)
  expect(mean).toBeCloseTo((8 + 40 + 21) / 6, 2)
})

test('side by side: the product of the chances at every half day', () => {
  const [a, b, c] = [step('a', 2, 5, 9), step('b', 4, 4.5, 12), step('c', 6, 6, 6)]
  const { chanceBy } = exactly([a, b, c])
  for (let day = 3; day <= 13; day += 0.5) {
    expect(chanceBy(day)).toBeCloseTo(within(a, day) * within(b, day) * within(c, day), 12)
  }
})

test('one after the other: the sum by fine summation', () => {
  const [a, b] = [step('a', 2, 5, 12), step('b', 3, 4, 15, 'a')]
  const { chanceBy, mean } = exactly([a, b])
  for (let day = 5; day <= 27; day += 0.5) {
    const sum = fine(a, 2000).reduce(
      (total, { day: first, chance }) => total + chance * within(b, day - first),
      0,
    )
    expect(Math.abs(chanceBy(day) - sum)).toBeLessThan(0.003)
  }
  expect(mean).toBeCloseTo(34 / 6 + 34 / 6, 2)
})

/** a is shared: c waits for a, d for a and b. */
const bridge = [
  step('a', 2, 4, 9),
  step('b', 1, 5, 9),
  step('c', 3, 4, 9, 'a'),
  step('d', 2, 4, 10, 'a', 'b'),
]

describe('one shared step', () => {
  test('is taken as given, by fine summation over it', () => {
    const [a, b, c, d] = bridge as [ScheduleStep, ScheduleStep, ScheduleStep, ScheduleStep]
    const { chanceBy } = exactly(bridge)
    for (const day of [7, 9, 11, 13, 16]) {
      let sum = 0
      for (const x of fine(a, 150)) {
        for (const y of fine(b, 150)) {
          const start = Math.max(x.day, y.day)
          sum += x.chance * y.chance * within(c, day - x.day) * within(d, day - start)
        }
      }
      expect(Math.abs(chanceBy(day) - sum)).toBeLessThan(0.006)
    }
  })
  test('treating the ways as independent would be wrong by more than that', () => {
    const [a, b, c, d] = bridge as [ScheduleStep, ScheduleStep, ScheduleStep, ScheduleStep]
    const viaC = fine(a, 400).reduce((sum, x) => sum + x.chance * within(c, 9.5 - x.day), 0)
    const viaD = fine(a, 200).reduce(
      (sum, x) =>
        sum +
        fine(b, 200).reduce((s, y) => s + x.chance * y.chance * within(d, 9.5 - Math.max(x.day, y.day)), 0),
      0,
    )
    expect(exactly(bridge).chanceBy(9.5) - viaC * viaD).toBeGreaterThan(0.02)
  })
})

/** Two shared steps: a before c and d, b before d and e; all three meet in f. */
const two = [
  step('a', 2, 4, 9),
  step('b', 1, 5, 9),
  step('c', 3, 6, 9, 'a'),
  step('d', 2, 4, 10, 'a', 'b'),
  step('e', 1, 4, 12, 'b'),
  step('f', 2, 3, 8, 'c', 'd', 'e'),
]
/** Every two neighbours wait for the same step: more than two are shared. */
const many = [
  step('a', 2, 4, 9),
  step('b', 1, 5, 9),
  step('z', 1, 5, 10),
  step('c', 3, 4, 9, 'a'),
  step('d', 2, 4, 10, 'a', 'b'),
  step('e', 1, 4, 12, 'b', 'z'),
  step('y', 1, 4, 9, 'z'),
  step('f', 2, 3, 8, 'c', 'd'),
  step('g', 1, 3, 9, 'd', 'e'),
  step('h', 1, 3, 9, 'e', 'y'),
]
/** Both c and d wait for both a and b: series and parallel once the meeting is seen. */
const meeting = [
  step('a', 1, 2, 5),
  step('b', 2, 3, 9),
  step('c', 3, 4, 6, 'a', 'b'),
  step('d', 1, 2, 8, 'a', 'b'),
]

describe('against simulation (40,000 runs, standard error .0025)', () => {
  test.each([
    ['meeting', meeting],
    ['one shared step', bridge],
    ['two shared steps', two],
  ])('%s: chances and critical shares', (_, plan) => {
    const { chanceBy, dayFor, criticalShare } = exactly(plan)
    const { days, critical } = simulate(plan, 40_000)
    for (let day = 0; day < 40; day += 0.5) {
      const share = days.filter((each) => each <= day).length / days.length
      expect(Math.abs(chanceBy(day) - share)).toBeLessThan(0.018)
    }
    expect(Math.abs(dayFor(0.8) - days[32_000]!)).toBeLessThan(0.6)
    for (const { id } of plan) expect(Math.abs(criticalShare[id]! - critical[id]!)).toBeLessThan(0.015)
  })

  test('too many shared steps: honest bounds around it', () => {
    const { chanceBy, dayFor, mean, criticalShare } = bounded(many)
    const { days, critical } = simulate(many, 40_000)
    for (let day = 0; day < 60; day += 0.5) {
      const share = days.filter((each) => each <= day).length / days.length
      const { low, high } = chanceBy(day)
      expect(low).toBeLessThanOrEqual(high)
      expect(share).toBeGreaterThan(low - 0.01)
      expect(share).toBeLessThan(high + 0.01)
    }
    for (const chance of [0.1, 0.5, 0.8, 0.95]) {
      const { low, high } = dayFor(chance)
      expect(low - 0.1).toBeLessThan(days[chance * 40_000]!)
      expect(high + 0.1).toBeGreaterThan(days[chance * 40_000]!)
    }
    const simulated = days.reduce((a, b) => a + b, 0) / days.length
    expect(mean.low).toBeLessThan(simulated)
    expect(mean.high).toBeGreaterThan(simulated)
    for (const { id } of many) {
      expect(criticalShare[id]!.low).toBeLessThanOrEqual(critical[id]!)
      expect(criticalShare[id]!.high).toBeGreaterThanOrEqual(critical[id]!)
    }
  })

  test('with bounds, a step every way passes decides for certain, and one that cannot be late never does', () => {
    const first = many.map((each) => (each.after.length === 0 ? { ...each, after: ['order'] } : each))
    const { criticalShare } = bounded([step('order', 1, 1, 2), ...first, step('labels', 0, 1, 2)])
    expect(criticalShare['labels']).toEqual({ low: 0, high: 0 })
    expect(criticalShare['a']).toEqual({ low: 0, high: 1 })
    expect(bounded([step('order', 1, 1, 2), ...first]).criticalShare['order']).toEqual({ low: 1, high: 1 })
  })
})

describe('laws', () => {
  test('shares of the last steps add up to 1, and of the first steps too', () => {
    for (const plan of [bridge, meeting]) {
      const { criticalShare } = exactly(plan)
      expect(criticalShare['a']! + criticalShare['b']!).toBeCloseTo(1, 2)
      expect(criticalShare['c']! + criticalShare['d']!).toBeCloseTo(1, 2)
    }
  })
  test('chances never fall with the day, and dayFor is the first half day that reaches them', () => {
    for (const plan of [two, bridge]) {
      const { chanceBy, dayFor } = exactly(plan)
      for (let day = 0; day < 40; day += 0.25)
        expect(chanceBy(day + 0.25)).toBeGreaterThanOrEqual(chanceBy(day) - 1e-15)
      for (const chance of [0.05, 0.5, 0.8, 0.95]) {
        expect(chanceBy(dayFor(chance))).toBeGreaterThanOrEqual(chance - 1e-12)
        expect(chanceBy(dayFor(chance) - 0.5)).toBeLessThan(chance)
      }
    }
  })
  test('the order of the steps and what follows from the rest change nothing', () => {
    const { chanceBy } = exactly(two)
    const turned = exactly([...two].reverse())
    const wordy = exactly(
      two.map((each) => (each.id === 'f' ? { ...each, after: ['a', 'b', 'c', 'd', 'e', 'c'] } : each)),
    )
    for (let day = 5; day < 30; day += 1.5) {
      expect(turned.chanceBy(day)).toBeCloseTo(chanceBy(day), 9)
      expect(wordy.chanceBy(day)).toBeCloseTo(chanceBy(day), 9)
    }
  })
})

describe('refusals and RangeErrors', () => {
  test('a step that waits for one that is not there, or for itself in the end', () => {
    expect(finishDays([step('a', 1, 2, 3, 'b')])).toEqual({ ok: false, reason: 'unknown_step' })
    expect(finishDays([step('a', 1, 2, 3, 'a')])).toEqual({ ok: false, reason: 'cycle' })
    expect(finishDays([step('a', 1, 2, 3, 'c'), step('b', 1, 2, 3, 'a'), step('c', 1, 2, 3, 'b')])).toEqual({
      ok: false,
      reason: 'cycle',
    })
  })
  test('estimates out of order, ids twice, days and chances that are none', () => {
    expect(() => finishDays([step('a', 3, 2, 4)])).toThrow(/likely must be at least optimistic, got 2/)
    expect(() => finishDays([step('a', 1, 2, 10_001)])).toThrow(/pessimistic must be at most 10000/)
    expect(() => finishDays([step('a', 1, 2, 3), step('a', 1, 2, 3)])).toThrow(/distinct ids, got a twice/)
    const { chanceBy, dayFor } = exactly(bridge)
    expect(() => chanceBy(Number.NaN)).toThrow(/day/)
    for (const chance of [0, 1]) expect(() => dayFor(chance)).toThrow(/chance must be above 0 and below 1/)
  })
})
