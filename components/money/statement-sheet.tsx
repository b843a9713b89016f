import { Money } from '@/components/format/money'
import { When } from '@/components/format/when'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { Statement } from '@/lib/contracts/money-desk'
import { accountNames, moneyWords as words, movementNames } from '@/lib/messages/money-desk'

type Props = { statement: Statement; zone: string; csvHref?: string }

/** What the books say: each movement with what it did, and what stands in the end. */
export function StatementSheet({ statement, zone, csvHref }: Props) {
  const { lines, sums } = statement
  return (
    <Sheet title={words.statement} id="statement">
      <Table
        caption={words.statement}
        captionHidden
        rows={lines}
        rowKey={(row) => row.id}
        empty={words.statementNone}
        csvHref={csvHref}
        columns={[
          { key: 'at', heading: words.when, cell: (row) => <When at={row.at} zone={zone} /> },
          {
            key: 'kind',
            heading: words.what,
            cell: (row) =>
              row.orderNumber === null
                ? (movementNames[row.kind] ?? row.kind)
                : words.ofOrder(movementNames[row.kind] ?? row.kind, row.orderNumber),
          },
          {
            key: 'entries',
            heading: words.entries,
            cell: (row) => (
              <ul>
                {row.entries.map(({ account, currency, amountMinor }) => (
                  <li key={`${account} ${currency}`} className="flex flex-wrap justify-between gap-x-4">
                    <span>{accountNames[account] ?? account}</span>
                    <Money minor={amountMinor} currency={currency} />
                  </li>
                ))}
              </ul>
            ),
          },
        ]}
      />
      <h3 className="pt-5 pb-1 text-17">{words.stands}</h3>
      <Facts
        facts={sums.map(({ account, currency, amountMinor }) => ({
          key: `${account} ${currency}`,
          name: accountNames[account] ?? account,
          value: <Money minor={amountMinor} currency={currency} />,
          kind: 'figures' as const,
        }))}
      />
      <p className="max-w-words pt-3 text-15 text-quiet">{words.statementNote}</p>
    </Sheet>
  )
}
