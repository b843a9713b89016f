import { wholeFrom } from '../stats/argument'

/** Widths that are made otherwise than the rule says, in hundredths of a millimetre. Common practice, no source. */
const EXCEPTIONS: ReadonlyMap<number, number> = new Map([
  [1, 500],
  [6, 3000],
  [18, 9130],
])

/** One HP, 5.08 mm, in hundredths of a millimetre (IEC 60297-3). */
const HP_HUNDREDTHS = 508

/** From this width on a front panel has a second column of holes. Common practice, no source. */
const FOUR_HOLES_FROM_HP = 10

/**
 * The height of a 3 U front panel. Units: mm. Source: common practice, no source (the rack's 3 U are 133.35 mm).
 * @example PANEL_HEIGHT_MM_3U  // → 128.5
 */
export const PANEL_HEIGHT_MM_3U = 128.5

/**
 * The diameter of a mounting hole. Units: mm. Source: common practice, no source.
 * @example HOLE_MM  // → 3.2
 */
export const HOLE_MM = 3.2

/**
 * One unit of rack width. Units: mm. Source: IEC 60297-3.
 * @example HP_MM  // → 5.08
 */
export const HP_MM = 5.08

/**
 * The width a front panel is made to, a little less than its place so that neighbours fit.
 * Units: HP in, mm out.
 * Domain: whole hp ≥ 1 → otherwise RangeError.
 * Rounding: 5.08·hp − 0.3 in whole hundredths, cut to tenths; 1, 6 and 18 HP are made to 5.00, 30.00 and 91.30.
 * Source: common practice, no source.
 * @example panelWidthMm(8)  // → 40.3
 */
export function panelWidthMm(hp: number): number {
  wholeFrom(1, 'hp', hp)
  return Math.floor((EXCEPTIONS.get(hp) ?? HP_HUNDREDTHS * hp - 30) / 10) / 10
}

/**
 * The centres of the mounting holes, from the top left corner: 3.0 mm from the upper and lower edge (122.5 mm apart),
 * the first column 7.5 mm from the left. From 10 HP on a second column stands a multiple of 5.08 mm to the right,
 * hp − 3 places on; 1 and 2 HP, too narrow for 7.5, have theirs in the middle.
 * Units: HP in, mm out; upper holes first, from left to right.
 * Domain: whole hp ≥ 1 → otherwise RangeError.
 * Rounding: whole hundredths.
 * Source: common practice, no source.
 * @example holeCentresMm(4)  // → [{ x: 7.5, y: 3 }, { x: 7.5, y: 125.5 }]
 */
export function holeCentresMm(hp: number): { x: number; y: number }[] {
  const width = panelWidthMm(hp)
  const left = hp <= 2 ? width / 2 : 7.5
  const columns = hp >= FOUR_HOLES_FROM_HP ? [left, (750 + HP_HUNDREDTHS * (hp - 3)) / 100] : [left]
  return [3, PANEL_HEIGHT_MM_3U - 3].flatMap((y) => columns.map((x) => ({ x, y })))
}
