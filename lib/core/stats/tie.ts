/**
 * How far below a wanted chance a computed one may lie and still count as reaching it.
 * Sums of doubles miss an exact tie (½ + ¼ against ¾, or 5 of 10 equally likely counts) by some 1e-16 each;
 * no decision in a workshop turns on a chance of 1e-12.
 * @example TIE  // → 1e-12
 */
export const TIE = 1e-12

/**
 * Whether a computed chance reaches a wanted one, an exact tie lost to rounding included.
 * @example reaches(0.1 + 0.2 + 0.4, 0.7)  // → true
 */
export function reaches(chance: number, wanted: number): boolean {
  return chance >= wanted - TIE
}
