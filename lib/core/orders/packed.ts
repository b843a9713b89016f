/** What one piece weighs and measures packed for the post: whole grams and millimetres. */
export type PackedPiece = {
  readonly quantity: number
  readonly grams: number
  readonly sizeMm: readonly [number, number, number]
}

/**
 * What pieces weigh and measure in one parcel: weights add up; the parcel is at least as long and wide as its longest and
 * widest piece, and as high as their volumes ask for, turned into a cube where that would be higher than long.
 * Units:    whole grams and millimetres.
 * Domain:   at least one piece, quantities whole ≥ 1, weights and sides > 0 → otherwise RangeError.
 * Rounding: the height up to a whole millimetre.
 * Source:   own rule: a quote needs a size before anything is packed; the packer measures the parcel itself.
 * @example packedTogether([{ quantity: 2, grams: 420, sizeMm: [200, 140, 60] }])  // → { grams: 840, sizeMm: [200, 140, 120] }
 * @example packedTogether([{ quantity: 10, grams: 1, sizeMm: [100, 100, 100] }])  // → { grams: 10, sizeMm: [216, 216, 216] }
 */
export function packedTogether(pieces: readonly PackedPiece[]): {
  grams: number
  sizeMm: [number, number, number]
} {
  if (pieces.length === 0) throw new RangeError('packedTogether: pieces must not be empty')
  pieces.forEach(assertPiece)
  const grams = pieces.reduce((sum, piece) => sum + piece.quantity * piece.grams, 0)
  const volume = pieces.reduce((sum, { quantity, sizeMm: [a, b, c] }) => sum + quantity * a * b * c, 0)
  const [length, width] = [0, 1].map((side) =>
    Math.max(...pieces.map(({ sizeMm }) => [...sizeMm].sort((a, b) => b - a)[side]!)),
  ) as [number, number]
  const height = Math.ceil(volume / (length * width))
  if (height <= length) return { grams, sizeMm: [length, width, height] }
  const side = Math.ceil(Math.cbrt(volume))
  return { grams, sizeMm: [Math.max(length, side), Math.max(width, side), side] }
}

function assertPiece({ quantity, grams, sizeMm }: PackedPiece): void {
  if (!Number.isSafeInteger(quantity) || quantity < 1)
    throw new RangeError(`packedTogether: quantity must be a whole number ≥ 1, got ${quantity}`)
  if (!(grams > 0) || !Number.isFinite(grams))
    throw new RangeError(`packedTogether: grams must be above 0, got ${grams}`)
  if (sizeMm.some((mm) => !(mm > 0) || !Number.isFinite(mm)))
    throw new RangeError(`packedTogether: sizeMm must be above 0, got ${sizeMm.join(' × ')}`)
}
