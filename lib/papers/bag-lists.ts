import type { BagList } from '@/lib/contracts/papers'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import type { PaperPart } from './blocks'

const words = parcelPaperWords.bags

/** One sheet per kind of kit: what goes into a bag, and what all bags together take from the shelf. */
export function bagParts(lists: readonly BagList[]): PaperPart[] {
  const { columns } = words
  return lists.map(({ what, choices, bags, parts }) => ({
    what: `${words.name}: ${what}`,
    blocks: [
      { kind: 'title', text: words.name },
      { kind: 'heading', text: what },
      ...(choices.length > 0 ? [{ kind: 'text', text: choices.join('\n') } as const] : []),
      { kind: 'text', text: words.count(bags), strong: true },
      {
        kind: 'table',
        ticks: true,
        columns: [
          { heading: columns.each, share: 0.1, align: 'right' },
          { heading: columns.all, share: 0.12, align: 'right' },
          { heading: columns.part, share: 0.36 },
          { heading: columns.place, share: 0.16 },
          { heading: columns.where, share: 0.26 },
        ],
        rows: parts.map(({ quantity, name, value, place, designators }) => [
          String(quantity),
          String(quantity * bags),
          [name, value].filter(Boolean).join(', '),
          place,
          designators,
        ]),
      },
    ],
  }))
}
