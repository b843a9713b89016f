import type { ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import { formatMoney } from '@/lib/core/money/format'
import { minor } from '@/lib/core/brand'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import type { PaperPart } from './blocks'

const words = parcelPaperWords.invoice
const columns = parcelPaperWords.customs.columns
const LOCALE = 'en-GB'

/** The invoice that travels outside a parcel with the full form, at true value; null where none is needed. */
export function invoicePart(papers: ParcelPapers, parcel: ParcelPaper): PaperPart | null {
  const { customs } = parcel
  if (customs.form !== 'CN23') return null
  const money = (amount: number) => formatMoney(minor(amount), customs.currency, LOCALE)
  return {
    what: `${words.name}, ${parcelPaperWords.order(parcel.orderNumber)}`,
    blocks: [
      { kind: 'title', text: words.name },
      { kind: 'text', text: words.copy, small: true },
      {
        kind: 'facts',
        facts: [
          { name: words.number, value: `${parcel.orderNumber}-${parcel.number}` },
          {
            name: parcelPaperWords.customs.duties,
            value: parcelPaperWords.customs.dutiesAre[customs.duties],
          },
        ],
      },
      {
        kind: 'pair',
        left: [
          {
            kind: 'address',
            label: words.seller,
            lines: [...papers.from, ...(papers.fromTaxNumber ? [papers.fromTaxNumber] : [])],
          },
        ],
        right: [
          {
            kind: 'address',
            label: words.buyer,
            lines: [
              ...parcel.to,
              ...(parcel.phone ? [parcelPaperWords.phone(parcel.phone)] : []),
              ...(parcel.taxNumber ? [parcel.taxNumber] : []),
            ],
          },
        ],
      },
      {
        kind: 'table',
        columns: [
          { heading: columns.description, share: 0.34 },
          { heading: columns.code, share: 0.16 },
          { heading: columns.origin, share: 0.1 },
          { heading: columns.grams, share: 0.12, align: 'right' },
          { heading: words.unit, share: 0.14, align: 'right' },
          { heading: words.total, share: 0.14, align: 'right' },
        ],
        rows: customs.lines.map((line) => [
          parcelPaperWords.customs.quantity(line.quantity, line.description),
          line.code,
          line.origin,
          String(line.grams),
          money(line.value / line.quantity),
          money(line.value),
        ]),
      },
      {
        kind: 'facts',
        facts: [{ name: parcelPaperWords.customs.totalValue, value: money(customs.valueMinor) }],
      },
      { kind: 'text', text: parcel.isReplacement ? words.replacement : words.reason },
      { kind: 'sign', name: words.sign, value: `${papers.printedBy}, ${papers.printedOn}` },
    ],
  }
}
