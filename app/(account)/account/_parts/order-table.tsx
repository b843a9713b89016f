import { Money } from '@/components/format/money'
import { OrderState } from '@/components/order/order-state'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { OrderView } from '@/lib/contracts/orders'
import { accountWords as words } from '@/lib/messages/account'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

type Props = { orders: readonly OrderView[]; next: string | null; isFirst: boolean }

/** A person's orders, newest first. */
export function OrderTable({ orders, next, isFirst }: Props) {
  return (
    <Sheet title={words.orders} id="orders">
      <Table
        caption={words.orders}
        captionHidden
        rows={orders}
        rowKey={({ id }) => id}
        empty={words.noOrders}
        columns={[
          { key: 'number', heading: words.number, cell: ({ number }) => number },
          { key: 'module', heading: words.module, cell: ({ module }) => module.name },
          { key: 'workshop', heading: words.workshop, cell: ({ workshop }) => workshop.name },
          { key: 'what', heading: words.units, cell: whatOf },
          { key: 'state', heading: words.state, cell: ({ state }) => <OrderState state={state} /> },
          {
            key: 'total',
            heading: words.total,
            kind: 'figures',
            cell: ({ totalMinor, currency }) => <Money minor={totalMinor} currency={currency} />,
          },
        ]}
        actions={({ id, number }) => (
          <a href={paths.accountOrder(id)}>
            {words.open} <span className="sr-only">{number}</span>
          </a>
        )}
        {...(next === null ? {} : { nextHref: `${paths.account}?after=${encodeURIComponent(next)}` })}
        {...(isFirst ? {} : { firstHref: paths.account })}
      />
    </Sheet>
  )
}

const whatOf = ({ lines }: OrderView) =>
  lines.map(({ quantity, offer }) => `${quantity} × ${offerWords[offer]}`).join(', ')
