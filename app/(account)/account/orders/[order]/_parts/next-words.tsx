import { When } from '@/components/format/when'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { formatMoney } from '@/lib/core/money/format'
import { orderWords } from '@/lib/messages/order-page'
import { orderFormWords } from '@/lib/messages/orders'
import { LOCALE } from '@/lib/messages/ui'

const words = orderWords.nextFor

/** Where the order stands and what comes next, in one or two sentences. */
export function NextWords({ order }: { order: OrderPageView }) {
  const sum = (minor: number) => formatMoney(minor, order.currency, LOCALE)
  if (order.runState === 'called_off') return <p>{words.calledOff}</p>
  switch (order.state) {
    case 'awaiting_deposit':
      return (
        <p>
          {words.hold} {order.holdUntil ? <When at={order.holdUntil} zone={order.timeZone} /> : null}.{' '}
          {words.holdThen(sum(order.depositMinor))}
        </p>
      )
    case 'waiting':
      return <p>{words.waiting(order.position ?? 1)}</p>
    case 'reserved':
      return order.runState === 'taking_deposits' ? (
        <p>{words.reserved(order.minimum, order.decideBy)}</p>
      ) : (
        <p>
          {words.locked} {orderFormWords.balanceWhen[order.balanceWhen]}
        </p>
      )
    case 'balance_due':
      return <BalanceWords order={order} balance={sum(order.balanceMinor)} />
    default:
      return <p>{plain[order.state] ?? ''}</p>
  }
}

const plain: Readonly<Record<string, string>> = {
  paid: words.paid,
  packed: words.packed,
  posted: words.posted,
  cancelled: words.cancelled,
  expired: words.expired,
  lapsed: words.lapsed,
  withdrawn: words.withdrawn,
  returned: words.returned,
}

function BalanceWords({ order, balance }: { order: OrderPageView; balance: string }) {
  if (order.lapseOn !== null)
    return (
      <p>
        {words.balanceFailed(balance, order.lapseOn)} {order.payment === 'bank_asks' ? words.bankAsks : null}
      </p>
    )
  const card = order.card?.last4 ?? null
  return (
    <p>
      {words.balanceComing(balance, card)}{' '}
      {card !== null && order.balanceChargedAt ? (
        <>
          <When at={order.balanceChargedAt} zone={order.timeZone} />. {words.payBefore}
        </>
      ) : null}
    </p>
  )
}
