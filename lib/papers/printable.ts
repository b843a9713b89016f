type Glyphs = { hasGlyphForCodePoint: (point: number) => boolean }

function glyphsOf(doc: PDFKit.PDFDocument): (letter: string) => boolean {
  const { font } = (doc as unknown as { _font: { font: Glyphs } })._font
  return (letter) => letter === '\n' || font.hasGlyphForCodePoint(letter.codePointAt(0) ?? 0)
}

/** Whether the face has every letter of a text. */
export const isPrintable = (doc: PDFKit.PDFDocument, text: string) =>
  [...text.normalize('NFC')].every(glyphsOf(doc))

/**
 * The text as the face can print it. A letter it lacks would vanish without a trace: it loses its accent where the bare
 * letter is there, and becomes a question mark where it is not.
 */
export function printable(doc: PDFKit.PDFDocument, text: string): string {
  const has = glyphsOf(doc)
  return [...text.normalize('NFC')]
    .map((letter) => (has(letter) ? letter : ([...letter.normalize('NFD')].find(has) ?? '?')))
    .join('')
}
