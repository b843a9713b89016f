import { describe, expect, test } from 'vitest'
import { isWithinRange, type World } from './simulated-run'

const RUNS = 1200
const LOOKED_AT = [0, 0.1, 0.3, 0.5, 0.8, 0.95]

/** Of so many simulated runs, the share whose end lay within the 80 % range given at a part of the window. */
function covered(lookAt: number, runs: number, world: World = {}): number {
  let within = 0
  for (let run = 0; run < runs; run += 1)
    if (isWithinRange(1 + run + Math.round(lookAt * 1000) * 100_000, lookAt, world)) within += 1
  return within / runs
}

describe('over 1,200 simulated runs drawn from the model', () => {
  const table = LOOKED_AT.map((lookAt) => ({ lookAt, share: covered(lookAt, RUNS / LOOKED_AT.length) }))

  test('the 80 % range contains the end in 75 to 85 of 100', () => {
    const all = table.reduce((sum, { share }) => sum + share, 0) / table.length
    expect(all).toBeGreaterThan(0.75)
    expect(all).toBeLessThan(0.85)
  })

  // 200 runs each: four standard errors of a share of 0.8 are 11 points.
  test.each(table)('looked at when $lookAt of the window is gone', ({ share }) => {
    expect(Math.abs(share - 0.8)).toBeLessThan(0.11)
  })
})

describe('the range is too narrow when the model is wrong', () => {
  test.each<[string, number, World]>([
    ['people mean half of what they say, seen at the opening', 0, { sincerity: 0.5 }],
    ['a shock moves all classes together, seen at the opening', 0, { shock: 1 }],
    ['everybody waits for the last days, seen halfway', 0.5, { answersAt: (chance) => 0.9 + chance() / 10 }],
  ])('%s', (_, lookAt, world) => {
    const share = covered(lookAt, 300, world)
    expect(share).toBeLessThan(0.7)
  })
})
