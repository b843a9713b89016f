/**
 * The path of a hatching at 45° inside a rectangle, lines `gap` apart, as explicit segments: it prints, needs no
 * pattern id, and stands right next to another hatching without a seam.
 */
export function hatchPath(x: number, y: number, width: number, height: number, gap = 6): string {
  if (width <= 0 || height <= 0) return ''
  const segments: string[] = []
  // Each line is x + y = c; lines are counted from the origin so that neighbouring rectangles continue each other.
  for (let c = Math.ceil((x + y) / gap) * gap; c <= x + width + y + height; c += gap) {
    const startX = Math.max(x, c - y - height)
    const endX = Math.min(x + width, c - y)
    if (endX > startX)
      segments.push(`M${round(startX)} ${round(c - startX)}L${round(endX)} ${round(c - endX)}`)
  }
  return segments.join('')
}

/** Tenths of a pixel are enough for a drawing and keep the page small. */
export function round(value: number): number {
  return Math.round(value * 10) / 10
}
