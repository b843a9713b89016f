import type { FulfilmentList, FulfilmentOrder } from '@/lib/contracts/papers'
import { papers } from '@/lib/messages/papers'
import { writtenDay } from '@/lib/messages/written'
import { groupByContents, toPick, type ToPick } from './group-by-contents'
import {
  drawCode128,
  finished,
  floorOf,
  MARGIN,
  measure,
  openSheet,
  rule,
  tickBox,
  widthOf,
  widthOfCode128,
  write,
  type Pdf,
} from './sheet'
import { drawTitleBlocks } from './title-block'

const words = papers.list
const BAR_HEIGHT = 22

const nameOf = ({ module, offer, choices }: ToPick) =>
  [`${module}, ${papers.offers[offer]}`, ...choices].join('; ')
const unitsOf = (orders: readonly FulfilmentOrder[]) =>
  orders.reduce((sum, order) => sum + order.lines.reduce((all, line) => all + line.quantity, 0), 0)

/**
 * The fulfilment list as PDF: what to take from the shelf, then each order with a bar code of its number, orders of the
 * same contents together, in the order given.
 */
export async function fulfilmentListPdf(list: FulfilmentList): Promise<Buffer> {
  const doc = openSheet(list, `${words.name}: ${list.title}`)
  let y = MARGIN
  y += write(doc, words.name, { x: MARGIN, y, width: widthOf(doc), size: 20, bold: true, as: 'H1' })
  y += write(doc, list.title, { x: MARGIN, y, width: widthOf(doc), size: 12 }) + 4
  if (list.orders.length === 0) {
    write(doc, words.nothing, { x: MARGIN, y: y + 8, width: widthOf(doc) })
  } else {
    y +=
      write(doc, words.summary(list.orders.length, unitsOf(list.orders)), {
        x: MARGIN,
        y,
        width: widthOf(doc),
      }) + 10
    drawOrders(doc, list, drawPicks(doc, list, y))
  }
  const last = doc.bufferedPageRange().count - 1
  drawTitleBlocks(doc, list, { what: `${words.name}: ${list.title}`, from: 0, to: last })
  return finished(doc)
}

/** Begins a new sheet where the height does not fit any more; gives back where to go on. */
function fit(doc: Pdf, y: number, height: number): number {
  if (y + height <= floorOf(doc)) return y
  doc.addPage()
  return MARGIN
}

const heading = (doc: Pdf, text: string, y: number) =>
  write(doc, text, { x: MARGIN, y, width: widthOf(doc), size: 12, bold: true, as: 'H2' }) + 4

function drawPicks(doc: Pdf, list: FulfilmentList, from: number): number {
  let y = fit(doc, from, 60)
  y += heading(doc, words.pick, y)
  for (const pick of toPick(list.orders)) {
    const name = { width: widthOf(doc) - 74 }
    const text = pick.place ? `${words.place(pick.place)} ${nameOf(pick)}` : nameOf(pick)
    const height = measure(doc, text, name) + 8
    y = fit(doc, y, height)
    rule(doc, y)
    tickBox(doc, MARGIN, y + 5)
    write(doc, `${pick.quantity} ×`, { x: MARGIN + 18, y: y + 4, width: 44, bold: true, align: 'right' })
    write(doc, text, { x: MARGIN + 74, y: y + 4, ...name })
    y += height
  }
  rule(doc, y)
  return y + 16
}

function drawOrders(doc: Pdf, list: FulfilmentList, from: number): void {
  let y = from
  for (const group of groupByContents(list.orders)) {
    const lines = group.lines.map((line) => `${line.quantity} × ${nameOf(line)}`)
    const first = group.orders[0]
    const title = measure(doc, lines.join('\n'), { width: widthOf(doc), size: 11, bold: true }) + 24
    y = fit(doc, y, title + (first ? rowHeight(doc, first) : 0))
    rule(doc, y, 1.2)
    y += 5
    for (const line of lines)
      y += write(doc, line, { x: MARGIN, y, width: widthOf(doc), size: 11, bold: true, as: 'H2' })
    y += write(doc, words.same(group.orders.length), { x: MARGIN, y, width: widthOf(doc), size: 9 }) + 4
    for (const order of group.orders) {
      const at = fit(doc, y, rowHeight(doc, order))
      y = drawOrder(doc, order, at === y ? y : at + drawContinued(doc, lines))
    }
    y += 12
  }
}

/** At the head of a new sheet: what the orders on it hold. */
const drawContinued = (doc: Pdf, lines: string[]) =>
  write(doc, words.continued(lines.join(' + ')), {
    x: MARGIN,
    y: MARGIN,
    width: widthOf(doc),
    size: 11,
    bold: true,
  }) + 4

const columnsOf = (doc: Pdf) => {
  const width = widthOf(doc)
  return {
    number: MARGIN + 18,
    bars: MARGIN + width * 0.2,
    to: MARGIN + width * 0.52,
    postedBy: MARGIN + width * 0.8,
    width,
  }
}
const noteOf = (order: FulfilmentOrder) => (order.note === null ? null : `${words.note} ${order.note}`)
const serialsOf = (order: FulfilmentOrder) => order.lines.flatMap((line) => line.serials).join(', ')
const toOf = (order: FulfilmentOrder) =>
  [`${order.name}, ${order.country}`, serialsOf(order)].filter(Boolean).join('\n')

function rowHeight(doc: Pdf, order: FulfilmentOrder): number {
  const { width } = columnsOf(doc)
  const to = measure(doc, toOf(order), { width: width * 0.27, size: 9.5 })
  const note = noteOf(order)
  const noteHeight = note ? measure(doc, note, { width: width * 0.8, size: 9.5 }) : 0
  return Math.max(BAR_HEIGHT, to) + noteHeight + 12
}

function drawOrder(doc: Pdf, order: FulfilmentOrder, y: number): number {
  const height = rowHeight(doc, order)
  const { number, bars, to, postedBy, width } = columnsOf(doc)
  rule(doc, y)
  tickBox(doc, MARGIN, y + 7)
  write(doc, order.number, { x: number, y: y + 6, width: bars - number, size: 11, bold: true })
  // A number too long for its column is still read by eye; a squeezed code would be read by nobody.
  if (widthOfCode128(order.number) <= to - bars)
    drawCode128(doc, order.number, { x: bars, y: y + 6, height: BAR_HEIGHT })
  write(doc, toOf(order), { x: to, y: y + 6, width: width * 0.27, size: 9.5 })
  write(doc, writtenDay(order.postedBy), {
    x: postedBy,
    y: y + 6,
    width: width * 0.2,
    size: 9.5,
    align: 'right',
  })
  const note = noteOf(order)
  if (note) {
    const noteHeight = measure(doc, note, { width: width * 0.8, size: 9.5 })
    write(doc, note, { x: number, y: y + height - noteHeight - 4, width: width * 0.8, size: 9.5 })
  }
  return y + height
}
