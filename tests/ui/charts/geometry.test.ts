import fc from 'fast-check'
import { expect, test } from 'vitest'
import { hatchPath } from '@/components/charts/hatch'
import { labelWidth, placeLabels } from '@/components/charts/place-labels'
import { spread } from '@/components/charts/run-line-down'
import { dayNumber, dayScale } from '@/components/charts/run-line-scale'

const side = fc.integer({ min: 1, max: 400 })

test('hatching stays inside its rectangle, at 45°', () => {
  fc.assert(
    fc.property(side, side, side, side, (x, y, width, height) => {
      for (const [, x1, y1, x2, y2] of hatchPath(x, y, width, height).matchAll(
        /M([\d.]+) ([\d.]+)L([\d.]+) ([\d.]+)/g,
      )) {
        for (const at of [x1, x2]) expect(Number(at)).toBeGreaterThanOrEqual(x)
        for (const at of [x1, x2]) expect(Number(at)).toBeLessThanOrEqual(x + width)
        for (const at of [y1, y2]) expect(Number(at)).toBeGreaterThanOrEqual(y)
        for (const at of [y1, y2]) expect(Number(at)).toBeLessThanOrEqual(y + height)
        expect(Number(x2) - Number(x1)).toBeCloseTo(Number(y1) - Number(y2), 5)
      }
    }),
  )
})

test('hatching covers a rectangle and leaves an empty one alone', () => {
  // Anti-diagonals x + y = 0, 10, 20, 30, 40 of a 20 × 20 square; those at the corners have no length.
  expect(hatchPath(0, 0, 20, 20, 10).match(/M/g)).toHaveLength(3)
  expect(hatchPath(0, 0, 20, 0)).toBe('')
  expect(hatchPath(0, 0, -4, 10)).toBe('')
})

test('labels of a row never touch, and stay in the drawing', () => {
  const labels = fc.array(
    fc.record({ centre: fc.integer({ min: -50, max: 800 }), width: fc.integer({ min: 5, max: 200 }) }),
    { maxLength: 14 },
  )
  fc.assert(
    fc.property(labels, (all) => {
      const placed = placeLabels(all, { from: 0, to: 720, gap: 8 })
      placed.forEach((a, i) => {
        expect(a.left).toBeGreaterThanOrEqual(0)
        expect(a.left + all[i]!.width).toBeLessThanOrEqual(720)
        placed.forEach((b, j) => {
          if (i === j || a.row !== b.row) return
          const apart = a.left + all[i]!.width + 8 <= b.left || b.left + all[j]!.width + 8 <= a.left
          expect(apart).toBe(true)
        })
      })
    }),
  )
})

test('longer words are wider', () => {
  expect(labelWidth('abcd')).toBeCloseTo(2 * labelWidth('ab'), 10)
  expect(labelWidth('ab', 15)).toBeGreaterThan(labelWidth('ab'))
})

test('entries keep their order and their distance, and never move up', () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 0, max: 500 })), (some) => {
      const positions = [...some].sort((a, b) => a - b)
      const moved = spread(
        positions,
        positions.map(() => 18),
      )
      moved.forEach((at, i) => {
        expect(at).toBeGreaterThanOrEqual(positions[i]!)
        if (i > 0) expect(at - moved[i - 1]!).toBeGreaterThanOrEqual(18)
      })
    }),
  )
})

const step = (from: string, to: string) => ({ key: from, name: 'x', from, to, state: 'done' as const })

test('days stand in true proportion, a step ending with its last day', () => {
  const scale = dayScale({ steps: [step('2027-03-01', '2027-03-10')], today: '2027-03-06' }, [0, 100])
  expect(scale.at('2027-03-01')).toBe(0)
  expect(scale.at('2027-03-10', true)).toBe(100)
  expect(scale.at('2027-03-06')).toBe(50)
  expect(scale.hasToday).toBe(true)
})

test('a today far away does not squash the line', () => {
  const facts = { steps: [step('2027-03-01', '2027-03-10')], today: '2029-01-01' }
  const scale = dayScale(facts, [0, 100])
  expect(scale.hasToday).toBe(false)
  expect(scale.at('2027-03-10', true)).toBe(100)
})

test('day numbers count from 1970 across a leap day', () => {
  expect(dayNumber('1970-01-01')).toBe(0)
  // 2028 is a leap year: from 28 February to 1 March are two days.
  expect(dayNumber('2028-03-01') - dayNumber('2028-02-28')).toBe(2)
  expect(() => dayNumber('soon')).toThrow(/soon/)
})
