import type { ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import { countryName } from '@/lib/core/data/country'
import { formatMoney } from '@/lib/core/money/format'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import type { Block, PaperPart } from './blocks'

const words = parcelPaperWords.customs
const LOCALE = 'en-GB'

/** What is stated to customs on the small form or the full one; null where the parcel crosses no border of theirs. */
export function customsPart(papers: ParcelPapers, parcel: ParcelPaper): PaperPart | null {
  const { form } = parcel.customs
  if (form === 'none') return null
  const name = words.declaration(form)
  return {
    what: `${name}, ${parcelPaperWords.order(parcel.orderNumber)}`,
    blocks: [
      { kind: 'title', text: name },
      { kind: 'text', text: words.mayBeOpened, small: true },
      ...(form === 'CN23' ? partiesOf(papers, parcel) : []),
      sentFor(parcel),
      linesOf(parcel),
      { kind: 'facts', facts: totalsOf(parcel) },
      { kind: 'text', text: words.certify, small: true },
      { kind: 'sign', name: words.sign, value: `${papers.printedBy}, ${papers.printedOn}` },
      { kind: 'code', text: parcel.orderNumber.split(', ')[0] ?? '' },
    ],
  }
}

function partiesOf(papers: ParcelPapers, parcel: ParcelPaper): Block[] {
  const from = [
    ...papers.from,
    ...(papers.fromPhone ? [parcelPaperWords.phone(papers.fromPhone)] : []),
    ...(papers.fromTaxNumber ? [papers.fromTaxNumber] : []),
  ]
  const to = [...parcel.to, ...(parcel.phone ? [parcelPaperWords.phone(parcel.phone)] : [])]
  return [
    {
      kind: 'pair',
      left: [{ kind: 'address', label: parcelPaperWords.from, lines: from }],
      right: [{ kind: 'address', label: parcelPaperWords.to, lines: to }],
    },
  ]
}

function sentFor({ isReplacement }: ParcelPaper): Block {
  const kinds = ['sale', 'gift', 'documents', 'sample', 'returned', 'other'] as const
  const ticked = isReplacement ? 'other' : 'sale'
  return {
    kind: 'boxes',
    label: words.sentFor,
    boxes: kinds.map((kind) => ({ text: words.kinds[kind], isTicked: kind === ticked })),
  }
}

function linesOf({ customs }: ParcelPaper): Block {
  const { columns } = words
  return {
    kind: 'table',
    columns: [
      { heading: columns.description, share: 0.28 },
      { heading: columns.grams, share: 0.15, align: 'right' },
      { heading: columns.value, share: 0.2, align: 'right' },
      { heading: columns.code, share: 0.23 },
      { heading: columns.origin, share: 0.14 },
    ],
    rows: customs.lines.map(({ quantity, description, grams, value, code, origin }) => [
      words.quantity(quantity, description),
      String(grams),
      formatMoney(value, customs.currency, LOCALE),
      code,
      origin,
    ]),
  }
}

function totalsOf(parcel: ParcelPaper) {
  const { customs, grams, taxNumber } = parcel
  const net = customs.lines.reduce((sum, line) => sum + line.grams, 0)
  const isFull = customs.form === 'CN23'
  return [
    { name: isFull ? words.grossWeight : words.totalWeight, value: String(grams ?? net) },
    { name: words.totalValue, value: formatMoney(customs.valueMinor, customs.currency, LOCALE) },
    ...(isFull
      ? [
          { name: words.invoice, value: `${parcel.orderNumber}-${parcel.number}` },
          { name: words.duties, value: words.dutiesAre[customs.duties] },
        ]
      : []),
    ...(taxNumber ? [{ name: words.importer, value: taxNumber }] : []),
    ...(isFull ? [] : [{ name: parcelPaperWords.to, value: countryName(parcel.country) }]),
  ]
}
