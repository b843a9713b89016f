declare const brand: unique symbol

/** A primitive that carries its meaning in the type only; at run time it is the bare primitive. */
export type Brand<T, B extends string> = T & { readonly [brand]: B }

/** Whole minor units of a currency (cents, yen, fils); a safe integer, negative where a movement goes out. */
export type Minor = Brand<number, 'Minor'>

/** A calendar day 'YYYY-MM-DD', in the workshop's zone unless said otherwise. */
export type Day = string

/**
 * Marks a safe integer as minor units.
 * Domain: safe integers → otherwise RangeError.
 * @example minor(2500)  // → 2500
 */
export function minor(amount: number): Minor {
  if (!Number.isSafeInteger(amount)) throw new RangeError(`minor: amount must be a safe integer, got ${amount}`)
  return amount as Minor
}
