import fc from 'fast-check'
import { expect, test } from 'vitest'
import { brierScore, calibration } from '@/lib/core/demand/score'

const said = (chance: number, came: boolean) => ({ chance, came })

test('the score by hand: sure and right is 0, sure and wrong is 1, one half is always a quarter', () => {
  expect(brierScore([said(1, true), said(0, false)])).toBe(0)
  expect(brierScore([said(1, false)])).toBe(1)
  expect(brierScore([said(0.5, true), said(0.5, false), said(0.5, true)])).toBe(0.25)
  // (0.2² + 0.3² + 0.6²) / 3
  expect(brierScore([said(0.8, true), said(0.3, false), said(0.4, true)])).toBeCloseTo(0.49 / 3, 14)
  expect(() => brierScore([])).toThrow(RangeError)
  expect(() => brierScore([said(1.1, true)])).toThrow(RangeError)
})

test('the table puts each statement into its fifth; the upper edge belongs to the next, 1 to the last', () => {
  const table = calibration([
    said(0.2, true),
    said(0.39, false),
    said(1, true),
    said(0.8, true),
    said(0, false),
  ])
  expect(table.map(({ from, stated, came }) => [from, stated, came])).toEqual([
    [0, 1, 0],
    [0.2, 2, 1],
    [0.8, 2, 2],
  ])
  expect(table[1]?.meanChance).toBeCloseTo(0.295, 14)
})

test('every statement stands in one row, and what came is kept', () => {
  const statements = fc.array(
    fc.record({ chance: fc.double({ min: 0, max: 1, noNaN: true }), came: fc.boolean() }),
    { minLength: 1 },
  )
  fc.assert(
    fc.property(statements, (all) => {
      const table = calibration(all)
      expect(table.reduce((sum, { stated }) => sum + stated, 0)).toBe(all.length)
      expect(table.reduce((sum, { came }) => sum + came, 0)).toBe(all.filter(({ came }) => came).length)
      expect(brierScore(all)).toBeGreaterThanOrEqual(0)
      expect(brierScore(all)).toBeLessThanOrEqual(1)
    }),
  )
})
