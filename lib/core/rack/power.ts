import { notNegative } from '../stats/argument'

/** The three rails of the case: +12 V, −12 V, +5 V. */
export const RAILS = ['plus12Ma', 'minus12Ma', 'plus5Ma'] as const

/** Current on each rail, in milliamperes; a draw from −12 V counts positive too. */
export type RailCurrents = Readonly<Record<(typeof RAILS)[number], number>>

/** What is drawn from each rail and what is left; below 0 means the supply is too small. */
export type RailBudget = {
  readonly used: RailCurrents
  readonly left: RailCurrents
  /** Rails that are overdrawn, in the order of `RAILS`. */
  readonly overdrawn: readonly (typeof RAILS)[number][]
}

/**
 * Whether a supply feeds a set of modules: milliamperes drawn per rail and what is left. A rail drawn to its limit is
 * not overdrawn, though leaving a fifth free is common practice.
 * Units: mA.
 * Domain: currents of 0 or more → otherwise RangeError.
 * Source: sums; three rails are common practice, no source.
 * @example railBudget([{ plus12Ma: 60, minus12Ma: 45, plus5Ma: 0 }], { plus12Ma: 1000, minus12Ma: 500, plus5Ma: 500 }).left.plus12Ma  // → 940
 */
export function railBudget(modules: readonly RailCurrents[], supply: RailCurrents): RailBudget {
  const sumOf = (rail: (typeof RAILS)[number]) =>
    modules.reduce((sum, each) => sum + notNegative(rail, each[rail]), 0)
  const used = { plus12Ma: sumOf('plus12Ma'), minus12Ma: sumOf('minus12Ma'), plus5Ma: sumOf('plus5Ma') }
  const left = {
    plus12Ma: notNegative('supply.plus12Ma', supply.plus12Ma) - used.plus12Ma,
    minus12Ma: notNegative('supply.minus12Ma', supply.minus12Ma) - used.minus12Ma,
    plus5Ma: notNegative('supply.plus5Ma', supply.plus5Ma) - used.plus5Ma,
  }
  return { used, left, overdrawn: RAILS.filter((rail) => left[rail] < 0) }
}
