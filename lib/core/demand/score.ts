import { share } from '../stats/argument'

/** A chance that was stated, and whether it came so. */
export type Stated = { readonly chance: number; readonly came: boolean }

/** Statements of about the same chance: how often it came. */
export type CalibrationRow = {
  /** Statements from this chance up to, but not at, the next (the last row: up to 1). */
  readonly from: number
  readonly to: number
  readonly stated: number
  readonly came: number
  /** The mean of the chances stated. */
  readonly meanChance: number
}

/**
 * How good stated chances were: the mean squared distance to what came, 0 at best; always saying one half scores 0.25.
 * Domain: chances from 0 to 1, at least one → otherwise RangeError.
 * Source: G. Brier, *Monthly Weather Review* 78 (1950) 1, in its two-class form.
 * @example brierScore([{ chance: 0.8, came: true }, { chance: 0.3, came: false }])  // → ≈ 0.065
 */
export function brierScore(statements: readonly Stated[]): number {
  if (statements.length === 0) throw new RangeError('statements must hold at least one, got none')
  const sum = statements.reduce(
    (total, { chance, came }) => total + (share('chance', chance) - (came ? 1 : 0)) ** 2,
    0,
  )
  return sum / statements.length
}

/**
 * Stated chances by fifths, each with how often it came; fifths nothing was stated in are left out.
 * Domain: chances from 0 to 1 → otherwise RangeError.
 * Source: reliability table, common practice (Murphy & Winkler 1977, from memory).
 * @example calibration([{ chance: 0.9, came: true }]).map(({ from, came }) => [from, came])  // → [[0.8, 1]]
 */
export function calibration(statements: readonly Stated[]): CalibrationRow[] {
  return [0, 1, 2, 3, 4].flatMap((fifth) => {
    const own = statements.filter(
      ({ chance }) => Math.min(4, Math.floor(share('chance', chance) * 5)) === fifth,
    )
    if (own.length === 0) return []
    return [
      {
        from: fifth / 5,
        to: (fifth + 1) / 5,
        stated: own.length,
        came: own.filter(({ came }) => came).length,
        meanChance: own.reduce((sum, { chance }) => sum + chance, 0) / own.length,
      },
    ]
  })
}
