import { describe, expect, test } from 'vitest'
import { stepsFor, withClosures, type PlannedStep } from '@/lib/core/schedule/closures'

const step = (
  id: string,
  days: number,
  after: string[] = [],
  over: Partial<PlannedStep> = {},
): PlannedStep => ({
  ...{ id, optimistic: days, likely: days, pessimistic: days, after },
  ...over,
})
// 1 March 2027 is a Monday (by hand from 1 January 2027, a Friday).
const START = '2027-03-01'

describe('closed days', () => {
  test('within a step make it as much longer, weekends not counted', () => {
    // Ten working days from Monday 1 March end on Monday 15; Thursday 4 to Tuesday 9 hold four working days.
    const closed = { closedFrom: '2027-03-04', closedTo: '2027-03-09' }
    expect(withClosures([step('boards', 10, [], closed)], START, [])).toMatchObject([
      { longer: 4, step: { optimistic: 14, likely: 14, pessimistic: 14 } },
    ])
  })

  test('before its beginning or after its end change nothing', () => {
    const before = { closedFrom: '2027-02-01', closedTo: '2027-02-26' }
    const after = { closedFrom: '2027-03-10', closedTo: '2027-03-31' }
    expect(withClosures([step('a', 5, [], before)], START, [])[0]?.longer).toBe(0)
    expect(withClosures([step('a', 5, [], after)], START, [])[0]?.longer).toBe(0)
  })

  test('that begin just before the end hold the step until they are over', () => {
    // Five days end on Monday 8 March; closed from Monday 8 to Wednesday 10: three days more.
    const closed = { closedFrom: '2027-03-08', closedTo: '2027-03-10' }
    expect(withClosures([step('a', 5, [], closed)], START, [])[0]?.longer).toBe(3)
  })

  test('a step pushed back by another’s closure may run into its own, and own holidays count once', () => {
    const steps = [
      step('a', 5, [], { closedFrom: '2027-03-04', closedTo: '2027-03-05' }),
      // Begins after 5 + 2 days, on Wednesday 10; closed on Thursday 11.
      step('b', 2, ['a'], { closedFrom: '2027-03-11', closedTo: '2027-03-11' }),
    ]
    expect(withClosures(steps, START, []).map(({ longer }) => longer)).toEqual([2, 1])
    expect(withClosures(steps, START, ['2027-03-04', '2027-03-05'])[0]?.longer).toBe(0)
  })
})

describe('the steps of one offer', () => {
  test('leave out those of others and wait for what these waited for', () => {
    const steps = [
      step('boards', 10),
      step('building', 10, ['boards'], { offers: ['built'] }),
      step('testing', 5, ['building'], { offers: ['built'] }),
      step('posting', 3, ['testing', 'boards']),
    ]
    expect(stepsFor(steps, 'kit').map(({ id, after }) => [id, after])).toEqual([
      ['boards', []],
      ['posting', ['boards']],
    ])
    expect(stepsFor(steps, 'built')).toHaveLength(4)
  })

  test('in a circle do not go round for ever', () => {
    const steps = [
      step('a', 1, ['b'], { offers: ['built'] }),
      step('b', 1, ['a'], { offers: ['built'] }),
      step('c', 1, ['a']),
    ]
    expect(stepsFor(steps, 'kit').map(({ id, after }) => [id, after])).toEqual([['c', []]])
    expect(withClosures(steps, START, [])).toHaveLength(3)
  })
})
