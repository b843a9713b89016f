import PDFDocument from 'pdfkit'
import type { PaperIssue } from '@/lib/contracts/papers'
import { QUIET_MODULES, code128 } from './code-128'
import { BOLD, REGULAR, registerFaces, regularFile } from './faces'
import { drawMixed, isMixed, lineHeight, mixedLines } from './mixed-text'
import { printable } from './printable'

export type Pdf = PDFKit.PDFDocument

export const MARGIN = 42
/** Kept free at the foot of each sheet for the title block. */
export const BLOCK_HEIGHT = 46
/** 0.33 mm: printed by any office printer, read by any scanner. */
const MODULE_WIDTH = 0.95
/** 0.25 mm, two dots of a label printer: bars on a narrow label may be as fine as that, no finer. */
const FINEST_MODULE = 0.72

const MM = 72 / 25.4
/** Width and height of each paper in points. The roll is cut after each label, so its height is that of the longest. */
const SHEETS: Readonly<Record<PaperIssue['size'], [number, number]>> = {
  A4: [595.28, 841.89],
  Letter: [612, 792],
  A6: [105 * MM, 148 * MM],
  '100x150': [100 * MM, 150 * MM],
  '4x6': [288, 432],
  roll62: [62 * MM, 130 * MM],
}
const sheetPoints = (size: PaperIssue['size']) => [...SHEETS[size]] as [number, number]

/** A blank paper: black on white, its pages kept until the title blocks are drawn. */
export function openSheet(issue: PaperIssue, title: string): Pdf {
  const doc = new PDFDocument({
    size: sheetPoints(issue.size),
    margin: 0,
    bufferPages: true,
    tagged: true,
    font: regularFile,
    lang: 'en-GB',
    displayTitle: true,
    info: { Title: title, Author: issue.workshop, Creator: 'Brimline', Producer: 'Brimline' },
  })
  registerFaces(doc)
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
  const { start, count } = doc.bufferedPageRange()
  if (known !== text.normalize('NFC')) lossy.set(doc, [...lossySheets(doc), start + count - 1])
  const { size = 10, bold = false } = where
  const draw = isMixed(doc, known, bold)
    ? () => drawMixed(doc, mixedLines(doc, known, { size, bold, width }), { ...where, size, bold, align })
    : () => void face(doc, size, bold).text(known, x, y, { width, align, lineGap: 1 })
  rootOf(doc).add(doc.struct(as, {}, draw))
  return height
}

/** The height a text would take. */
export function measure(doc: Pdf, text: string, { width, size = 10, bold = false }: Sized): number {
  const known = printable(doc, text)
  if (isMixed(doc, known, bold))
    return mixedLines(doc, known, { size, bold, width }).length * lineHeight(doc, { size, bold })
  return face(doc, size, bold).heightOfString(known, { width, lineGap: 1 })
}

const face = (doc: Pdf, size: number, bold: boolean) => doc.font(bold ? BOLD : REGULAR).fontSize(size)

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
  { x, y, height, width }: { x: number; y: number; height: number; width?: number },
): void {
  const module = moduleFor(text, width)
  decorate(doc, () => {
    let at = x + QUIET_MODULES * module
    for (const [i, modules] of code128(text).entries()) {
      if (i % 2 === 0) doc.rect(at, y, modules * module, height).fill('black')
      at += modules * module
    }
  })
}

const modulesOf = (text: string) =>
  code128(text).reduce((sum, modules) => sum + modules, 0) + 2 * QUIET_MODULES
const moduleFor = (text: string, width = Infinity) =>
  Math.min(MODULE_WIDTH, Math.max(FINEST_MODULE, width / modulesOf(text)))

/** Width of the drawn bars with their margins, in points; narrower where less room is given, as far as scanners read them. */
export function widthOfCode128(text: string, room?: number): number {
  return modulesOf(text) * moduleFor(text, room)
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
