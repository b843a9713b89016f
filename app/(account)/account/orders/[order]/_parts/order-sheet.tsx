import { Sums } from '@/components/order/sums'
import { Columns } from '@/components/ui/columns'
import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import { AddressLines } from '@/components/parcel/address-lines'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatAddress } from '@/lib/core/post/address'
import { orderWords as words } from '@/lib/messages/order-page'
import { offerWords } from '@/lib/messages/public'

/** What was ordered, what it costs and where it goes, as fixed when it was placed. */
export function OrderSheet({ order }: { order: OrderPageView }) {
  const lines = order.lines.map(({ id, offer, quantity, postedBy }) => ({
    key: id,
    name: `${quantity} × ${offerWords[offer]}`,
    value: (
      <>
        {words.promise(postedBy)}
        {order.choices
          .filter(({ line }) => line === id)
          .map(({ question, answer }) => (
            <span key={question} className="block text-quiet">
              {question}: {answer}
            </span>
          ))}
      </>
    ),
  }))
  return (
    <Columns>
      <Sheet title={words.what} id="what">
        <Facts facts={lines} />
        <h3 className="pt-5 pb-1 text-17">{words.address}</h3>
        <AddressLines lines={formatAddress(order.address, { script: 'own', from: order.homeCountry })} />
      </Sheet>
      <Sheet title={words.money} id="money">
        <Sums {...order} />
        {order.card && (order.state === 'reserved' || order.state === 'balance_due') ? (
          <p className="pt-3 text-15">
            {words.card}: {words.cardEnding(order.card.brand, order.card.last4)}
          </p>
        ) : null}
        {order.terms ? (
          <Disclosure summary={words.terms(order.terms.number)}>
            <PlainText text={order.terms.body} />
          </Disclosure>
        ) : null}
      </Sheet>
    </Columns>
  )
}
