import { Money } from '@/components/format/money'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { orderWords as words } from '@/lib/messages/order-page'

/** What comes back, and how far it is; nothing where nothing does. */
export function RefundSheet({ order }: { order: OrderPageView }) {
  if (order.refunds.length === 0) return null
  return (
    <Sheet title={words.refunds} id="refunds">
      <Facts
        facts={order.refunds.map(({ id, amountMinor, currency, state }) => ({
          key: id,
          name: <Money minor={amountMinor} currency={currency} />,
          value: words.refundStates[state],
        }))}
      />
    </Sheet>
  )
}
