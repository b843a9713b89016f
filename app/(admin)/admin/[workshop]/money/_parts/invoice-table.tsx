import { DayText } from '@/components/format/day-text'
import { Money } from '@/components/format/money'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { InvoiceListItem } from '@/lib/contracts/money-desk'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'

type Props = {
  slug: string
  list: { items: InvoiceListItem[]; next: string | null }
  here: string
  isFirst: boolean
}

/** Numbered papers, each a link to its PDF, beside the order it is about. */
export function InvoiceTable({ slug, list, here, isFirst }: Props) {
  return (
    <Table
      caption={words.invoicesCaption}
      rows={list.items}
      rowKey={(row) => row.id}
      empty={words.noInvoices}
      firstHref={isFirst ? undefined : here}
      nextHref={list.next === null ? undefined : withParams(here, {}, { before: list.next })}
      columns={[
        {
          key: 'paper',
          heading: words.paper,
          cell: (row) => (
            <a href={paths.api.invoice(row.id)} className="inline-flex min-h-6">
              {words.kinds[row.kind]} {row.number}
            </a>
          ),
        },
        {
          key: 'order',
          heading: words.order,
          cell: (row) => (
            <a href={paths.adminOrder(slug, row.order)} className="figures inline-flex min-h-6">
              {row.orderNumber}
            </a>
          ),
        },
        { key: 'issued', heading: words.issued, cell: (row) => <DayText day={row.issuedOn} /> },
        {
          key: 'sum',
          heading: words.sum,
          kind: 'figures',
          cell: (row) => <Money minor={row.grossMinor} currency={row.currency} />,
        },
        {
          key: 'tax',
          heading: words.taxSum,
          kind: 'figures',
          cell: (row) => <Money minor={row.taxMinor} currency={row.currency} />,
        },
      ]}
    />
  )
}
