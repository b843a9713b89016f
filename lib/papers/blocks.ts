/** A table of a paper; `share`s add up to 1. */
export type PaperTable = {
  kind: 'table'
  columns: readonly { heading: string; share: number; align?: 'left' | 'right' }[]
  rows: readonly (readonly string[])[]
  /** A box for a pencil before each row. */
  ticks?: boolean
}

/** A piece of a printed paper. The same list makes the page that prints and the PDF, so both state the same. */
export type Block =
  | { kind: 'title'; text: string }
  | { kind: 'heading'; text: string }
  | { kind: 'text'; text: string; strong?: boolean; small?: boolean }
  | { kind: 'address'; label?: string; lines: readonly string[]; large?: boolean }
  | { kind: 'pair'; left: readonly Block[]; right: readonly Block[] }
  | { kind: 'code'; text: string }
  | { kind: 'facts'; facts: readonly { name: string; value: string }[] }
  | { kind: 'boxes'; label: string; boxes: readonly { text: string; isTicked: boolean }[] }
  | { kind: 'sign'; name: string; value: string }
  | { kind: 'rule' }
  | PaperTable

/** One thing on sheets of its own, which are counted for it: a label, a form, a list. */
export type PaperPart = { what: string; blocks: readonly Block[] }
