import type { PaperIssue } from '@/lib/contracts/papers'
import { papers } from '@/lib/messages/papers'
import { writtenDay } from '@/lib/messages/written'
import { printable } from './printable'
import { BOLD, REGULAR } from './faces'
import { BLOCK_HEIGHT, decorate, lossySheets, MARGIN, widthOf, type Pdf } from './sheet'

type Block = { what: string; from: number; to: number }

/** Draws the title block at the foot of sheets `from` to `to`, which count as one paper: sheet n of m. */
export function drawTitleBlocks(doc: Pdf, issue: PaperIssue, { what, from, to }: Block): void {
  for (let page = from; page <= to; page += 1) {
    doc.switchToPage(page)
    decorate(doc, () => drawBlock(doc, issue, what, papers.sheet(page - from + 1, to - from + 1)))
    if (lossySheets(doc).includes(page)) drawWarning(doc)
  }
}

function drawBlock(doc: Pdf, issue: PaperIssue, what: string, sheet: string): void {
  const top = doc.page.height - MARGIN - BLOCK_HEIGHT + 14
  const height = BLOCK_HEIGHT - 14
  const width = widthOf(doc)
  const cells = [
    { label: papers.block.what, value: what, share: 0.34 },
    { label: papers.block.workshop, value: issue.workshop, share: 0.2 },
    { label: papers.block.by, value: issue.printedBy, share: 0.15 },
    { label: papers.block.on, value: writtenDay(issue.printedOn), share: 0.21 },
    { label: papers.block.sheet, value: sheet, share: 0.1 },
  ]
  doc.rect(MARGIN, top, width, height).lineWidth(0.8).stroke()
  let x = MARGIN
  for (const [i, { label, value, share }] of cells.entries()) {
    if (i > 0)
      doc
        .moveTo(x, top)
        .lineTo(x, top + height)
        .lineWidth(0.5)
        .stroke()
    const room = { width: width * share - 10, height: 12, ellipsis: true, lineBreak: false }
    doc
      .font(REGULAR)
      .fontSize(6.5)
      .text(label, x + 5, top + 5, room)
    doc
      .font(BOLD)
      .fontSize(8.5)
      .text(printable(doc, value), x + 5, top + 15, room)
    x += width * share
  }
}

function drawWarning(doc: Pdf): void {
  const y = doc.page.height - MARGIN - BLOCK_HEIGHT + 3
  doc.font(REGULAR).fontSize(7)
  decorate(doc, () => void doc.text(papers.unprintable, MARGIN, y, { lineBreak: false }))
}
