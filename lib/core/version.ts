/**
 * Version of the calculations, frozen with every decision taken on them. It rises when the same inputs may give another
 * figure; wording and speed do not count.
 * @example CORE_VERSION  // → '2'
 */
export const CORE_VERSION = '2'
