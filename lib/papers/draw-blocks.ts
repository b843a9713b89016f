import type { Block, PaperTable } from './blocks'
import { decorate, drawCode128, measure, type Pdf, tickBox, widthOfCode128, write } from './sheet'

/** Where blocks stand: a column of a sheet. `unit` is the size of ordinary text. */
export type Column = { x: number; width: number; unit: number }

const GAP = 6
const BARS = 30
const TICK = 16
const columnGap = 12

/** The height a block takes in a column. */
export function heightOf(doc: Pdf, block: Block, column: Column): number {
  return layOut(doc, block, column, null)
}

/** Draws a block and gives back the height it took. */
export const drawBlock = (doc: Pdf, block: Block, column: Column, y: number) => layOut(doc, block, column, y)

/** One walk for both: with `y` null nothing is drawn, so that measured and drawn never differ. */
function layOut(doc: Pdf, block: Block, column: Column, y: number | null): number {
  const { x, width, unit } = column
  const say = (text: string, size: number, bold = false, at = 0, as: 'H1' | 'H2' | 'P' = 'P') =>
    y === null
      ? measure(doc, text, { width, size, bold })
      : write(doc, text, { x, y: y + at, width, size, bold, as })
  switch (block.kind) {
    case 'title':
      return say(block.text, unit * 1.8, true, 0, 'H1') + GAP
    case 'heading':
      return say(block.text, unit * 1.2, true, GAP, 'H2') + 2 * GAP
    case 'text':
      return say(block.text, unit * (block.small ? 0.8 : 1), block.strong) + 4
    case 'address': {
      const label = block.label ? say(block.label, unit * 0.75) + 2 : 0
      return label + say(block.lines.join('\n'), unit * (block.large ? 1.35 : 1), block.large, label) + GAP
    }
    case 'code':
      return code(doc, block.text, column, y)
    case 'facts':
      return (
        block.facts.reduce((sum, fact) => sum + pairOfTexts(doc, fact, column, y === null ? y : y + sum), 0) +
        4
      )
    case 'sign':
      return sign(doc, block, column, y)
    case 'rule':
      if (y !== null) line(doc, x, y + 3, width)
      return 8
    case 'boxes':
      return boxes(doc, block, column, y)
    case 'pair': {
      const half = (width - columnGap) / 2
      const sides = [
        { blocks: block.left, column: { ...column, width: half } },
        { blocks: block.right, column: { ...column, x: x + half + columnGap, width: half } },
      ]
      return Math.max(
        ...sides.map((side) =>
          side.blocks.reduce(
            (sum, each) => sum + layOut(doc, each, side.column, y === null ? null : y + sum),
            0,
          ),
        ),
      )
    }
    case 'table':
      return block.rows.reduce(
        (sum, row) => sum + drawRow(doc, block, row, column, y === null ? null : y + sum),
        drawHeadings(doc, block, column, y),
      )
  }
}

function code(doc: Pdf, text: string, { x, width, unit }: Column, y: number | null): number {
  const fits = widthOfCode128(text, width) <= width + 0.01
  if (y !== null && fits) drawCode128(doc, text, { x, y, height: BARS, width })
  const bars = fits ? BARS + 3 : 0
  const words = { width, size: unit }
  return (
    bars + (y === null ? measure(doc, text, words) : write(doc, text, { ...words, x, y: y + bars })) + GAP
  )
}

function pairOfTexts(
  doc: Pdf,
  fact: { name: string; value: string },
  column: Column,
  y: number | null,
): number {
  const { x, width, unit } = column
  const name = { width: width * 0.36, size: unit * 0.8 }
  const value = { width: width * 0.62, size: unit }
  if (y === null) return Math.max(measure(doc, fact.name, name), measure(doc, fact.value, value)) + 3
  const left = write(doc, fact.name, { ...name, x, y: y + unit * 0.2 })
  return Math.max(left, write(doc, fact.value, { ...value, x: x + width * 0.38, y })) + 3
}

const SIGN_ROOM = 26

function sign(
  doc: Pdf,
  block: { name: string; value: string },
  { x, width, unit }: Column,
  y: number | null,
) {
  const words = { width, size: unit * 0.8 }
  const text = block.value === '' ? block.name : `${block.name}: ${block.value}`
  if (y === null) return SIGN_ROOM + measure(doc, text, words) + GAP
  line(doc, x, y + SIGN_ROOM, width)
  return SIGN_ROOM + write(doc, text, { ...words, x, y: y + SIGN_ROOM + 2 }) + GAP
}

function boxes(doc: Pdf, block: Extract<Block, { kind: 'boxes' }>, column: Column, y: number | null): number {
  const { x, width, unit } = column
  const label = { width, size: unit * 0.8 }
  const from = y === null ? measure(doc, block.label, label) : write(doc, block.label, { ...label, x, y })
  const each = width / 2
  let height = from + 2
  for (let i = 0; i < block.boxes.length; i += 2) {
    const row = block.boxes.slice(i, i + 2).map(({ text, isTicked }, k) => {
      const at = { width: each - TICK, size: unit * 0.9 }
      if (y === null) return measure(doc, text, at)
      tickBox(doc, x + k * each, y + height)
      if (isTicked) cross(doc, x + k * each, y + height)
      return write(doc, text, { ...at, x: x + k * each + TICK, y: y + height })
    })
    height += Math.max(12, ...row) + 2
  }
  return height + 4
}

const line = (doc: Pdf, x: number, y: number, width: number) =>
  decorate(
    doc,
    () =>
      void doc
        .moveTo(x, y)
        .lineTo(x + width, y)
        .lineWidth(0.5)
        .stroke(),
  )

function cross(doc: Pdf, x: number, y: number): void {
  decorate(
    doc,
    () =>
      void doc
        .moveTo(x + 2, y + 2)
        .lineTo(x + 8, y + 8)
        .moveTo(x + 8, y + 2)
        .lineTo(x + 2, y + 8)
        .lineWidth(1.2)
        .stroke(),
  )
}

/** The headings of a table; again at the head of each further sheet. */
export function drawHeadings(doc: Pdf, table: PaperTable, column: Column, y: number | null): number {
  const size = column.unit * 0.75
  return (
    cellsOf(
      doc,
      table,
      table.columns.map(({ heading }) => heading),
      column,
      y,
      size,
    ) + 3
  )
}

/** One row of a table, under a rule. */
export function drawRow(
  doc: Pdf,
  table: PaperTable,
  row: readonly string[],
  column: Column,
  y: number | null,
): number {
  if (y !== null) {
    line(doc, column.x, y, column.width)
    if (table.ticks) tickBox(doc, column.x, y + 4)
  }
  return cellsOf(doc, table, row, column, y === null ? null : y + 3, column.unit) + 7
}

function cellsOf(
  doc: Pdf,
  table: PaperTable,
  cells: readonly string[],
  { x, width }: Column,
  y: number | null,
  size: number,
): number {
  const indent = table.ticks ? TICK : 0
  let at = x + indent
  const heights = table.columns.map(({ share, align }, i) => {
    const room = (width - indent) * share
    const cell = { width: room - 10, size }
    const text = cells[i] ?? ''
    const height = y === null ? measure(doc, text, cell) : write(doc, text, { ...cell, x: at, y, align })
    at += room
    return height
  })
  return Math.max(...heights)
}
