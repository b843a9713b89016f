import type { PackingSlip, PackingSlips } from '@/lib/contracts/papers'
import { SLIP_WORDS } from '@/lib/messages/slip-words'
import {
  drawCode128,
  finished,
  floorOf,
  MARGIN,
  measure,
  openSheet,
  rule,
  widthOf,
  widthOfCode128,
  write,
  type Pdf,
} from './sheet'
import { isPrintable } from './printable'
import { drawTitleBlocks } from './title-block'

const wordsOf = ({ language }: PackingSlip) => SLIP_WORDS[language]
const english = SLIP_WORDS.en

/** Packing slips as PDF, one parcel after the other, each on sheets of its own with its own count of sheets. */
export async function packingSlipsPdf(given: PackingSlips): Promise<Buffer> {
  const doc = openSheet(given, `${english.name}: ${given.slips.map((slip) => slip.orderNumber).join(', ')}`)
  const papersOf: { what: string; from: number; to: number }[] = []
  for (const [i, slip] of given.slips.entries()) {
    if (i > 0) doc.addPage()
    const from = doc.bufferedPageRange().count - 1
    drawSlip(doc, given.from, slip)
    papersOf.push({ what: whatOf(slip), from, to: doc.bufferedPageRange().count - 1 })
  }
  for (const paper of papersOf) drawTitleBlocks(doc, given, paper)
  return finished(doc)
}

const parcelOf = ({ parcel, isReplacement }: PackingSlip, words = english) =>
  isReplacement ? words.replacement : words.parcel(parcel.nth, parcel.of)
// The title block is the packer's: it speaks as the rest of the papers do.
const whatOf = (slip: PackingSlip) => `${english.name}, ${english.order(slip.orderNumber)}, ${parcelOf(slip)}`

function drawSlip(doc: Pdf, sender: readonly string[], slip: PackingSlip): void {
  const y = drawAddresses(doc, sender, slip, drawHead(doc, slip))
  drawFoot(doc, slip, drawLines(doc, slip, y))
}

function drawHead(doc: Pdf, slip: PackingSlip): number {
  const words = wordsOf(slip)
  const width = widthOf(doc)
  const bars = widthOfCode128(slip.orderNumber)
  drawCode128(doc, slip.orderNumber, { x: MARGIN + width - bars, y: MARGIN, height: 30 })
  const room = width - bars - 10
  let y = MARGIN
  y += write(doc, words.name, { x: MARGIN, y, width: room, size: 20, bold: true, as: 'H1' })
  y += write(doc, words.order(slip.orderNumber), { x: MARGIN, y, width: room, size: 13, bold: true })
  y += write(doc, parcelOf(slip, words), { x: MARGIN, y, width: room, size: 10 })
  return Math.max(y, MARGIN + 34) + 14
}

function drawAddresses(doc: Pdf, sender: readonly string[], slip: PackingSlip, from: number): number {
  const words = wordsOf(slip)
  const half = widthOf(doc) / 2 - 10
  const right = MARGIN + widthOf(doc) / 2 + 10
  const to = [...slip.to, ...ownScript(doc, slip)]
  rule(doc, from)
  write(doc, words.from, { x: MARGIN, y: from + 5, width: half, size: 8 })
  write(doc, words.to, { x: right, y: from + 5, width: half, size: 8 })
  const left = write(doc, sender.join('\n'), { x: MARGIN, y: from + 18, width: half })
  const rightHeight = write(doc, to.join('\n'), { x: right, y: from + 18, width: half, size: 11 })
  return from + 18 + Math.max(left, rightHeight) + 14
}

/** Half an address is worse than none: it is printed whole or left out, and said so. */
function ownScript(doc: Pdf, slip: PackingSlip): string[] {
  const { toOwnScript } = slip
  if (!toOwnScript) return []
  return toOwnScript.every((line) => isPrintable(doc, line))
    ? ['', ...toOwnScript]
    : ['', wordsOf(slip).ownScriptLeftOut]
}

function drawLines(doc: Pdf, slip: PackingSlip, from: number): number {
  const words = wordsOf(slip)
  let y = drawColumnHeads(doc, words, from)
  const what = { x: MARGIN + 64, width: widthOf(doc) - 64 }
  for (const line of slip.lines) {
    const name = `${line.module}, ${words.offers[line.offer]}`
    const below = [...line.choices, ...(line.serials.length > 0 ? [words.serials(line.serials)] : [])].join(
      '\n',
    )
    const belowHeight = below ? measure(doc, below, { ...what, size: 9.5 }) : 0
    const height = measure(doc, name, { ...what, size: 11 }) + belowHeight + 12
    if (y + height > floorOf(doc)) {
      doc.addPage()
      y = drawColumnHeads(doc, words, MARGIN)
    }
    rule(doc, y)
    write(doc, String(line.quantity), {
      x: MARGIN,
      y: y + 5,
      width: 44,
      size: 11,
      bold: true,
      align: 'right',
    })
    const nameHeight = write(doc, name, { ...what, y: y + 5, size: 11 })
    if (below) write(doc, below, { ...what, y: y + 5 + nameHeight, size: 9.5 })
    y += height
  }
  rule(doc, y)
  return y + 14
}

function drawColumnHeads(doc: Pdf, words: typeof english, y: number): number {
  write(doc, words.columns.quantity, { x: MARGIN, y, width: 44, size: 8, align: 'right' })
  return y + write(doc, words.columns.thing, { x: MARGIN + 64, y, width: 200, size: 8 }) + 3
}

function drawFoot(doc: Pdf, slip: PackingSlip, from: number): void {
  const words = wordsOf(slip)
  const isPart = slip.parcel.nth < slip.parcel.of && !slip.isReplacement
  const lines = [...(isPart ? [words.more] : []), `${words.problem}\n${slip.problemUrl}`, words.noInvoice]
  const heights = lines.map((line) => measure(doc, line, { width: widthOf(doc) }) + 6)
  let y = from
  if (y + heights.reduce((sum, height) => sum + height, 0) > floorOf(doc)) {
    doc.addPage()
    y = MARGIN
  }
  for (const line of lines) y += write(doc, line, { x: MARGIN, y, width: widthOf(doc) }) + 6
}
