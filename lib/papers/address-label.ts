import type { ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import { parcelPaperWords as words } from '@/lib/messages/parcel-papers'
import type { Block, PaperPart } from './blocks'

/** The label of a parcel: sender small, addressee large in the order and script of the destination, bars of the order. */
export function labelPart(papers: ParcelPapers, parcel: ParcelPaper): PaperPart {
  const { to, toOwnScript, phone, service, tracking } = parcel
  const own: Block[] = toOwnScript ? [{ kind: 'address', lines: toOwnScript, large: true }] : []
  return {
    what: `${words.order(parcel.orderNumber)}, ${words.parcel(parcel.number)}`,
    blocks: [
      { kind: 'text', text: [words.from, ...papers.from].join(' · '), small: true },
      { kind: 'rule' },
      ...(service ? [{ kind: 'text', text: service, strong: true } as const] : []),
      // The people who carry it there read their own script; those on the way read the other.
      ...own,
      { kind: 'address', label: toOwnScript ? undefined : words.to, lines: to, large: own.length === 0 },
      ...(phone ? [{ kind: 'text', text: words.phone(phone) } as const] : []),
      { kind: 'rule' },
      ...(tracking ? [{ kind: 'code', text: tracking } as const] : []),
      { kind: 'code', text: parcel.orderNumber.split(', ')[0] ?? '' },
      {
        kind: 'text',
        text: [
          words.labelFoot(parcel.orderNumber, parcel.number),
          words.partOf(parcel.place.nth, parcel.place.of),
        ]
          .filter(Boolean)
          .join(' · '),
        small: true,
      },
    ],
  }
}
