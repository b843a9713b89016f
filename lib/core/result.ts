/**
 * The answer to a question the world may not be able to answer: a value, or the reason there is none.
 * A caller's mistake is not a reason; it throws `RangeError`.
 */
export type Result<T, R extends string = never> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly reason: R }

/**
 * Wraps a value that could be found.
 * @example ok(3)  // → { ok: true, value: 3 }
 */
export function ok<T>(value: T): { readonly ok: true; readonly value: T } {
  return { ok: true, value }
}

/**
 * Says no, with a snake_case reason that finishes the sentence "refused because …".
 * @example refuse('not_sold')  // → { ok: false, reason: 'not_sold' }
 */
export function refuse<R extends string>(reason: R): { readonly ok: false; readonly reason: R } {
  return { ok: false, reason }
}
