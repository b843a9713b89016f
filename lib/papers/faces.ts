import { join } from 'node:path'

/** Complete faces: a subset drops letters (Łódź). */
const face = (name: string) => join(process.cwd(), 'fonts', 'pdf', `${name}.ttf`)

export const REGULAR = 'regular'
export const BOLD = 'bold'

/**
 * The faces of the papers, in the order in which a letter is looked for: ours first, then one for Greek, Cyrillic and the
 * rest of Latin, then Chinese and Japanese, then Korean. The last two have one weight.
 */
const FILES: Readonly<Record<string, string>> = {
  [REGULAR]: face('atkinson-hyperlegible-next-regular'),
  [BOLD]: face('atkinson-hyperlegible-next-bold'),
  wide: face('dejavu-sans'),
  'wide bold': face('dejavu-sans-bold'),
  han: face('droid-sans-fallback-full'),
  hangul: face('nanum-gothic'),
}

/** The faces of a weight, ours first. */
export const facesFor = (bold: boolean) =>
  bold ? [BOLD, 'wide bold', 'han', 'hangul'] : [REGULAR, 'wide', 'han', 'hangul']

type Glyphs = { hasGlyphForCodePoint: (point: number) => boolean }
type Known = Map<string, Glyphs>
const opened = new WeakMap<PDFKit.PDFDocument, Known>()

export const regularFile = FILES[REGULAR]!

/** Makes the faces known to a paper; each is opened when its first letter is asked for. */
export function registerFaces(doc: PDFKit.PDFDocument): void {
  for (const [name, file] of Object.entries(FILES)) doc.registerFont(name, file)
  opened.set(doc, new Map())
}

function glyphsOf(doc: PDFKit.PDFDocument, name: string): Glyphs {
  const known = opened.get(doc)!
  const before = known.get(name)
  if (before) return before
  doc.font(name)
  const { font } = (doc as unknown as { _font: { font: Glyphs } })._font
  known.set(name, font)
  return font
}

export const hasLetter = (doc: PDFKit.PDFDocument, name: string, letter: string) =>
  glyphsOf(doc, name).hasGlyphForCodePoint(letter.codePointAt(0) ?? 0)

/** The face that prints a letter; null where none does. */
export const faceOf = (doc: PDFKit.PDFDocument, letter: string, bold: boolean): string | null =>
  facesFor(bold).find((name) => hasLetter(doc, name, letter)) ?? null
