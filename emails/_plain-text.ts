import { paragraphsOf, type Block, type Letter, type Row } from '@/emails/_letter'
import { type Foot } from '@/emails/_foot'

const underline = (text: string) => `${text}\n${'-'.repeat(Math.min(text.length, 72))}`
const plainRow = (row: Row) => `${row.label}: ${row.value}${row.note ? `\n  ${row.note}` : ''}`

function plainBlock(block: Block): string {
  switch (block.kind) {
    case 'para':
      return block.text
    case 'rows':
      return block.rows.map(plainRow).join('\n')
    case 'action':
    case 'link':
      return `${block.label}:\n${block.url}`
    case 'written':
      return paragraphsOf(block.text)
        .map((lines) => lines.map((line) => `> ${line}`.trimEnd()).join('\n'))
        .join('\n>\n')
    case 'terms':
      return `${underline(block.title)}\n${paragraphsOf(block.text)
        .map((lines) => lines.join('\n'))
        .join('\n\n')}`
  }
}

/** The letter as plain text: the same facts in the same order; every address on a line of its own. */
export function plainText(letter: Letter, foot: Foot): string {
  const unsubscribe = foot.unsubscribe ? [`${foot.unsubscribe.label}:\n${foot.unsubscribe.url}`] : []
  const sheet = [...foot.lines, ...unsubscribe]
  const main = letter.blocks.filter((block) => block.kind !== 'terms')
  const appended = letter.blocks.filter((block) => block.kind === 'terms')
  const parts = [
    ...main.map(plainBlock),
    foot.signedBy,
    ...appended.map(plainBlock),
    `-- \n${sheet.join('\n')}`,
  ]
  return `${parts.join('\n\n')}\n`
}
