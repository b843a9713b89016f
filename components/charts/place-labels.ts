type Label = { centre: number; width: number }

/**
 * Rows for labels along a line so that no two in a row touch; each goes to the lowest row with room.
 * Labels are moved inwards first where they would leave the drawing.
 */
export function placeLabels(
  labels: readonly Label[],
  bounds: { from: number; to: number; gap?: number },
): { left: number; row: number }[] {
  const gap = bounds.gap ?? 8
  const rowEnds: number[] = []
  const order = labels
    .map((label, index) => ({
      index,
      left: clamp(label.centre - label.width / 2, bounds.from, bounds.to - label.width),
      width: label.width,
    }))
    .sort((a, b) => a.left - b.left || a.index - b.index)
  const placed: { left: number; row: number }[] = []
  for (const { index, left, width } of order) {
    const free = rowEnds.findIndex((end) => end + gap <= left)
    const row = free === -1 ? rowEnds.length : free
    rowEnds[row] = left + width
    placed[index] = { left, row }
  }
  return placed
}

function clamp(value: number, least: number, most: number): number {
  return Math.max(least, Math.min(value, most))
}

/** The width of a label in the narrow monospaced face: measured as 0.61 of its size, which `.figures` makes nine tenths. */
export function labelWidth(text: string, size: 13 | 15 = 13): number {
  return text.length * size * 0.9 * 0.61
}
