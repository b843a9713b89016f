import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatMoney } from '@/lib/core/money/format'
import { orderWords as words } from '@/lib/messages/order-page'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'

/** The numbered papers of the order, to be kept; nothing before the first payment. */
export function InvoiceSheet({ order }: { order: OrderPageView }) {
  if (order.invoices.length === 0) return null
  return (
    <Sheet title={words.invoices} id="invoices">
      <Facts
        facts={order.invoices.map(({ id, kind, number, grossMinor, currency, issuedOn }) => ({
          key: id,
          name: words.invoiceKinds[kind](number),
          value: (
            <a href={paths.api.invoice(id)}>
              {words.invoiceOf(formatMoney(grossMinor, currency, LOCALE), issuedOn)}
            </a>
          ),
        }))}
      />
    </Sheet>
  )
}
