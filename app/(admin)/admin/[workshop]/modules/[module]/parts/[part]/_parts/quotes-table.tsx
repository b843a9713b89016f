import { DayText } from '@/components/format/day-text'
import { Money } from '@/components/format/money'
import { Table } from '@/components/ui/table'
import type { PartDesk } from '@/lib/contracts/part-forms'
import { writeBreaks } from '@/lib/contracts/price-breaks'
import { partWords as words } from '@/lib/messages/parts'
import { writtenNumber } from '@/lib/messages/written'

/** Who sells a part at which prices, newest first. */
export function QuotesTable({ part: { quotes, code } }: { part: PartDesk }) {
  return (
    <Table
      caption={words.quotes(code)}
      rows={quotes}
      rowKey={({ id }) => id}
      empty={words.noQuotes}
      columns={[
        {
          key: 'supplier',
          heading: words.supplier,
          cell: ({ supplier, supplierCode }) => (supplierCode ? `${supplier}, ${supplierCode}` : supplier),
        },
        {
          key: 'on',
          heading: words.quotedOn,
          cell: ({ quotedOn, ageDays }) => (
            <>
              <DayText day={quotedOn} /> <span className="text-quiet">({words.age(ageDays)})</span>
            </>
          ),
        },
        {
          key: 'breaks',
          heading: words.breaks,
          kind: 'figures',
          cell: ({ breaks, currency }) => `${writeBreaks(breaks, currency)} ${currency}`,
        },
        { key: 'moq', heading: words.moq, kind: 'figures', cell: ({ moq }) => writtenNumber(moq) },
        {
          key: 'multiple',
          heading: words.multiple,
          kind: 'figures',
          cell: ({ multiple }) => writtenNumber(multiple),
        },
        {
          key: 'setup',
          heading: words.setup,
          kind: 'figures',
          cell: ({ setupMinor, currency }) => <Money minor={setupMinor} currency={currency} />,
        },
        {
          key: 'lead',
          heading: words.leadDays,
          kind: 'figures',
          cell: ({ leadDays }) => (leadDays === null ? words.unknown : words.days(leadDays)),
        },
        {
          key: 'stock',
          heading: words.stockSeen,
          kind: 'figures',
          cell: ({ stockSeen, stockSeenOn }) =>
            stockSeen === null || stockSeenOn === null ? (
              words.unknown
            ) : (
              <>
                {writtenNumber(stockSeen)}, <DayText day={stockSeenOn} />
              </>
            ),
        },
      ]}
    />
  )
}
