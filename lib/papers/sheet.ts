import PDFDocument from 'pdfkit'
import { join } from 'node:path'
import type { PaperIssue } from '@/lib/contracts/papers'
import { QUIET_MODULES, code128 } from './code-128'
import { printable } from './printable'

export type Pdf = PDFKit.PDFDocument

/** Complete faces: a subset drops letters (Łódź). */
const face = (weight: string) =>
  join(process.cwd(), 'fonts', 'pdf', `atkinson-hyperlegible-next-${weight}.ttf`)
export const REGULAR = 'regular'
export const BOLD = 'bold'

export const MARGIN = 42
/** Kept free at the foot of each sheet for the title block. */
export const BLOCK_HEIGHT = 46
/** 0.33 mm: printed by any office printer, read by any scanner. */
const MODULE_WIDTH = 0.95

/** A blank paper: black on white, its pages kept until the title blocks are drawn. */
export function openSheet(issue: PaperIssue, title: string): Pdf {
  const doc = new PDFDocument({
    size: issue.size === 'A4' ? 'A4' : 'LETTER',
    margin: 0,
    bufferPages: true,
    tagged: true,
    font: face('regular'),
    lang: 'en-GB',
    displayTitle: true,
    info: { Title: title, Author: issue.workshop, Creator: 'Brimline', Producer: 'Brimline' },
  })
  doc.registerFont(REGULAR, face('regular'))
  doc.registerFont(BOLD, face('bold'))
  return doc.font(REGULAR).fillColor('black').strokeColor('black')
}

type Sized = { width: number; size?: number; bold?: boolean }
export type Written = Sized & { x: number; y: number; align?: 'left' | 'right'; as?: 'H1' | 'H2' | 'P' }

const roots = new WeakMap<Pdf, PDFKit.PDFStructureElement>()

function rootOf(doc: Pdf): PDFKit.PDFStructureElement {
  const known = roots.get(doc)
  if (known) return known
  const root = doc.struct('Document')
  doc.addStructure(root)
  roots.set(doc, root)
  return root
}

const lossy = new WeakMap<Pdf, number[]>()
/** Sheets, from 0, on which something could not be printed as it is written. */
export const lossySheets = (doc: Pdf): readonly number[] => lossy.get(doc) ?? []

export const widthOf = (doc: Pdf) => doc.page.width - 2 * MARGIN
/** Where a sheet's contents must end. */
export const floorOf = (doc: Pdf) => doc.page.height - MARGIN - BLOCK_HEIGHT

/** Writes a text, wrapped, and gives back the height it took. */
export function write(doc: Pdf, text: string, where: Written): number {
  const { x, y, width, align = 'left', as = 'P' } = where
  const height = measure(doc, text, where)
  const known = printable(doc, text)
  if (known !== text.normalize('NFC'))
    lossy.set(doc, [...lossySheets(doc), doc.bufferedPageRange().count - 1])
  rootOf(doc).add(doc.struct(as, {}, () => void doc.text(known, x, y, { width, align, lineGap: 1 })))
  return height
}

/** The height a text would take. */
export function measure(doc: Pdf, text: string, { width, size = 10, bold = false }: Sized): number {
  doc.font(bold ? BOLD : REGULAR).fontSize(size)
  return doc.heightOfString(printable(doc, text), { width, lineGap: 1 })
}

/** Draws what carries no meaning of its own: a reader of the screen passes over it. */
export function decorate(doc: Pdf, draw: () => void): void {
  doc.markContent('Artifact', { type: 'Layout' })
  draw()
  doc.endMarkedContent()
}

export function rule(doc: Pdf, y: number, thickness = 0.5): void {
  const right = doc.page.width - MARGIN
  decorate(doc, () => void doc.moveTo(MARGIN, y).lineTo(right, y).lineWidth(thickness).stroke())
}

export function tickBox(doc: Pdf, x: number, y: number): void {
  decorate(doc, () => void doc.rect(x, y, 10, 10).lineWidth(0.8).stroke())
}

/** Draws the bars between their blank margins; `x` is the left edge of the first bar's margin. */
export function drawCode128(
  doc: Pdf,
  text: string,
  { x, y, height }: { x: number; y: number; height: number },
): void {
  decorate(doc, () => {
    let at = x + QUIET_MODULES * MODULE_WIDTH
    for (const [i, modules] of code128(text).entries()) {
      const width = modules * MODULE_WIDTH
      if (i % 2 === 0) doc.rect(at, y, width, height).fill('black')
      at += width
    }
  })
}

/** Width of the drawn bars with their margins, in points. */
export function widthOfCode128(text: string): number {
  return (code128(text).reduce((sum, modules) => sum + modules, 0) + 2 * QUIET_MODULES) * MODULE_WIDTH
}

/** Closes the paper and gives it back whole. */
export async function finished(doc: Pdf): Promise<Buffer> {
  rootOf(doc).end()
  const chunks: Buffer[] = []
  doc.on('data', (chunk: Buffer) => chunks.push(chunk))
  const ended = new Promise<void>((resolve, reject) => doc.on('end', resolve).on('error', reject))
  doc.end()
  await ended
  return Buffer.concat(chunks)
}
