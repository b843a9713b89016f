import type { InvoicePaper, InvoicePaperLine } from '@/lib/contracts/papers'
import { formatMoney } from '@/lib/core/money/format'
import { grossOf, taxOf, taxParts } from '@/lib/core/orders/tax-parts'
import { papers } from '@/lib/messages/papers'
import { writtenDay, writtenPercent } from '@/lib/messages/written'
import { finished, floorOf, MARGIN, measure, openSheet, rule, widthOf, write, type Pdf } from './sheet'
import { drawTitleBlocks } from './title-block'

const words = papers.invoice
const rateOf = (basisPoints: number) =>
  writtenPercent(basisPoints / 10_000, { digits: basisPoints % 100 === 0 ? 0 : 1 })

/** An invoice or credit note as PDF: who to whom, line by line, what earlier papers charged, tax by rate. */
export async function invoicePdf(paper: InvoicePaper): Promise<Buffer> {
  const what = `${words.names[paper.kind]} ${paper.number}`
  const doc = openSheet({ ...paper, printedBy: paper.seller.name, printedOn: paper.issuedOn }, what)
  let y = drawHead(doc, paper)
  y = drawParties(doc, paper, y)
  y = drawLines(doc, paper, y)
  drawSums(doc, paper, y)
  const to = doc.bufferedPageRange().count - 1
  drawTitleBlocks(
    doc,
    { ...paper, printedBy: paper.seller.name, printedOn: paper.issuedOn },
    { what, from: 0, to },
  )
  return finished(doc)
}

function drawHead(doc: Pdf, paper: InvoicePaper): number {
  const width = widthOf(doc)
  const { corrects } = paper
  let y = MARGIN
  y += write(doc, words.names[paper.kind], { x: MARGIN, y, width, size: 20, bold: true, as: 'H1' })
  const facts = [
    words.number(paper.number),
    words.issued(writtenDay(paper.issuedOn)),
    words.order(paper.orderNumber),
    ...(corrects ? [words.corrects(corrects.number, writtenDay(corrects.issuedOn))] : []),
  ]
  return y + write(doc, facts.join(' · '), { x: MARGIN, y, width, size: 11 }) + 14
}

function drawParties(doc: Pdf, { seller, buyer, buyerVatNumber }: InvoicePaper, from: number): number {
  const half = widthOf(doc) / 2 - 10
  const right = MARGIN + widthOf(doc) / 2 + 10
  const sold = [
    seller.name,
    ...seller.lines,
    ...(seller.taxNumber ? [words.taxNumber(seller.taxNumber)] : []),
  ]
  const bought = [
    ...(buyer.length > 0 ? buyer : [words.erased]),
    ...(buyerVatNumber ? [words.vatNumber(buyerVatNumber)] : []),
  ]
  rule(doc, from)
  write(doc, words.seller, { x: MARGIN, y: from + 5, width: half, size: 8 })
  write(doc, words.buyer, { x: right, y: from + 5, width: half, size: 8 })
  const left = write(doc, sold.join('\n'), { x: MARGIN, y: from + 18, width: half })
  return (
    from + 18 + Math.max(left, write(doc, bought.join('\n'), { x: right, y: from + 18, width: half })) + 16
  )
}

const columnsOf = (doc: Pdf) => {
  const width = widthOf(doc)
  return {
    what: { x: MARGIN + 50, width: width - 50 - 230 },
    unit: { x: MARGIN + width - 225, width: 75, align: 'right' as const },
    tax: { x: MARGIN + width - 145, width: 55, align: 'right' as const },
    sum: { x: MARGIN + width - 85, width: 85, align: 'right' as const },
  }
}

function drawColumnHeads(doc: Pdf, y: number): number {
  const { what, unit, tax, sum } = columnsOf(doc)
  write(doc, words.columns.quantity, { x: MARGIN, y, width: 40, size: 8, align: 'right' })
  write(doc, words.columns.unit, { ...unit, y, size: 8 })
  write(doc, words.columns.tax, { ...tax, y, size: 8 })
  write(doc, words.columns.sum, { ...sum, y, size: 8 })
  return y + write(doc, words.columns.what, { ...what, y, size: 8 }) + 3
}

function drawLines(doc: Pdf, paper: InvoicePaper, from: number): number {
  let y = drawColumnHeads(doc, from)
  for (const line of paper.lines) {
    const height = measure(doc, line.text, columnsOf(doc).what) + 9
    if (y + height > floorOf(doc)) {
      doc.addPage()
      y = drawColumnHeads(doc, MARGIN)
    }
    drawLine(doc, paper, line, y)
    y += height
  }
  rule(doc, y)
  return y + 12
}

function drawLine(doc: Pdf, paper: InvoicePaper, line: InvoicePaperLine, from: number): void {
  const { what, unit, tax, sum } = columnsOf(doc)
  const money = (minor: number) => formatMoney(minor, paper.currency, paper.locale)
  rule(doc, from)
  const y = from + 4
  if (!line.setsOff) write(doc, String(line.quantity), { x: MARGIN, y, width: 40, align: 'right' })
  write(doc, line.text, { ...what, y })
  if (line.quantity > 1) write(doc, money(line.unitMinor), { ...unit, y })
  write(doc, rateOf(line.taxBasisPoints), { ...tax, y })
  write(doc, money(line.grossMinor), { ...sum, y })
}

/** What the paper comes to, by rate, and the sentences the law and its reader want. */
function drawSums(doc: Pdf, paper: InvoicePaper, from: number): void {
  const money = (minor: number) => formatMoney(minor, paper.currency, paper.locale)
  const parts = taxParts(paper.lines.map((line) => ({ ...line, basisPoints: line.taxBasisPoints })))
  const rows = parts.flatMap(({ basisPoints, grossMinor, taxMinor }) => [
    [words.net(rateOf(basisPoints)), money(grossMinor - taxMinor)],
    ...(basisPoints > 0 ? [[words.tax(rateOf(basisPoints)), money(taxMinor)]] : []),
  ])
  const isSetOff = paper.lines.some(({ setsOff }) => setsOff)
  const total = isSetOff ? words.charged : paper.kind === 'credit_note' ? words.back : words.total
  const notes = [
    ...(paper.isTaxedLater ? [words.taxedLater] : []),
    ...(taxOf(parts) === 0 && !paper.isTaxedLater && paper.seller.taxNote ? [paper.seller.taxNote] : []),
    ...(paper.buyerVatNumber ? [words.noReverseCharge] : []),
  ]
  const noteHeight = notes.reduce((sum, note) => sum + measure(doc, note, { width: widthOf(doc) }) + 6, 0)
  let y = from
  if (y + (rows.length + 1) * 16 + noteHeight > floorOf(doc)) {
    doc.addPage()
    y = MARGIN
  }
  for (const [name = '', sum = ''] of rows) y += drawSum(doc, name, sum, y, false)
  y += drawSum(doc, total, money(grossOf(parts)), y, true) + 12
  for (const note of notes) y += write(doc, note, { x: MARGIN, y, width: widthOf(doc) }) + 6
}

function drawSum(doc: Pdf, name: string, sum: string, y: number, bold: boolean): number {
  const half = widthOf(doc) / 2
  write(doc, sum, { x: MARGIN + widthOf(doc) - 110, y, width: 110, align: 'right', bold })
  return write(doc, name, { x: MARGIN + half - 60, y, width: half - 55, bold }) + 3
}
