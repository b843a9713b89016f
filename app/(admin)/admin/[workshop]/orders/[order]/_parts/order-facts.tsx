import { Sums } from '@/components/order/sums'
import { AddressLines } from '@/components/parcel/address-lines'
import { Columns } from '@/components/ui/columns'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatMoney } from '@/lib/core/money/format'
import { formatAddress } from '@/lib/core/post/address'
import { moneyWords } from '@/lib/messages/money-desk'
import { orderWords as words } from '@/lib/messages/order-page'
import { offerWords } from '@/lib/messages/public'
import { LOCALE } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'

/** What was ordered, by whom, its sums, its papers and what went back. */
export function OrderFacts({ order }: { order: OrderPageView }) {
  const sum = (minor: number, currency = order.currency) => formatMoney(minor, currency, LOCALE)
  return (
    <Columns>
      <Sheet title={moneyWords.ordered} id="what">
        <Facts
          facts={[
            ...order.lines.map(({ id, offer, quantity, postedBy }) => ({
              key: id,
              name: `${quantity} × ${offerWords[offer]}`,
              value: words.promise(postedBy),
            })),
            ...(order.manualReason
              ? [{ key: 'reason', name: moneyWords.enteredBecause, value: order.manualReason }]
              : []),
          ]}
        />
        <h3 className="pt-5 pb-1 text-17">{words.address}</h3>
        <AddressLines lines={formatAddress(order.address, { script: 'own', from: order.homeCountry })} />
      </Sheet>
      <Sheet title={words.money} id="money">
        <Sums {...order} />
        <Facts
          facts={[
            ...order.invoices.map(({ id, kind, number, grossMinor, currency, issuedOn }) => ({
              key: id,
              name: words.invoiceKinds[kind](number),
              value: (
                <a href={paths.api.invoice(id)}>{words.invoiceOf(sum(grossMinor, currency), issuedOn)}</a>
              ),
            })),
            ...order.refunds.map(({ id, amountMinor, currency, state }) => ({
              key: id,
              name: `${words.refunds}: ${sum(amountMinor, currency)}`,
              value: words.refundStates[state],
            })),
          ]}
        />
      </Sheet>
    </Columns>
  )
}
