import { positive, wholeFrom } from '../stats/argument'

/** A conversion that is not known exactly: p ~ Beta(alpha, beta). */
export type Conversion = { readonly alpha: number; readonly beta: number }

/** People of one class, who share one unknown conversion, with the units each of them asked for. */
export type Group = Conversion & { readonly quantities: readonly number[] }

/**
 * The most units a forecast can hold.
 * Our own limit: memory and time grow with it.
 * @example MOST_UNITS  // → 1000000
 */
export const MOST_UNITS = 1_000_000

/**
 * The units the people of a class asked for together.
 * Domain: alpha, beta > 0; whole quantities ≥ 1 → otherwise RangeError.
 * @example unitsAsked({ alpha: 1, beta: 1, quantities: [1, 1, 3] })  // → 5
 */
export function unitsAsked(group: Group): number {
  positive('alpha', group.alpha)
  positive('beta', group.beta)
  let sum = 0
  for (const quantity of group.quantities) sum += wholeFrom(1, 'quantity', quantity)
  return sum
}

/**
 * How many people asked for each quantity, in rising order of the quantity.
 * @example quantityCounts([2, 1, 2])  // → [{ quantity: 1, people: 1 }, { quantity: 2, people: 2 }]
 */
export function quantityCounts(quantities: readonly number[]): { quantity: number; people: number }[] {
  const people = new Map<number, number>()
  for (const quantity of quantities) people.set(quantity, (people.get(quantity) ?? 0) + 1)
  return [...people].sort(([a], [b]) => a - b).map(([quantity, count]) => ({ quantity, people: count }))
}
