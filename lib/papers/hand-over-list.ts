import type { ParcelPapers } from '@/lib/contracts/papers'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import type { PaperPart } from './blocks'

const words = parcelPaperWords.handOver

/** What the post takes, counted and weighed, with room for two names. */
export function handOverPart({ parcels, from }: ParcelPapers): PaperPart {
  const { columns } = words
  const grams = parcels.reduce((sum, parcel) => sum + (parcel.grams ?? 0), 0)
  return {
    what: words.name,
    blocks: [
      { kind: 'title', text: words.name },
      { kind: 'address', label: parcelPaperWords.from, lines: from },
      {
        kind: 'table',
        ticks: true,
        columns: [
          { heading: columns.parcel, share: 0.1 },
          { heading: columns.order, share: 0.1 },
          { heading: columns.to, share: 0.24 },
          { heading: columns.grams, share: 0.12, align: 'right' },
          { heading: columns.service, share: 0.22 },
          { heading: columns.tracking, share: 0.22 },
        ],
        rows: parcels.map((parcel) => [
          String(parcel.number),
          parcel.orderNumber,
          `${parcel.to[0] ?? ''}, ${parcel.country}`,
          String(parcel.grams ?? ''),
          parcel.service ?? '',
          parcel.tracking ?? '',
        ]),
      },
      { kind: 'text', text: words.total(parcels.length, grams), strong: true },
      {
        kind: 'pair',
        left: [{ kind: 'sign', name: words.given, value: '' }],
        right: [{ kind: 'sign', name: words.taken, value: '' }],
      },
    ],
  }
}
