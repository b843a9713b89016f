/**
 * Whether a text can be read by a sorter who knows Latin letters only: accents and punctuation are fine, other scripts not.
 * Accuracy: by Unicode script of each letter; full-width Latin letters and digits count as Latin.
 * @example  isLatin('Łódź, Ærø 3')  // → true
 * @example  isLatin('東京都')  // → false
 */
export function isLatin(text: string): boolean {
  return !/\p{L}/u.test(text.normalize('NFKC').replace(/[\p{Script=Latin}\p{Script=Common}]/gu, ''))
}
