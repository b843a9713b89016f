import type { PaperIssue } from '@/lib/contracts/papers'
import type { PaperPart } from './blocks'
import { type Column, drawBlock, drawHeadings, drawRow, heightOf } from './draw-blocks'
import { finished, floorOf, MARGIN, openSheet, type Pdf, widthOf } from './sheet'
import { drawTitleBlocks } from './title-block'

/** Blank edge of a label, points: 4 mm, which label printers leave anyway. */
const LABEL_MARGIN = 11.3
const isLabel = ({ size }: PaperIssue) => size !== 'A4' && size !== 'Letter'

/**
 * Papers of blocks as one PDF, each part on sheets of its own. The sheets of a part are let go as soon as it is whole, so
 * that two hundred parts need no more memory than one beside the file itself.
 */
export async function paperPdf(
  issue: PaperIssue,
  name: string,
  parts: readonly PaperPart[],
): Promise<Buffer> {
  const doc = openSheet(issue, name)
  for (const [i, part] of parts.entries()) {
    if (i > 0) doc.addPage()
    const from = doc.bufferedPageRange().start + doc.bufferedPageRange().count - 1
    drawPart(doc, part, areaOf(doc, issue, part))
    const { start, count } = doc.bufferedPageRange()
    if (!isLabel(issue)) drawTitleBlocks(doc, issue, { what: part.what, from, to: start + count - 1 })
    if (i < parts.length - 1) doc.flushPages()
  }
  return finished(doc)
}

type Area = Column & { top: number; floor: number }

/** Sizes of ordinary text tried on a label, in points: the largest with which it stands on one. */
const LABEL_UNITS = [11, 10, 9, 8, 7.5, 7, 6.5]

function areaOf(doc: Pdf, issue: PaperIssue, part: PaperPart): Area {
  if (!isLabel(issue)) return { x: MARGIN, width: widthOf(doc), unit: 10, top: MARGIN, floor: floorOf(doc) }
  const area = {
    x: LABEL_MARGIN,
    width: doc.page.width - 2 * LABEL_MARGIN,
    top: LABEL_MARGIN,
    floor: doc.page.height - LABEL_MARGIN,
  }
  const fits = (unit: number) =>
    part.blocks.reduce((sum, block) => sum + heightOf(doc, block, { ...area, unit }), 0) <=
    area.floor - area.top
  // On a narrow label large letters would break the lines of an address.
  const units = area.width < 200 ? LABEL_UNITS.filter((unit) => unit <= 8) : LABEL_UNITS
  return { ...area, unit: units.find(fits) ?? LABEL_UNITS.at(-1)! }
}

function drawPart(doc: Pdf, { blocks }: PaperPart, area: Area): void {
  let y = area.top
  const fit = (height: number) => {
    if (y === area.top || y + height <= area.floor) return false
    doc.addPage()
    y = area.top
    return true
  }
  for (const block of blocks) {
    if (block.kind !== 'table') {
      fit(heightOf(doc, block, area))
      y += drawBlock(doc, block, area, y)
      continue
    }
    const first = block.rows[0]
    fit(drawHeadings(doc, block, area, null) + (first ? drawRow(doc, block, first, area, null) : 0))
    y += drawHeadings(doc, block, area, y)
    for (const row of block.rows) {
      if (fit(drawRow(doc, block, row, area, null))) y += drawHeadings(doc, block, area, y)
      y += drawRow(doc, block, row, area, y)
    }
    y += 8
  }
}
