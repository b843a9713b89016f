import type { ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import { papers as paperWords } from '@/lib/messages/papers'
import { SLIP_WORDS } from '@/lib/messages/slip-words'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import type { PaperPart } from './blocks'

const words = parcelPaperWords.returns

/** What a buyer fills in and puts beside a thing that goes back. */
export function returnPart(papers: ParcelPapers, parcel: ParcelPaper): PaperPart {
  return {
    what: `${words.name}, ${parcelPaperWords.order(parcel.orderNumber)}`,
    blocks: [
      { kind: 'title', text: words.name },
      { kind: 'code', text: parcel.orderNumber.split(', ')[0] ?? '' },
      { kind: 'address', label: words.back, lines: papers.from, large: true },
      { kind: 'text', text: words.ask },
      {
        kind: 'table',
        ticks: true,
        columns: [
          { heading: SLIP_WORDS.en.columns.thing, share: 0.6 },
          { heading: SLIP_WORDS.en.columns.quantity, share: 0.4 },
        ],
        rows: parcel.lines.map((line) => [
          [`${line.module}, ${paperWords.offers[line.offer]}`, ...line.choices, line.serials.join(', ')]
            .filter(Boolean)
            .join('\n'),
          String(line.quantity),
        ]),
      },
      {
        kind: 'boxes',
        label: words.why,
        boxes: words.reasons.map((text) => ({ text, isTicked: false })),
      },
      { kind: 'sign', name: words.note, value: '' },
      { kind: 'sign', name: '', value: '' },
      { kind: 'text', text: words.notAnInvoice, small: true },
    ],
  }
}
