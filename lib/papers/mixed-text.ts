import { BOLD, REGULAR } from './faces'
import { type Stretch, stretchesOf, WORDS } from './printable'

type Pdf = PDFKit.PDFDocument
type Styled = { size: number; bold: boolean; width: number }
type Line = { stretches: Stretch[]; width: number }

/** Whether a printable text needs more than the paper's own face. */
export function isMixed(doc: Pdf, text: string, bold: boolean): boolean {
  const own = bold ? BOLD : REGULAR
  return text.split('\n').some((line) => stretchesOf(doc, line, bold).some(({ face }) => face !== own))
}

function widthOf(doc: Pdf, stretches: readonly Stretch[], size: number): number {
  return stretches.reduce((sum, { face, text }) => sum + doc.font(face).fontSize(size).widthOfString(text), 0)
}

/** The text as lines that fit the width, each in stretches of one face. A word longer than a line stands alone on it. */
export function mixedLines(doc: Pdf, text: string, { size, bold, width }: Styled): Line[] {
  return text.split('\n').flatMap((paragraph) => {
    const lines: string[] = ['']
    for (const word of paragraph.match(WORDS) ?? []) {
      const tried = lines.at(-1) + word
      const isTooLong = widthOf(doc, stretchesOf(doc, tried.trimEnd(), bold), size) > width
      if (isTooLong && lines.at(-1) !== '') lines.push(word.trimStart())
      else lines[lines.length - 1] = tried
    }
    return lines.map((line) => {
      const stretches = stretchesOf(doc, line.trimEnd(), bold)
      return { stretches, width: widthOf(doc, stretches, size) }
    })
  })
}

/** The height of one line of the paper's own face, which every line of mixed text keeps. */
export function lineHeight(doc: Pdf, { size, bold }: Pick<Styled, 'size' | 'bold'>): number {
  return (
    doc
      .font(bold ? BOLD : REGULAR)
      .fontSize(size)
      .currentLineHeight(true) + 1
  )
}

/** Draws lines on one baseline each, whatever the faces' own heights are. */
export function drawMixed(
  doc: Pdf,
  lines: readonly Line[],
  at: Styled & { x: number; y: number; align: 'left' | 'right' },
): void {
  const height = lineHeight(doc, at)
  for (const [i, line] of lines.entries()) {
    let x = at.align === 'right' ? at.x + at.width - line.width : at.x
    for (const { face, text } of line.stretches) {
      doc.font(face).fontSize(at.size)
      doc.text(text, x, at.y + i * height + at.size, { lineBreak: false, baseline: 'alphabetic' })
      x += doc.widthOfString(text)
    }
  }
}
