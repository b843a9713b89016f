import { describe, expect, test } from 'vitest'
import { HOLE_MM, holeCentresMm, HP_MM, PANEL_HEIGHT_MM_3U, panelWidthMm } from '@/lib/core/rack/front-panel'
import { railBudget } from '@/lib/core/rack/power'

describe('front panels (common practice, no source)', () => {
  test.each([
    [1, 5],
    [2, 9.8],
    [4, 20],
    [6, 30],
    [8, 40.3],
    [10, 50.5],
    [12, 60.6],
    [14, 70.8],
    [16, 80.9],
    [18, 91.3],
    [20, 101.3],
    [28, 141.9],
    [42, 213],
  ])('%i HP is made %d mm wide', (hp, mm) => expect(panelWidthMm(hp)).toBe(mm))

  test('no front panel is wider than its place, or more than 0.4 mm narrower, but for the narrowest two exceptions', () => {
    for (let hp = 2; hp <= 168; hp += 1) {
      const gap = HP_MM * hp - panelWidthMm(hp)
      expect(gap).toBeGreaterThan(0)
      expect(gap).toBeLessThan(hp === 6 ? 0.5 : 0.4)
    }
  })
  test('3 U: 128.5 mm high, holes of 3.2 mm, 3.0 mm from the edges and so 122.5 mm apart', () => {
    expect([PANEL_HEIGHT_MM_3U, HOLE_MM]).toEqual([128.5, 3.2])
    for (const hp of [1, 2, 4, 8, 10, 42]) {
      const ys = [...new Set(holeCentresMm(hp).map(({ y }) => y))]
      expect(ys).toEqual([3, 125.5])
    }
  })
  test('the first column is 7.5 mm from the left, the second a multiple of 5.08 on', () => {
    expect(holeCentresMm(8)).toEqual([
      { x: 7.5, y: 3 },
      { x: 7.5, y: 125.5 },
    ])
    expect(holeCentresMm(10).map(({ x }) => x)).toEqual([7.5, 43.06, 7.5, 43.06])
    for (let hp = 10; hp <= 84; hp += 1) {
      const [left, right] = holeCentresMm(hp)
      expect((right!.x - left!.x) / 5.08).toBeCloseTo(hp - 3, 9)
      // As far from the right edge as from the left, to the play that is cut off.
      expect(panelWidthMm(hp) - right!.x).toBeGreaterThan(7)
      expect(panelWidthMm(hp) - right!.x).toBeLessThan(7.6)
    }
  })
  test('too narrow for 7.5 mm: in the middle', () => {
    expect([holeCentresMm(1)[0]!.x, holeCentresMm(2)[0]!.x]).toEqual([2.5, 4.9])
  })
  test('RangeErrors', () => {
    for (const hp of [0, -2, 4.5, Number.NaN]) {
      expect(() => panelWidthMm(hp)).toThrow(/hp must be a whole number from 1/)
      expect(() => holeCentresMm(hp)).toThrow(RangeError)
    }
  })
})

describe('railBudget', () => {
  const supply = { plus12Ma: 1000, minus12Ma: 100, plus5Ma: 0 }
  test('adds up each rail and says which is overdrawn; the limit itself is not', () => {
    const kedge = { plus12Ma: 60, minus12Ma: 55, plus5Ma: 0 }
    expect(railBudget([kedge, kedge], supply)).toEqual({
      used: { plus12Ma: 120, minus12Ma: 110, plus5Ma: 0 },
      left: { plus12Ma: 880, minus12Ma: -10, plus5Ma: 0 },
      overdrawn: ['minus12Ma'],
    })
    expect(railBudget([], supply).left).toEqual(supply)
  })
  test('RangeErrors', () => {
    expect(() => railBudget([{ plus12Ma: -1, minus12Ma: 0, plus5Ma: 0 }], supply)).toThrow(
      /plus12Ma .* got -1/,
    )
    expect(() => railBudget([], { ...supply, plus5Ma: Number.NaN })).toThrow(/supply.plus5Ma/)
  })
})
